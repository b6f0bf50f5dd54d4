import { describe, expect, test } from 'vitest'
import { sealEntry } from '../../../lib/records/journal/entry'
import type { Entry, Row } from '../../../lib/records/journal/types'
import { verifyEntries } from '../../../lib/records/journal/verify'
import { chain, lastOf } from './chain'

/** The chain with one row replaced. */
function forged(rows: readonly Row[], seq: number, change: (row: Row) => Row): Row[] {
  return rows.map((row) => (row.entry.seq === seq ? change(row) : row))
}

const resealed = (row: Row, changes: Partial<Entry>): Row => {
  const { v, updateSha256, hash, prev, ...parts } = row.entry
  return { ...row, entry: sealEntry({ ...parts, ...changes }, row.update, prev) }
}

describe('where a chain breaks', () => {
  const rows = chain(6)

  test('nowhere, when it is whole; nor when it starts in the middle', () => {
    expect(verifyEntries([])).toBeNull()
    expect(verifyEntries(rows)).toBeNull()
    expect(verifyEntries(rows.slice(3), rows[2]?.entry)).toBeNull()
  })

  test.each<[string, (row: Row) => Row]>([
    ['the entry is not what was hashed', (row) => ({ ...row, entry: { ...row.entry, person: 'p2' } })],
    ['the entry is not what was hashed', (row) => ({ ...row, entry: { ...row.entry, hash: 'a'.repeat(64) } })],
    ['the entry is not what was hashed', (row) => ({ ...row, entry: { ...row.entry, engine: '\ud800' } })],
    ['the update is not the one that was hashed', (row) => ({ ...row, update: new Uint8Array([1]) })],
    ['prev is not the hash of the entry before', (row) => ({ ...row, entry: { ...row.entry, prev: 'a'.repeat(64) } })],
    ['seq 9 does not follow 3', (row) => ({ ...row, entry: { ...row.entry, seq: 9 } })],
    ['the entry belongs to another budget', (row) => ({ ...row, entry: { ...row.entry, budget: 'b2' } })],
  ])('%s', (what, change) => {
    expect(verifyEntries(forged(rows, 4, change))).toEqual({ seq: 4, what })
  })

  test('after an entry that was changed and hashed anew, at the next one', () => {
    const again = forged(rows, 4, (row) => resealed(row, { person: 'p2' }))
    expect(verifyEntries(again)).toEqual({ seq: 5, what: 'prev is not the hash of the entry before' })
  })

  test('at an entry that is missing, at the beginning or in the middle', () => {
    expect(verifyEntries(rows.slice(1))?.seq).toBe(1)
    expect(verifyEntries(rows.filter((row) => row.entry.seq !== 3))?.seq).toBe(3)
  })

  test('a missing end is no break: only an anchor shows it', () => {
    expect(verifyEntries(rows.slice(0, 4))).toBeNull()
    expect(lastOf(rows.slice(0, 4)).hash).not.toBe(lastOf(rows).hash)
  })
})
