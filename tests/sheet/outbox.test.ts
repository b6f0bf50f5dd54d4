import 'fake-indexeddb/auto'
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest'
import * as Y from 'yjs'
import type { Operation } from '../../lib/sheet/change'
import { CLOSE } from '../../lib/sheet/closeCodes'
import { applyEdit } from '../../lib/sheet/edits'
import { openIndexedDb } from '../../lib/sheet/outbox'
import { readBudget, seedUpdate } from '../../lib/sheet/seed'
import { FakeServer } from './fakeServer'
import { canonical, canonicalDoc, docOf, sampleSeed } from './sample'
import { seeded } from './seeded'
import { allSaved, Browser, setLoss, until } from './tabs'

let server: FakeServer
const browsers: Browser[] = []
beforeEach(async () => {
  server = await FakeServer.start(sampleSeed)
})
afterEach(async () => {
  await Promise.all(browsers.splice(0).map((browser) => browser.close()))
  await server.stop()
})

let names = 0
function browserWith(kind: 'memory' | 'IndexedDB'): Browser {
  const budget = `budget-${names++}`
  const browser = kind === 'memory' ? new Browser(server) : new Browser(server, () => openIndexedDb('ann', budget))
  browsers.push(browser)
  return browser
}

const LOSES = 1
const WINS = 2 ** 32 - 1

const lane = (index: number): Operation => ({
  op: 'lane',
  line: 'trace',
  lane: (index % 4) + 1,
  field: 'length',
  value: `${index + 1} in`,
})

/** What somebody else does on the server's document. Of two writes at once the one of the larger client id wins. */
function elsewhere(operation: Operation, clientId: number) {
  const other = docOf(Y.encodeStateAsUpdate(server.doc))
  other.clientID = clientId
  const edit = applyEdit(other, [operation])
  if (!edit.ok || !edit.update) throw new Error('refused')
  server.editElsewhere(edit.update)
}

describe.each(['memory', 'IndexedDB'] as const)('the outbox, kept in %s', (kind) => {
  test('[W2.63] 20 % of acknowledgements cut, reloads in between: every edit once, none lost', async () => {
    const seed = 20_240_611
    const random = seeded(seed)
    let cuts = 0
    server.script = () => {
      const draw = random()
      if (draw >= 0.25) return null
      cuts++
      return draw < 0.05 ? 'cut before' : 'cut after'
    }
    const browser = browserWith(kind)
    let tab = await browser.openLive()
    for (let index = 0; index < 60; index++) {
      expect(tab.edit([lane(index), setLoss(`${index} dB`)])).toEqual({ ok: true })
      if (index % 20 === 19) {
        await tab.settled()
        await tab.destroy()
        tab = await browser.open()
        await until(tab, (now) => now.budget !== null)
      }
    }
    await allSaved(tab)
    console.log(
      `outbox (${kind}, seed ${seed}): ${server.accepted.length} edits, ${server.connections} connections, ${cuts} cuts`,
    )
    expect(new Set(server.accepted.map((each) => each.editId)).size).toBe(60)
    expect(server.accepted.length).toBe(60)
    expect(server.refusals).toEqual([])
    expect(cuts).toBeGreaterThan(5)
    expect(canonical(tab.getSnapshot().budget)).toBe(canonicalDoc(server.doc))
    expect(readBudget(server.doc).lines.via?.loss).toBe('59 dB')
  })

  test('[W2.64] unsaved edits outlive a reload while the server is away, are shown, and are sent when it is back', async () => {
    const browser = browserWith(kind)
    const tab = await browser.openLive()
    server.script = () => 'cut before'
    tab.edit([setLoss('3 dB')])
    tab.edit([{ op: 'add', section: 'lines', id: 'pad', values: { order: 'a3', name: 'Pad' } }])
    await tab.settled()
    await tab.destroy()
    const again = await browser.open()
    const now = await until(again, (next) => next.budget !== null)
    expect(now.unsaved).toBe(2)
    expect(now.budget?.lines.via?.loss).toBe('3 dB')
    expect(now.unsavedPlaces.has('lines/pad/name')).toBe(true)
    again.edit([setLoss('1 dB', 'pad')])
    server.script = () => null
    await allSaved(again)
    expect(readBudget(server.doc).lines.pad).toMatchObject({ name: 'Pad', loss: '1 dB', removed: false })
    expect(server.accepted.length).toBe(3)
  })

  test('[W10.62] one refused edit among five made offline: the other four arrive, the refused one is shown as typed, also after a reload', async () => {
    const browser = browserWith(kind)
    const tab = await browser.openLive()
    server.script = () => 'cut before'
    const edits: Operation[] = [
      { op: 'set', section: 'lines', id: 'package', field: 'name', value: 'Package A' },
      { op: 'set', section: 'lines', id: 'trace', field: 'length', value: '7.25 in' },
      { op: 'set', section: 'lines', id: 'via', field: 'loss', value: '0.4 dB' },
      { op: 'note', section: 'lines', id: 'via', field: 'note', text: 'Back-drilled, checked' },
      { op: 'set', section: 'head', id: null, field: 'laneCount', value: 8 },
    ]
    for (const edit of edits) tab.edit([edit])
    const before = tab.getSnapshot().generation
    server.script = ({ update }) =>
      Buffer.from(update).includes('7.25 in') ? { code: 'invalid-result', reason: 'Too long for this board.' } : null
    await until(tab, (now) => now.generation > before)
    const now = await allSaved(tab)
    expect(readBudget(server.doc)).toMatchObject({
      head: { laneCount: 8 },
      lines: {
        package: { name: 'Package A' },
        via: { loss: '0.4 dB', note: 'Back-drilled, checked' },
        trace: { length: '6 in' },
      },
    })
    expect(server.accepted.length).toBe(4)
    expect(server.refusals.length).toBe(1)
    const shown = {
      code: 'invalid-result',
      reason: 'Too long for this board.',
      parts: [{ place: { section: 'lines', id: 'trace', field: 'length' }, typed: '7.25 in' }],
    }
    expect(now.refused).toMatchObject([shown])
    expect(now.budget?.lines.trace?.length).toBe('6 in')

    await tab.destroy()
    const again = await browser.openLive()
    const [refused] = (await until(again, (next) => next.refused.length > 0)).refused
    expect(refused).toMatchObject(shown)
    server.script = () => null
    expect(refused?.enterAgain()).toEqual({ ok: true })
    await allSaved(again)
    expect(again.getSnapshot().refused).toEqual([])
    expect(readBudget(server.doc).lines.trace?.length).toBe('7.25 in')
  })

  test.each([
    ['lost against the unsent one', LOSES],
    ['won', WINS],
  ])(
    '[W10.63] what hangs on a refused edit, and what others changed meanwhile (their write %s), is not done again but listed',
    async (_, clientId) => {
      const browser = browserWith(kind)
      const tab = await browser.openLive()
      server.script = () => 'cut before'
      tab.edit([{ op: 'add', section: 'lines', id: 'pad', values: { order: 'a3', name: 'Pad' } }])
      tab.edit([setLoss('9 dB', 'pad')])
      tab.edit([setLoss('0.4 dB'), { op: 'set', section: 'lines', id: 'via', field: 'stub', value: '0.1 mm' }])
      elsewhere(setLoss('0.6 dB'), clientId)
      server.script = ({ update }) =>
        Buffer.from(update).includes('Pad') ? { code: 'invalid-result', reason: 'No more pads.' } : null
      const now = await until(tab, (next) => next.unsaved === 0 && next.refused.length === 3)
      expect(now.refused.map(({ code, reason, parts }) => [code, reason, parts.at(-1)?.typed])).toEqual([
        ['invalid-result', 'No more pads.', 'Pad'],
        ['conflict', 'The row that it belongs to is not in the budget.', '9 dB'],
        ['conflict', "Somebody has changed this since; it reads '0.6 dB' now.", '0.4 dB'],
      ])
      expect(readBudget(server.doc).lines.via).toMatchObject({ loss: '0.6 dB', stub: '0.1 mm' })
      for (const refused of now.refused) refused.dismiss()
      expect(tab.getSnapshot().refused).toEqual([])
      await tab.settled()
      await tab.destroy()
      const again = await browser.openLive()
      expect(again.getSnapshot().refused).toEqual([])
    },
  )

  test('[W2.65] a new epoch: the copy is dropped, the edits are done again on what the server has now', async () => {
    const browser = browserWith(kind)
    const tab = await browser.openLive()
    tab.edit([setLoss('1 dB')])
    await allSaved(tab)
    server.script = () => 'cut before'
    tab.edit([{ op: 'set', section: 'lines', id: 'trace', field: 'length', value: '7 in' }])
    tab.edit([setLoss('2 dB')])
    await tab.settled()
    // The restored state knows nothing of the acknowledged edit.
    server.script = () => null
    server.renewEpoch(sampleSeed)
    const now = await until(
      tab,
      (next) => next.unsaved === 0 && next.connection.state === 'live' && next.generation > 1,
    )
    expect(readBudget(server.doc).lines).toMatchObject({ trace: { length: '7 in' }, via: { loss: null } })
    expect(now.refused).toMatchObject([{ code: 'conflict', parts: [{ typed: '2 dB' }] }])
    expect(canonical(now.budget)).toBe(canonicalDoc(server.doc))
    expect(server.hellos.at(-1)).toMatchObject({ epoch: null, seq: 0, head: null })
    server.cutAll()
    await until(tab, (next) => next.connection.state === 'offline')
    await until(tab, (next) => next.connection.state === 'live')
    expect(server.hellos.at(-1)?.epoch).toBe(2)
  })

  test('[W2.66] two tabs: one sends for both, each sees the other, and the other sends when the first is gone', async () => {
    const browser = browserWith(kind)
    const first = await browser.openLive()
    const second = await browser.openLive()
    const senders: number[] = []
    server.script = ({ header }) => {
      senders.push(header.clientId)
      return null
    }
    const before = server.connections
    second.edit([setLoss('5 dB')])
    expect(second.getSnapshot().unsaved).toBe(1)
    await until(first, (now) => now.budget?.lines.via?.loss === '5 dB')
    await until(second, (now) => now.unsaved === 0)
    first.edit([{ op: 'set', section: 'lines', id: 'trace', field: 'length', value: '8 in' }])
    await until(second, (now) => now.budget?.lines.trace?.length === '8 in' && now.lastAcknowledged?.seq === 2)

    server.script = () => 'cut before'
    second.edit([setLoss('6 dB')])
    await until(first, (now) => now.unsaved === 1)
    await first.destroy()
    server.script = () => null
    await allSaved(second)
    expect(readBudget(server.doc).lines.via?.loss).toBe('6 dB')
    expect(server.accepted.length).toBe(3)
    expect(new Set(senders).size).toBe(2)
    expect(before).toBe(2)
  })

  test('[W10.64] a refusal in the tab that sends makes the other tab begin anew too; both show what was refused', async () => {
    const browser = browserWith(kind)
    const first = await browser.openLive()
    const second = await browser.openLive()
    server.script = ({ update }) =>
      Buffer.from(update).includes('5 dB') ? { code: 'invalid-result', reason: 'Not so.' } : null
    second.edit([setLoss('5 dB')])
    second.edit([{ op: 'set', section: 'lines', id: 'trace', field: 'length', value: '8 in' }])
    for (const tab of [first, second]) {
      const now = await until(tab, (next) => next.refused.length === 1 && next.unsaved === 0 && next.generation === 2)
      expect(now.refused).toMatchObject([{ reason: 'Not so.', parts: [{ typed: '5 dB' }] }])
      await until(tab, (next) => next.budget?.lines.trace?.length === '8 in' && next.budget.lines.via?.loss === null)
    }
    expect(server.accepted.length).toBe(1)
  })

  test('[W2.67] a gap: what the server misses is sent first', async () => {
    const browser = browserWith(kind)
    const tab = await browser.openLive()
    let told = false
    server.script = ({ header, count }) => {
      if (count !== 2 || told) return null
      told = true
      // The server forgot nothing, but says so: the client must go back to the edit that brings this clock.
      return { code: 'gap', reason: 'Something is missing.', missing: { clientId: header.clientId, clock: 1 } }
    }
    tab.edit([setLoss('1 dB')])
    tab.edit([setLoss('2 dB')])
    tab.edit([setLoss('3 dB')])
    await allSaved(tab)
    expect(told).toBe(true)
    expect(server.accepted.length).toBe(3)
    expect(readBudget(server.doc).lines.via?.loss).toBe('3 dB')
  })

  test('[W2.68] a gap that nothing in the outbox fills (the server lost an edit): a new document, the edits done again', async () => {
    const browser = browserWith(kind)
    const tab = await browser.openLive()
    tab.edit([setLoss('1 dB')])
    await allSaved(tab)
    // The same epoch, without the acknowledged edit.
    server.doc = docOf(sampleSeed)
    tab.edit([{ op: 'set', section: 'lines', id: 'trace', field: 'length', value: '7 in' }])
    const now = await until(
      tab,
      (next) => next.generation > 1 && next.unsaved === 0 && next.connection.state === 'live',
    )
    expect(server.refusals[0]?.code).toBe('gap')
    expect(readBudget(server.doc).lines).toMatchObject({ trace: { length: '7 in' }, via: { loss: null } })
    expect(canonical(now.budget)).toBe(canonicalDoc(server.doc))
  })

  test('[W10.65] made a viewer with edits unsaved: all of them are listed at once', async () => {
    const browser = browserWith(kind)
    const tab = await browser.openLive()
    server.script = () => ({ code: 'read-only', reason: 'You may read this budget only.' })
    for (let index = 0; index < 4; index++) tab.edit([lane(index)])
    const now = await until(tab, (next) => next.refused.length === 4 && next.unsaved === 0)
    expect(server.refusals.length).toBe(1)
    expect(now.refused.map((each) => each.parts[0]?.typed)).toEqual(['1 in', '2 in', '3 in', '4 in'])
  })

  test('[W10.70] signed out while an edit is on its way: it stays unsaved, and is sent after signing in', async () => {
    const browser = browserWith(kind)
    const tab = await browser.openLive()
    server.script = () => {
      server.closeAll(CLOSE.signInAgain.code)
      return { code: 'not-allowed', reason: 'You are signed out; sign in again.' }
    }
    tab.edit([setLoss('1 dB')])
    tab.edit([setLoss('2 dB')])
    const now = await until(tab, (next) => next.connection.state === 'closed')
    expect(now).toMatchObject({ unsaved: 2, refused: [], connection: { words: CLOSE.signInAgain.words } })
    await tab.destroy()
    server.script = () => null
    await allSaved(await browser.openLive())
    expect(readBudget(server.doc).lines.via?.loss).toBe('2 dB')
    expect(server.accepted.length).toBe(2)
  })

  test('[W5.67] the server cannot write just now: the edit waits and is sent again, once the time has come', async () => {
    const browser = browserWith(kind)
    const tab = await browser.openLive()
    vi.useFakeTimers({ toFake: ['setTimeout', 'clearTimeout'] })
    try {
      server.script = () => ({ code: 'not-stored', reason: 'The disk is full.' })
      tab.edit([setLoss('1 dB')])
      await vi.waitUntil(() => server.refusals.length === 1, { interval: 1 })
      await vi.waitUntil(() => vi.getTimerCount() > 0, { interval: 1 })
      expect(tab.getSnapshot()).toMatchObject({ unsaved: 1, refused: [], connection: { state: 'live' } })
      server.script = () => null
      vi.advanceTimersByTime(2000)
    } finally {
      vi.useRealTimers()
    }
    await allSaved(tab)
    expect(server.accepted.length).toBe(1)
  })

  test('a reload uses the cache and asks only for what is new', async () => {
    const browser = browserWith(kind)
    const tab = await browser.openLive()
    tab.edit([setLoss('1 dB')])
    await allSaved(tab)
    await tab.settled()
    await tab.destroy()
    elsewhere(setLoss('2 dB', 'trace'), LOSES)
    const again = await browser.open()
    const first = await until(again, (now) => now.budget !== null)
    expect(first.budget?.lines.via?.loss).toBe('1 dB')
    expect(first.connection.state).toBe('connecting')
    await until(again, (now) => now.budget?.lines.trace?.loss === '2 dB')
  })
})

test('what one person keeps is not shown to another, nor one budget in another', async () => {
  const storage = await openIndexedDb('ann', 'shared')
  await storage.write({ updates: [seedUpdate(docOfSample())], meta: { epoch: 1 } })
  for (const [person, budget] of [
    ['ben', 'shared'],
    ['ann', 'other'],
  ] as const) {
    const other = await openIndexedDb(person, budget)
    expect((await other.updates()).updates).toEqual([])
    expect((await other.read()).meta.epoch).toBeNull()
    other.close()
  }
  expect((await storage.updates()).updates.length).toBe(1)
  storage.close()
})

const docOfSample = () => readBudget(docOf(sampleSeed))
