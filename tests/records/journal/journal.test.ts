import { stat } from 'node:fs/promises'
import { join } from 'node:path'
import { describe, expect, onTestFinished, test } from 'vitest'
import { MAX_ROWS } from '../../../lib/records/journal/columns'
import { JournalRefused, TooManyRows } from '../../../lib/records/journal/errors'
import { openJournal } from '../../../lib/records/journal/open'
import type { Entry } from '../../../lib/records/journal/types'
import { verifyEntries } from '../../../lib/records/journal/verify'
import { sha256Hex } from '../../../lib/records/sha256'
import { temporaryDirectory } from '../temporary'
import { chain, lastOf } from './chain'

async function freshJournal() {
  const file = join(await temporaryDirectory(), 'journal.sqlite')
  const journal = await openJournal(file)
  onTestFinished(() => journal.close())
  return { file, journal }
}

describe('reading what was written', () => {
  test('an empty journal has no head, no rows, no budgets', async () => {
    const { journal } = await freshJournal()
    expect(await journal.head('b1')).toBeNull()
    expect(await journal.rows('b1', 0)).toEqual([])
    expect(await journal.budgets()).toEqual([])
    expect(await journal.loadSnapshot('b1')).toBeNull()
    await journal.append([])
  })

  test('rows come back as they were, in order, with their updates', async () => {
    const { journal } = await freshJournal()
    const rows = chain(5)
    await journal.append(rows)
    expect(await journal.rows('b1', 0)).toEqual(rows)
    expect(await journal.rows('b1', 3)).toEqual(rows.slice(3))
    expect(await journal.head('b1')).toEqual({ epoch: 1, seq: 5, hash: lastOf(rows).hash })
    expect(await journal.entries('b1', { after: 1, limit: 2 })).toEqual(rows.slice(1, 3).map((row) => row.entry))
    const newestFirst = rows.map((row) => row.entry).reverse()
    expect(await journal.latest('b1', { limit: 2 })).toEqual(newestFirst.slice(0, 2))
    expect(await journal.latest('b1', { before: 3, limit: 9 })).toEqual(newestFirst.slice(3))
  })

  test('budgets are apart: each has its own chain from its own first entry', async () => {
    const { journal } = await freshJournal()
    const one = chain(2, { budget: 'b1' })
    const two = chain(3, { budget: 'b2' })
    await journal.append([...one, ...two])
    expect(await journal.budgets()).toEqual(['b1', 'b2'])
    expect((await journal.head('b1'))?.seq).toBe(2)
    expect((await journal.head('b2'))?.seq).toBe(3)
  })

  test('[W2.1] an edit is found by its id; a bind row with the same id is not taken for it', async () => {
    const { journal } = await freshJournal()
    const edits = chain(2)
    await journal.append(edits)
    await journal.append(chain(1, { previous: lastOf(edits), kind: 'bind' }))
    expect((await journal.findEdit('b1', 'edit-2'))?.seq).toBe(2)
    expect(await journal.findEdit('b1', 'edit-3')).toBeNull()
    expect(await journal.findEdit('b2', 'edit-2')).toBeNull()
  })

  test('[W3.1] a client id belongs to the person who bound it first, over 2^31 too', async () => {
    const { journal } = await freshJournal()
    const first = chain(2, { kind: 'bind' })
    await journal.append(first)
    expect(await journal.bindings('b1')).toEqual(
      new Map([
        [4_000_000_001, 'p1'],
        [4_000_000_002, 'p1'],
      ]),
    )
  })

  test('an update may be empty, and text may hold any character that JSON can', async () => {
    const { journal } = await freshJournal()
    const rows = chain(1, { bytes: 0, budget: "b'\u0000Ω😀" })
    await journal.append(rows)
    expect(await journal.rows(lastOf(rows).budget, 0)).toEqual(rows)
  })

  test('a kind that a later version adds can be written and read', async () => {
    const { journal } = await freshJournal()
    const rows = chain(1, { kind: 'seal' as Entry['kind'] })
    await journal.append(rows)
    expect((await journal.latest('b1', { limit: 1 }))[0]?.kind).toBe('seal')
    expect(verifyEntries(await journal.rows('b1', 0))).toBeNull()
  })

  test('2,000 rows in 100 commits, closed and opened again, are one sound chain', async () => {
    const { file, journal } = await freshJournal()
    const rows = chain(2000)
    for (let index = 0; index < rows.length; index += 20) await journal.append(rows.slice(index, index + 20))
    const again = await openJournal(file)
    onTestFinished(() => again.close())
    const read = await again.rows('b1', 0)
    expect(read).toEqual(rows)
    expect(verifyEntries(read)).toBeNull()
  })

  test('only the owner may read the files', async () => {
    const { file, journal } = await freshJournal()
    await journal.append(chain(1))
    for (const suffix of ['', '-wal', '-shm']) expect((await stat(file + suffix)).mode & 0o777).toBe(0o600)
  })
})

describe('one commit is one INSERT', () => {
  test('[W6.1] one row of five that does not follow stores none of them', async () => {
    const { journal } = await freshJournal()
    const rows = chain(5)
    for (let bad = 0; bad < 5; bad += 1) {
      const broken = rows.map((row, index) =>
        index === bad ? { ...row, entry: { ...row.entry, prev: 'f'.repeat(64) } } : row,
      )
      await expect(journal.append(broken)).rejects.toThrow(JournalRefused)
      expect(await journal.head('b1')).toBeNull()
    }
    await journal.append(rows)
    expect((await journal.head('b1'))?.seq).toBe(5)
  })

  test('[W6.2] the largest commit fits one INSERT; a larger one is refused whole', async () => {
    const { journal } = await freshJournal()
    const rows = chain(MAX_ROWS + 1)
    await expect(journal.append(rows)).rejects.toThrow(TooManyRows)
    expect(await journal.head('b1')).toBeNull()
    await journal.append(rows.slice(0, MAX_ROWS))
    expect((await journal.head('b1'))?.seq).toBe(MAX_ROWS)
  })

  test('[W2.2] the same edit id is stored once', async () => {
    const { journal } = await freshJournal()
    const rows = chain(2)
    await journal.append(rows)
    const again = chain(1, { previous: lastOf(rows) }).map((row) => ({
      ...row,
      entry: { ...row.entry, editId: 'edit-2' },
    }))
    await expect(journal.append(again)).rejects.toThrow(JournalRefused)
    expect((await journal.head('b1'))?.seq).toBe(2)
  })

  test('[W6.3] calls that are not awaited are written one after the other, with snapshots and effects between', async () => {
    const { journal } = await freshJournal()
    const rows = chain(60)
    const head = lastOf(rows.slice(0, 1))
    const state = new Uint8Array([1, 2, 3])
    await Promise.all(
      rows.flatMap((row) => [
        journal.append([row]),
        journal.saveSnapshot('b1', { seq: 1, hash: head.hash, state, sha256: sha256Hex(state) }),
        journal.saveEffects('b1', [{ seq: row.entry.seq, effects: [] }]),
      ]),
    )
    expect((await journal.rows('b1', 0)).length).toBe(60)
    expect((await journal.effects('b1', [1, 60])).size).toBe(2)
  })
})

describe('beside the chain', () => {
  const state = new Uint8Array([9, 8, 7])

  test('[W8.1] the newest snapshot whose hash holds and whose entry is in the chain', async () => {
    const { journal } = await freshJournal()
    const rows = chain(4)
    await journal.append(rows)
    const at = (seq: number, sha256 = sha256Hex(state)) => ({
      seq,
      hash: rows[seq - 1]?.entry.hash ?? '0'.repeat(64),
      state,
      sha256,
    })
    await journal.saveSnapshot('b1', at(2))
    expect(await journal.loadSnapshot('b1')).toEqual(at(2))
    await journal.saveSnapshot('b1', at(4, sha256Hex('something else')))
    expect(await journal.loadSnapshot('b1')).toEqual(at(2))
    await journal.saveSnapshot('b1', at(4))
    expect(await journal.loadSnapshot('b1')).toEqual(at(4))
  })

  test('[W8.2] a snapshot of an entry that the chain does not hold is not loaded', async () => {
    const { journal } = await freshJournal()
    const rows = chain(2)
    await journal.append(rows)
    const sha256 = sha256Hex(state)
    await journal.saveSnapshot('b1', { seq: 7, hash: lastOf(rows).hash, state, sha256 })
    expect(await journal.loadSnapshot('b1')).toBeNull()
    await journal.saveSnapshot('b1', { seq: 2, hash: 'a'.repeat(64), state, sha256 })
    expect(await journal.loadSnapshot('b1')).toBeNull()
  })

  test('effects are kept, replaced, and read by seq', async () => {
    const { journal } = await freshJournal()
    const effect = {
      allowance: 'a1',
      name: "Die to die, '≤ 28 dB'",
      before: null,
      after: { verdict: 'inside', marginDb: 1.0000000000000002e-7, knownDb: null },
    }
    await journal.saveEffects('b1', [])
    await journal.saveEffects('b1', [
      { seq: 1, effects: [] },
      { seq: 2, effects: [effect] },
    ])
    await journal.saveEffects('b1', [{ seq: 1, effects: [effect, effect] }])
    expect(await journal.effects('b1', [1, 2, 3])).toEqual(
      new Map([
        [1, [effect, effect]],
        [2, [effect]],
      ]),
    )
    expect(await journal.effects('b2', [1])).toEqual(new Map())
  })
})
