import { expect, test } from 'vitest'
import { WebSocket } from 'ws'
import type { Operation } from '../../lib/sheet/change'
import { createMemory } from '../../lib/sheet/outbox'
import { noLocks, openSheet, type SheetSession } from '../../lib/sheet/session'
import { openWorld, PUBLIC_URL, type World } from '../sync/support/world'
import { canonical } from './sample'
import { allSaved, until } from './tabs'

/** A session of the page's own code at the real server: cookie and Origin as a browser sends them. */
async function openAt(world: World, budget: string, person: 'ann' | 'ben' | 'vera'): Promise<SheetSession> {
  class Cookied extends WebSocket {
    constructor(url: string) {
      super(url, { headers: { cookie: `session=${person}` }, origin: PUBLIC_URL })
    }
  }
  const session = openSheet({
    budget,
    person,
    url: world.url,
    storage: createMemory().open(),
    locks: noLocks,
    WebSocketPolyfill: Cookied as unknown as typeof globalThis.WebSocket,
    maxBackoff: 5,
  })
  await until(session, (now) => now.connection.state === 'live' && now.budget !== null)
  return session
}

const note = (text: string): Operation => ({ op: 'note', section: 'lines', id: 'trace', field: 'note', text })

/** Resolves when everybody has saved, and shows what the server keeps. */
async function settled(world: World, budget: string, ...sessions: SheetSession[]) {
  for (const session of sessions) await allSaved(session)
  const kept = await world.sync.budgets.read(budget)
  for (const session of sessions) await until(session, (now) => canonical(now.budget) === canonical(kept?.budget))
  return kept
}

test('[W2.80] the page and the server together: everything a person can do is journalled, and shown to everybody', async () => {
  const world = await openWorld()
  const budget = await world.createBudget()
  const ann = await openAt(world, budget, 'ann')
  const ben = await openAt(world, budget, 'ben')
  const vera = await openAt(world, budget, 'vera')
  try {
    expect(vera.edit([note('x')])).toMatchObject({ ok: false })
    ann.edit([
      { op: 'add', section: 'lines', id: 'pad', values: { order: 'a2V', name: 'Pad', note: 'die' } },
      { op: 'set', section: 'lines', id: 'pad', field: 'loss', value: '0.5 dB' },
      { op: 'lane', line: 'trace', lane: 2, field: 'length', value: '7 in' },
    ])
    ann.edit([note('Ann was here')])
    ben.edit([note('Ben too')])
    ben.edit([{ op: 'set', section: 'head', id: null, field: 'laneCount', value: 4 }])
    await settled(world, budget, ann, ben)
    ben.edit([{ op: 'set', section: 'lines', id: 'pad', field: 'name', value: "Ben's pad" }])
    await settled(world, budget, ben, ann)
    expect(ann.undo()).toEqual({ ok: true })
    expect(ann.undo()).toEqual({ ok: true })
    expect(ann.redo()).toEqual({ ok: true })
    const kept = await settled(world, budget, ann, ben)
    expect(kept?.budget.lines).toMatchObject({
      pad: { removed: false, name: "Ben's pad", loss: '0.5 dB' },
      trace: { note: 'Ben too' },
    })
    expect(kept?.budget.head.laneCount).toBe(4)
    expect(canonical(vera.getSnapshot().budget)).toBe(canonical(kept?.budget))
    const trail = await world.sync.budgets.trail(budget, { limit: 50 })
    const doors = trail?.filter((entry) => entry.kind === 'edit').map((entry) => entry.personName)
    expect(doors?.length).toBe(8)
    await until(ann, (now) => now.trail.filter((entry) => entry.kind === 'edit').length === 8)
    expect((await until(ann, (now) => now.people.length === 3)).people.map((one) => one.name).sort()).toEqual([
      'Ann Testa',
      'Ben Proba',
      'Vera Legge',
    ])
  } finally {
    await Promise.all([ann, ben, vera].map((each) => each.destroy()))
  }
  expect(world.logged).toEqual([])
})

test('[W10.80] two notes that together are too long: the later one is refused by the real gate and shown, what was done after it arrives', async () => {
  const world = await openWorld()
  const budget = await world.createBudget()
  const ann = await openAt(world, budget, 'ann')
  const ben = await openAt(world, budget, 'ben')
  try {
    ann.edit([note('a'.repeat(2500))])
    ben.edit([note('b'.repeat(2500))])
    ben.edit([{ op: 'set', section: 'lines', id: 'cable', field: 'name', value: 'Cable B' }])
    ann.edit([{ op: 'set', section: 'lines', id: 'trace', field: 'name', value: 'Trace A' }])
    const kept = await settled(world, budget, ann, ben)
    expect(kept?.budget.lines).toMatchObject({ cable: { name: 'Cable B' }, trace: { name: 'Trace A' } })
    const refused = [ann, ben].flatMap((each) => each.getSnapshot().refused)
    expect(refused).toMatchObject([{ code: 'invalid-result', parts: [{ place: { id: 'trace', field: 'note' } }] }])
    expect([kept?.budget.lines.trace?.note, refused[0]?.parts[0]?.typed].sort()).toEqual([
      'a'.repeat(2500),
      'b'.repeat(2500),
    ])
    refused[0]?.dismiss()
  } finally {
    await Promise.all([ann, ben].map((each) => each.destroy()))
  }
})

test('[W3.80] signed out with an edit unsaved: the page says so and keeps it', async () => {
  const world = await openWorld()
  const budget = await world.createBudget()
  const ann = await openAt(world, budget, 'ann')
  try {
    world.sessions.end('session-ann')
    ann.edit([note('too late')])
    const now = await until(ann, (next) => next.connection.state === 'closed')
    expect(now).toMatchObject({ unsaved: 1, refused: [], connection: { code: 4401, words: 'Sign in again.' } })
  } finally {
    await ann.destroy()
  }
})
