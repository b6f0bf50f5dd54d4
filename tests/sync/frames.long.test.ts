import { setFlagsFromString } from 'node:v8'
import { runInNewContext } from 'node:vm'
import { expect, it } from 'vitest'
import { readBudget } from '../../lib/sheet/seed'
import { encodeMessage, MESSAGE } from '../../lib/sheet/wire'
import { loadDocument } from '../../lib/sync/room/load'
import { setLoss } from './support/changes'
import { Page, syncFrame } from './support/page'
import { type Random, seeded } from './support/random'
import { PEOPLE } from './support/sessions'
import { copyOf, editOf, noteOf, putRecord, recordOf } from './support/sheet'
import { openWorld, PUBLIC_URL } from './support/world'

const FRAMES = 2_000
const SEED = 20_260_701

setFlagsFromString('--expose_gc')
const collectGarbage: () => void = runInNewContext('gc')

it(`[W4.6] ${FRAMES} random and mutated frames (seed ${SEED}): the room serves on, the heap stays bounded, the journal replays`, async () => {
  const random = seeded(SEED)
  // A minute between two frames, so that no ration is used up and every frame is judged for itself.
  let minutes = 0
  const world = await openWorld({ now: () => 1_800_000_000_000 + minutes * 60_000 })
  const budget = await world.createBudget()
  const ben = await Page.open(world, budget, 'ben')
  const heap: number[] = []
  const codes: Record<string, number> = {}
  const answers: Record<string, number> = {}
  let hostile: Page | null = null
  for (let count = 1; count <= FRAMES; count++) {
    if (!hostile || hostile.socket.readyState !== hostile.socket.OPEN) {
      if (hostile) {
        const { code } = await hostile.closed
        codes[code] = (codes[code] ?? 0) + 1
        for (const { header } of hostile.all('refused')) answers[header.code] = (answers[header.code] ?? 0) + 1
        answers.acknowledged = (answers.acknowledged ?? 0) + hostile.all('acknowledged').length
      }
      hostile = await Page.dial(`${world.url}${budget}`, { headers: { cookie: 'session=ann' }, origin: PUBLIC_URL })
      if (random.chance(0.9)) hostile.hello('ann')
      if (random.chance(0.9)) hostile.askForDocument()
    }
    minutes++
    hostile.send(mutated(validFrame(hostile, ben, random), random))
    await hostile.heard()
    if (count % 100 === 0) {
      const answer = await ben.answer(ben.edit(setLoss(`${count / 100} dB`, 'cable')))
      expect(answer, `after ${count} frames`).toHaveProperty('seq')
      collectGarbage()
      heap.push(process.memoryUsage().heapUsed / 1e6)
    }
  }
  hostile?.socket.terminate()
  const last = ben.edit(setLoss('1.5 dB', 'cable'))
  expect(await ben.answer(last)).toHaveProperty('seq')
  const read = await world.sync.budgets.read(budget)
  expect(readBudget(ben.doc)).toEqual(read?.budget)
  const loaded = await loadDocument(world.journal, budget)
  if (!loaded || 'damaged' in loaded) throw new Error('The journal does not replay.')
  expect(readBudget(loaded.doc)).toEqual(read?.budget)
  const growth = Math.max(...heap) - Math.min(...heap)
  console.log(
    `closed with ${JSON.stringify(codes)}; answered ${JSON.stringify(answers)}; heap ${heap.map(Math.round).join(' ')} MB`,
  )
  expect(growth).toBeLessThan(40)
  expect(world.logged).toEqual([])
  expect(Object.keys(codes)).toContain('1007')
})

/** A frame as an honest page might send it. */
function validFrame(page: Page, ben: Page, random: Random): Uint8Array {
  const doc = copyOf(ben.doc, page.clientId)
  const edit = (change: Parameters<typeof editOf>[1]) =>
    encodeMessage({
      type: MESSAGE.edit,
      header: { editId: `e-${random.below(1e9)}`, epoch: 1, clientId: page.clientId },
      update: editOf(doc, change),
    })
  return random.pick([
    () => edit((copy) => recordOf(copy, 'lines', 'trace').set('loss', '3 dB')),
    () => edit((copy) => putRecord(copy, 'lines', `l-${random.below(1e6)}`, { order: 'a7' })),
    () => edit((copy) => noteOf(copy, 'lines', 'trace').insert(0, 'typed')),
    () => edit((copy) => copy.getMap('laneValues').set('cable/1/length', '1 in')),
    () => syncFrame(0, new Uint8Array([1, 1, 5])),
    () => syncFrame(2, new Uint8Array([0, 0])),
    () => encodeMessage({ type: MESSAGE.cell, header: { section: 'lines', id: 'trace', field: 'loss' } }),
    () =>
      encodeMessage({
        type: MESSAGE.hello,
        header: { person: PEOPLE.ann.person, epoch: 1, clientId: page.clientId, seq: 0, head: null, schemaVersion: 1 },
      }),
    () => Uint8Array.from({ length: random.below(200) }, () => random.below(256)),
  ])()
}

function mutated(frame: Uint8Array, random: Random): Uint8Array {
  const bytes = frame.slice()
  const ways: (() => Uint8Array)[] = [
    () => bytes,
    () => bytes.slice(0, random.below(bytes.length + 1)),
    () => {
      for (let flips = 0; flips <= random.below(4); flips++) bytes[random.below(bytes.length)] = random.below(256)
      return bytes
    },
    () => {
      const at = random.below(bytes.length + 1)
      return new Uint8Array([...bytes.slice(0, at), random.below(256), ...bytes.slice(at)])
    },
    () => new Uint8Array([...bytes, ...bytes]),
  ]
  return random.pick(ways)()
}
