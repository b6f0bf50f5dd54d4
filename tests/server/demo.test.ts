import { mkdtemp, readFile, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { Readable } from 'node:stream'
import { fileURLToPath } from 'node:url'
import { afterAll, beforeAll, expect, it } from 'vitest'
import type { Identity } from '../../lib/access/identity'
import { sha256Hex } from '../../lib/records/sha256'
import { seedDemo } from '../../lib/server/demo'
import { openEvaluator } from '../../lib/server/evaluation/open'
import { readScenarios } from '../../lib/server/scenarios'
import { openSync, type Sync } from '../../lib/sync/open'
import { openWorld, type World } from '../access/world'

const FOLDER = fileURLToPath(new URL('../../seed-scenarios', import.meta.url))
/** What each link lists when the demo has been made. */
const FILES = {
  'Larch mezzanine': ['larch-connector.s4p', 'larch-mezzanine-line.s2p'],
  'Osier accelerator slot': [],
  'Sedge cabled backplane': ['sedge-cable-in-fixtures.s2p'],
  'Tamarack fabric link': [],
}

let world: World
let sync: Sync
let directory: string
let maren: Identity

beforeAll(async () => {
  directory = await mkdtemp(join(tmpdir(), 'halfbaud-demo-'))
  world = await openWorld()
  sync = await openSync({
    store: world.store,
    sessions: world.access,
    publicUrl: 'http://127.0.0.1:3000',
    engine: 'test',
    evaluator: openEvaluator(join(world.directory, 'evidence')),
    clock: world.now,
    log: (message) => world.logged.push(message),
  })
  const { access } = world
  const ownerCode = (await access.ownerCode()) ?? ''
  await seedDemo({ access, budgets: sync.budgets, ownerCode, directory, folder: FOLDER })
  const { id, name, email } = (await access.people()).find((person) => person.name === 'Maren Kupferloh') ?? fail()
  maren = { person: id, name, email, administrator: true, session: 's', via: 'cookie', expiresAt: null }
})
afterAll(async () => {
  await sync.close()
  await world.close()
  await rm(directory, { recursive: true })
})

const fail = (): never => {
  throw new Error('The demo has no such person.')
}

it('every link of the demo lists its files, under the owner, byte for byte', async () => {
  const budgets = await sync.budgets.list(maren)
  expect(budgets.map(({ name }) => name).sort()).toEqual(Object.keys(FILES))
  for (const { id, name } of budgets) {
    const listed = await sync.evidence.list(id)
    expect(listed.map((file) => file.name).sort()).toEqual(FILES[name as keyof typeof FILES])
    for (const file of listed) {
      const opened = (await sync.evidence.open(id, file.sha256)) ?? fail()
      const bytes = new Uint8Array(await new Response(opened.stream).arrayBuffer())
      expect(bytes).toEqual(new Uint8Array(await readFile(join(FOLDER, file.name))))
      expect(sha256Hex(bytes)).toBe(file.sha256)
    }
  }
})

it('a link that counts by its files is decided from its first entry on', async () => {
  const larch = (await sync.budgets.list(maren)).find(({ name }) => name === 'Larch mezzanine') ?? fail()
  expect(larch.verdict).toBe('inside')
  const [first] = (await sync.budgets.trail(larch.id, { after: 0, limit: 1 })) ?? []
  expect(first?.effects.map(({ after }) => after?.verdict)).toEqual(['inside', 'inside'])
  expect(world.logged).toEqual([])
})

it('a file that comes after its budget decides it at once, though the budget is the same', async () => {
  const { budget, files } = (await readScenarios(FOLDER)).links.find(({ id }) => id === 'larch') ?? fail()
  const { name, mediaType, bytes } = files[0] ?? fail()
  // The same connector in a file that this server has not seen.
  const other = Buffer.concat([bytes, Buffer.from('! Another copy\n')])
  const { connector } = budget.evidence
  const evidence = { ...budget.evidence, connector: { ...(connector ?? fail()), sha256: sha256Hex(other) } }
  const { id } = await sync.budgets.create(maren, 'import', { ...budget, evidence })
  const verdict = async () => (await sync.budgets.list(maren)).find((one) => one.id === id)?.verdict
  expect(await verdict()).toBe('undecided')
  await sync.evidence.store(id, maren, { name, mediaType, bytes: Readable.from([other]) })
  expect(await verdict()).toBe('inside')
})
