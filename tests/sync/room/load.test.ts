import { describe, expect, it } from 'vitest'
import * as Y from 'yjs'
import { sealEntry } from '../../../lib/records/journal/entry'
import type { Journal, Row } from '../../../lib/records/journal/types'
import { sha256Hex } from '../../../lib/records/sha256'
import { readBudget } from '../../../lib/sheet/seed'
import { loadDocument } from '../../../lib/sync/room/load'
import { setLoss } from '../support/changes'
import { Page } from '../support/page'
import { PEOPLE } from '../support/sessions'
import { openWorld } from '../support/world'

/** A budget with some edits, its server stopped. */
async function written() {
  const world = await openWorld()
  const budget = await world.createBudget()
  const ann = await Page.open(world, budget, 'ann')
  for (let count = 1; count <= 5; count++) await ann.answer(ann.edit(setLoss(`${count} dB`)))
  const rows = await world.journal.rows(budget, 0)
  return { world, budget, rows, page: ann }
}

/** A journal whose rows are these. */
function over(
  journal: Journal,
  rows: readonly Row[],
  snapshot: Awaited<ReturnType<Journal['loadSnapshot']>> = null,
): Journal {
  return {
    ...journal,
    loadSnapshot: async () => snapshot,
    rows: async (_, after) => rows.filter(({ entry }) => entry.seq > after),
    latest: async () => rows.map(({ entry }) => entry).reverse(),
  }
}

describe('loading', () => {
  it('[W8.22] a broken chain, a changed update or a missing part: not served, and said why', async () => {
    const { world, budget, rows } = await written()
    const change = (index: number, with_: (row: Row) => Row) => rows.map((row, at) => (at === index ? with_(row) : row))
    const cases: [string, readonly Row[], string][] = [
      ['a row is missing', rows.filter((_, at) => at !== 2), 'entry 3'],
      ['an update was changed', change(2, (row) => ({ ...row, update: new Uint8Array([0, 0]) })), 'entry 3'],
      [
        'a person was changed',
        change(3, ({ entry, update }) => ({ entry: { ...entry, person: 'ben' }, update })),
        'entry 4',
      ],
      ['an edit that hangs on a missing one', without(rows, 2), 'missing'],
    ]
    for (const [what, broken, words] of cases) {
      const loaded = await loadDocument(over(world.journal, broken), budget)
      expect({ what, loaded }).toMatchObject({ what, loaded: { damaged: expect.stringContaining(words) } })
    }
    expect(await loadDocument(over(world.journal, []), budget)).toBeNull()
  })

  it('[W8.21] a snapshot that does not fit costs a longer replay and nothing else', async () => {
    const { world, budget, rows } = await written()
    const whole = await loadDocument(over(world.journal, rows), budget)
    if (!whole || 'damaged' in whole) throw new Error('not loaded')
    const state = Y.encodeStateAsUpdateV2(whole.doc)
    const fit = { seq: rows.length, hash: whole.head.hash, state, sha256: sha256Hex(state) }
    const snapshots = [fit, { ...fit, seq: 4, hash: 'a'.repeat(64) }, { ...fit, state: new Uint8Array([1, 2, 3]) }]
    for (const snapshot of snapshots) {
      const loaded = await loadDocument(over(world.journal, rows, snapshot), budget)
      if (!loaded || 'damaged' in loaded) throw new Error('not loaded')
      expect(readBudget(loaded.doc)).toEqual(readBudget(whole.doc))
      expect(loaded.head).toEqual(whole.head)
      expect(loaded.lastEdit).toEqual(rows.at(-1)?.entry)
      expect(loaded.snapshotSeq).toBe(snapshot === fit ? rows.length : 0)
    }
  })

  it('[W8.22] a damaged budget is not served while the others are; the list says why', async () => {
    const { world, budget } = await written()
    const sound = await world.createBudget()
    await world.stop()
    const again = await world.start((journal) => ({
      ...journal,
      loadSnapshot: async () => null,
      rows: async (id, after) =>
        (await journal.rows(id, after)).filter(({ entry }) => id !== budget || entry.seq !== 3),
    }))
    const opening = Page.open(again, budget, 'ann')
    await expect(opening).rejects.toThrow(/4503 The chain of entries breaks at entry 3/)
    await Page.open(again, sound, 'ann')
    const list = await again.sync.budgets.list(PEOPLE.ann)
    expect(list.map(({ id, locked, verdict }) => [id, locked !== null, verdict])).toEqual([
      [budget, true, 'undecided'],
      [sound, false, 'inside'],
    ])
    expect(await again.sync.budgets.read(budget)).toBeNull()
    expect(world.logged.join()).toContain('breaks at entry 3')
  })
})

/** The chain sealed anew without one row: sound, and yet something is missing. */
function without(rows: readonly Row[], index: number): Row[] {
  const sealed: Row[] = []
  for (const { entry, update } of rows.filter((_, at) => at !== index)) {
    const { v: _v, updateSha256: _u, prev: _p, hash: _h, ...parts } = entry
    const previous = sealed.at(-1)?.entry
    sealed.push({
      entry: sealEntry({ ...parts, seq: sealed.length + 1 }, update, previous?.hash ?? '0'.repeat(64)),
      update,
    })
  }
  return sealed
}
