import * as encoding from 'lib0/encoding'
import { describe, expect, it } from 'vitest'
import type * as Y from 'yjs'
import { readBudget } from '../../lib/sheet/seed'
import { encodeMessage, MESSAGE } from '../../lib/sheet/wire'
import { lossOf, setLoss } from './support/changes'
import { holdableDisk } from './support/disk'
import { any, type ForgedItem, forge, subdocument, type } from './support/forge'
import { Page } from './support/page'
import { editOf, recordOf } from './support/sheet'
import { openWorld, PUBLIC_URL } from './support/world'

type Make = (page: Page) => Uint8Array

/** One struct of the page's own, at its next clock. */
const one =
  (item: (doc: Y.Doc) => ForgedItem): Make =>
  (page) =>
    forge([{ client: page.clientId, clock: 0, structs: [item(page.doc)] }])

const itemOf = (doc: Y.Doc, field: string) => {
  const item = recordOf(doc, 'lines', 'trace')._map.get(field)
  if (!item) throw new Error(`no ${field}`)
  return item.lastId
}
const recordId = (doc: Y.Doc) => {
  const item = doc.getMap('lines')._map.get('trace')
  if (!item) throw new Error('no line')
  return item.id
}

const CASES: [string, string, Make][] = [
  [
    "somebody else's client id",
    'foreign-client-id',
    (page) => forge([{ client: 77, clock: 10, structs: [{ origin: itemOf(page.doc, 'loss'), ...any('9 dB') }] }]),
  ],
  ['a delete set for clocks that do not exist yet', 'malformed', () => forge([], { 77: [[0, 1_000]] })],
  [
    'a delete set that takes a field away',
    'invalid-result',
    (page) => {
      const { client, clock } = itemOf(page.doc, 'loss')
      return forge([], { [client]: [[clock, 1]] })
    },
  ],
  [
    'a delete set that takes a line away',
    'invalid-result',
    (page) => {
      const { client, clock } = recordId(page.doc)
      return forge([], { [client]: [[clock, 1]] })
    },
  ],
  ['a field __proto__', 'outside-layout', one((doc) => ({ parent: recordId(doc), key: '__proto__', ...any(1) }))],
  ['a root __proto__', 'outside-layout', one(() => ({ parent: '__proto__', key: 'x', ...any(1) }))],
  ['NaN', 'bad-value', one(() => ({ parent: 'head', key: 'laneCount', ...any(Number.NaN) }))],
  ['a BigInt', 'bad-value', one((doc) => ({ origin: itemOf(doc, 'loss'), ...any(5n) }))],
  ['a subdocument', 'outside-layout', one((doc) => ({ origin: itemOf(doc, 'loss'), ...subdocument('x') }))],
  ['a line of an unknown kind', 'bad-value', one((doc) => ({ origin: itemOf(doc, 'kind'), ...any('wormhole') }))],
  ['a line without its fields', 'invalid-result', one(() => ({ parent: 'lines', key: 'bare', ...type(1) }))],
  [
    '20,000 nested maps',
    'outside-layout',
    (page) => {
      const structs = Array.from({ length: 20_000 }, (_, index) => ({
        parent: index === 0 ? 'lines' : { client: page.clientId, clock: index - 1 },
        key: 'm',
        ...type(1),
      }))
      return forge([{ client: page.clientId, clock: 0, structs }])
    },
  ],
  [
    'a lane value of a line that does not exist',
    'invalid-result',
    one(() => ({ parent: 'laneValues', key: 'none/1/length', ...any('1 in') })),
  ],
  ['bytes that are no update', 'malformed', () => new Uint8Array([9, 9, 9, 9])],
]

describe('refused, while the edits of others wait for their commit', () => {
  it.each(CASES)('[W4.5] %s: %s; theirs arrive, and the page goes on', async (_, code, make) => {
    const disk = holdableDisk()
    const world = await openWorld({ disk })
    const budget = await world.createBudget()
    const ben = await Page.open(world, budget, 'ben', {}, 77)
    const mallory = await Page.open(world, budget, 'ann')
    await ben.answer(ben.edit(setLoss('1 dB', 'cable')))
    await mallory.sees((doc) => lossOf(doc, 'cable') === '1 dB')
    disk.hold()
    const flying = ben.edit(setLoss('2 dB', 'cable'))
    await disk.untilWaiting(1)
    const queued = ben.edit(setLoss('3 dB', 'cable'))
    const refused = mallory.sendEdit(make(mallory))
    expect(await mallory.answer(refused)).toMatchObject({ editId: refused, code })
    const after = ben.edit(setLoss('4 dB', 'cable'))
    await disk.letGo()
    for (const editId of [flying, queued, after]) expect(await ben.answer(editId)).toHaveProperty('seq')
    await mallory.sees((doc) => lossOf(doc, 'cable') === '4 dB')
    const honest = mallory.edit(setLoss('6 dB'))
    expect(await mallory.answer(honest)).toHaveProperty('seq')
    await ben.sees((doc) => lossOf(doc) === '6 dB')
    expect((await world.sync.budgets.read(budget))?.budget).toEqual(readBudget(ben.doc))
    expect(world.logged).toEqual([])
  })

  it('[W2.25] a frame of 20 MB: that socket is closed with 1009, the others go on', async () => {
    const disk = holdableDisk()
    const world = await openWorld({ disk })
    const budget = await world.createBudget()
    const ben = await Page.open(world, budget, 'ben')
    const mallory = await Page.open(world, budget, 'ann')
    disk.hold()
    const editId = ben.edit(setLoss('2 dB', 'cable'))
    await disk.untilWaiting(1)
    mallory.sendEdit(new Uint8Array(20 * 1024 * 1024))
    expect(await mallory.closed).toMatchObject({ code: 1009 })
    await disk.letGo()
    expect(await ben.answer(editId)).toHaveProperty('seq')
  })

  it('[W1.23] an edit over 4 MB in a frame under the limit is refused, not punished', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    ann.sendEdit(new Uint8Array(4 * 1024 * 1024 + 1), 'large')
    expect(await ann.answer('large')).toMatchObject({ code: 'too-large' })
    expect(await ann.answer(ann.edit(setLoss('6 dB')))).toHaveProperty('seq')
  })
})

describe('headers and frames', () => {
  it('[W4.6] an edit whose header is bad but names its id is answered; bytes that cannot be read close the socket', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    const header = { editId: 'bad', epoch: 1, clientId: -3 }
    ann.send(encodeMessage({ type: MESSAGE.edit, header, update: new Uint8Array([0, 0]) }))
    expect(await ann.answer('bad')).toMatchObject({ code: 'malformed' })
    ann.sendEdit(new Uint8Array([0, 0]), 'constructor:hash')
    expect(await ann.answer('constructor:hash')).toMatchObject({ code: 'malformed' })
    ann.send(new Uint8Array([100, 5, 1]))
    expect(await ann.closed).toMatchObject({ code: 1007 })
    const texting = await Page.open(world, budget, 'ann')
    texting.socket.send('{"type":"edit"}')
    expect(await texting.closed).toMatchObject({ code: 1003 })
  })

  it('[W2.26] an edit of another epoch is refused', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    ann.sendEdit(editOf(ann.doc, setLoss('6 dB')), 'old', { epoch: 7 })
    expect(await ann.answer('old')).toMatchObject({ code: 'epoch' })
  })
})

describe('how much is put up with', () => {
  it('[W10.21] three gaps in a row close the socket as final', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    editOf(ann.doc, setLoss('6 dB'))
    for (const value of ['7 dB', '8 dB', '9 dB']) ann.edit(setLoss(value))
    expect(await ann.closed).toMatchObject({ code: 4422 })
    expect(ann.all('refused').map(({ header }) => header.code)).toEqual(['gap', 'gap', 'gap'])
  })

  it('[W10.21] what was sent after a refused edit hangs on it and arrives as gaps: that is no offence', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ann = await Page.open(world, budget, 'ann')
    ann.edit((doc) => recordOf(doc, 'lines', 'trace').set('kind', 'wormhole'))
    const last = ['1 dB', '2 dB', '3 dB', '4 dB', '5 dB'].map((value) => ann.edit(setLoss(value))).at(-1) ?? ''
    expect(await ann.answer(last)).toMatchObject({ code: 'gap' })
    expect(ann.all('refused').map(({ header }) => header.code)).toEqual([
      'bad-value',
      'gap',
      'gap',
      'gap',
      'gap',
      'gap',
    ])
    ann.askForDocument()
    await ann.until(() => ann.all('sync').filter(({ step }) => step === 1).length === 2)
  })

  it('[W4.7] refusals that build the shadow anew are rationed: the fourth in a minute closes the person’s sockets', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const ben = await Page.open(world, budget, 'ben')
    const ann = await Page.open(world, budget, 'ann')
    const ids = [1, 2, 3, 4].map((count) =>
      ann.sendEdit(
        forge([{ client: ann.clientId, clock: 0, structs: [{ parent: 'lines', key: `bare-${count}`, ...type(1) }] }]),
      ),
    )
    expect(await ann.answer(ids[2] ?? '')).toMatchObject({ code: 'invalid-result' })
    expect(await ann.closed).toMatchObject({ code: 4422 })
    const again = await Page.open(world, budget, 'ann')
    expect(await again.answer(again.edit(setLoss('6 dB')))).toMatchObject({ code: 'not-allowed' })
    expect(await ben.answer(ben.edit(setLoss('4 dB')))).toHaveProperty('seq')
  })

  it('[W2.21] too much before the hello closes the socket', async () => {
    const world = await openWorld()
    const budget = await world.createBudget()
    const large = await Page.dial(`${world.url}${budget}`, {
      headers: { cookie: 'session=ann' },
      origin: PUBLIC_URL,
    })
    large.send(encodingOf(70_000))
    expect((await large.closed).code).toBe(1008)
    const many = await Page.dial(`${world.url}${budget}`, {
      headers: { cookie: 'session=ann' },
      origin: PUBLIC_URL,
    })
    for (let count = 0; count < 17; count++) many.send(new Uint8Array([0, 0, 1, 0]))
    expect((await many.closed).code).toBe(1008)
    expect(many.received).toEqual([])
  })
})

function encodingOf(length: number): Uint8Array {
  const encoder = encoding.createEncoder()
  encoding.writeVarUint(encoder, 1)
  encoding.writeVarUint8Array(encoder, new Uint8Array(length))
  return encoding.toUint8Array(encoder)
}
