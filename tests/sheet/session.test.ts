import { once } from 'node:events'
import { afterEach, beforeEach, describe, expect, test } from 'vitest'
import * as Y from 'yjs'
import { CLOSE } from '../../lib/sheet/closeCodes'
import { applyEdit } from '../../lib/sheet/edits'
import { readBudget } from '../../lib/sheet/seed'
import type { TrailEntry } from '../../lib/sheet/wire'
import { FakeServer } from './fakeServer'
import { canonical, canonicalDoc, docOf, sampleSeed } from './sample'
import { allSaved, Browser, setLoss, until } from './tabs'

let server: FakeServer
let browser: Browser
beforeEach(async () => {
  server = await FakeServer.start(sampleSeed)
  browser = new Browser(server)
})
afterEach(async () => {
  await browser.close()
  await server.stop()
})

/** What somebody else does on the server's document. */
function elsewhere(operation: Parameters<typeof applyEdit>[1][number]) {
  const other = docOf(Y.encodeStateAsUpdate(server.doc))
  const edit = applyEdit(other, [operation])
  if (!edit.ok || !edit.update) throw new Error('refused')
  server.editElsewhere(edit.update)
}

describe('a session', () => {
  test('[W2.61] says hello before anything else and sends nothing upwards but what is its own', async () => {
    const tab = await browser.openLive()
    tab.edit([setLoss('1 dB')])
    await allSaved(tab)
    server.cutAll()
    await until(tab, (now) => now.connection.state === 'offline')
    tab.edit([setLoss('2 dB')])
    await allSaved(tab)
    expect(new Set(server.protocolFrames)).toEqual(new Set(['0,0']))
    expect(server.hellos[0]).toMatchObject({ person: 'ann', epoch: null, seq: 0, head: null })
    expect(server.hellos[1]).toMatchObject({ epoch: 1, seq: 1, head: 'h1' })
    expect(canonical(tab.getSnapshot().budget)).toBe(canonicalDoc(server.doc))
  })

  test('[W2.62] an edit is shown at once, counted as unsaved with its place, and saved when it is acknowledged', async () => {
    const tab = await browser.openLive()
    expect(tab.edit([setLoss('1 dB')])).toEqual({ ok: true })
    const now = tab.getSnapshot()
    expect(now.budget?.lines.via?.loss).toBe('1 dB')
    expect(now.unsaved).toBe(1)
    expect([...now.unsavedPlaces]).toEqual(['lines/via/loss'])
    const later = await allSaved(tab)
    expect(later.lastAcknowledged?.seq).toBe(1)
    expect(later.unsavedPlaces.size).toBe(0)
    expect(server.accepted.length).toBe(1)
  })

  test('what others do arrives; what did not change keeps its identity; a snapshot stays the same until something changes', async () => {
    const tab = await browser.openLive()
    const before = tab.getSnapshot()
    expect(tab.getSnapshot()).toBe(before)
    elsewhere(setLoss('4 dB'))
    const after = await until(tab, (now) => now.budget?.lines.via?.loss === '4 dB')
    expect(after.budget?.lines.trace).toBe(before.budget?.lines.trace)
    expect(after.refused).toBe(before.refused)
  })

  test('an edit is shown in one piece: nobody sees an added line while it is being made', async () => {
    const tab = await browser.openLive()
    const seen: unknown[] = []
    tab.subscribe(() => seen.push(tab.getSnapshot().budget?.lines.pad?.removed))
    tab.edit([{ op: 'add', section: 'lines', id: 'pad', values: { order: 'a3' } }])
    expect(seen.filter((removed) => removed === true)).toEqual([])
    expect(seen.at(-1)).toBe(false)
  })

  test('undo and redo are sent like edits', async () => {
    const tab = await browser.openLive()
    tab.edit([setLoss('1 dB')])
    expect(tab.getSnapshot().canUndo).toBe(true)
    expect(tab.undo()).toEqual({ ok: true })
    expect(tab.getSnapshot()).toMatchObject({ canUndo: false, canRedo: true })
    await allSaved(tab)
    expect(readBudget(server.doc).lines.via?.loss).toBeNull()
    tab.redo()
    await allSaved(tab)
    expect(readBudget(server.doc).lines.via?.loss).toBe('1 dB')
    expect(tab.redo()).toMatchObject({ ok: false })
    expect(server.accepted.length).toBe(3)
  })

  test('a viewer is told at once, and nothing is sent', async () => {
    server.role = 'viewer'
    const tab = await browser.openLive()
    expect(tab.edit([setLoss('1 dB')])).toMatchObject({ ok: false, reason: expect.stringContaining('read') })
    expect(tab.getSnapshot()).toMatchObject({ unsaved: 0, role: 'viewer' })
    expect(tab.getSnapshot().budget?.lines.via?.loss).toBeNull()
  })

  test('an edit that the rules refuse is refused here, with the operation', async () => {
    const tab = await browser.openLive()
    expect(tab.edit([setLoss('1 dB'), setLoss('-1 dB')])).toMatchObject({ ok: false, index: 1 })
    expect(tab.getSnapshot()).toMatchObject({ unsaved: 0, canUndo: false })
  })

  test('[W3.61] people present come from the server; the cell is told, also after a reconnect', async () => {
    const tab = await browser.openLive()
    expect((await until(tab, (now) => now.people.length > 0)).people[0]).toMatchObject({ name: 'A', me: true })
    const cell = { section: 'lines', id: 'via', field: 'loss' }
    const told = once(server.cells, 'cell')
    tab.setCell(cell)
    expect(await told).toEqual([cell])
    const again = once(server.cells, 'cell')
    server.cutAll()
    await until(tab, (now) => now.people.length === 0)
    expect(await again).toEqual([cell])
  })

  test('the trail grows at its head; what is sent twice is not doubled', async () => {
    const tab = await browser.openLive()
    const entry = (seq: number): TrailEntry => ({
      seq,
      epoch: 1,
      kind: 'edit',
      editId: `e${seq}`,
      person: 'ben',
      personName: 'B',
      door: 'screen',
      time: seq,
      changes: [],
      effects: [],
      hash: `h${seq}`,
    })
    server.tell([entry(1), entry(2)])
    server.tell([entry(2), entry(3)])
    const now = await until(tab, (next) => next.trail.length === 3)
    expect(now.trail.map((each) => each.seq)).toEqual([3, 2, 1])
  })

  test('[W10.69] told to reload again and again without a welcome, the page gives up and says so', async () => {
    const tab = await browser.openLive()
    server.neverWelcome = true
    server.closeAll(CLOSE.reload.code)
    const now = await until(tab, (next) => next.connection.state === 'closed')
    expect(now.connection).toMatchObject({ code: CLOSE.reload.code, words: expect.stringContaining('reload') })
    expect(server.connections).toBe(4)
  })

  test('[W2.72] a tab that is closed for good lets another one send', async () => {
    const first = await browser.openLive()
    const second = await browser.openLive()
    server.closeFirst(CLOSE.slowHello.code)
    await until(first, (now) => now.connection.state === 'closed')
    second.edit([setLoss('1 dB')])
    await allSaved(second)
    expect(server.accepted.length).toBe(1)
  })

  test.each([
    ['sign-in ran out', CLOSE.signInAgain.code, 'closed'],
    ['refused too often', CLOSE.refused.code, 'closed'],
    ['message too big', 1009, 'closed'],
    ['server restarts', CLOSE.restart.code, 'offline'],
    ['disk trouble', CLOSE.notReady.code, 'offline'],
  ])('[W10.61] %s: close code %i leaves the session %s', async (_name, code, state) => {
    const tab = await browser.openLive()
    server.closeAll(code)
    const now = await until(tab, (next) => next.connection.state !== 'live')
    expect(now.connection).toMatchObject({ state, code })
    if (state === 'closed') expect(tab.edit([setLoss('1 dB')])).toMatchObject({ ok: false })
    else await until(tab, (next) => next.connection.state === 'live')
    expect(server.connections).toBe(state === 'closed' ? 1 : 2)
  })
})
