import { sha256Hex } from '../sha256'
import { entryHash, GENESIS } from './entry'
import type { Row } from './types'

/** Where a chain breaks: the seq that was expected there, and why. */
export type ChainBreak = { readonly seq: number; readonly what: string }

/**
 * Walks the rows of one budget in order and says where the chain breaks first, or null. A sound chain says nothing about
 * its end: compare the last hash with an anchor.
 * @param after the entry before the first row; by default the rows start at the budget's beginning
 */
export function verifyEntries(
  rows: Iterable<Row>,
  after: { readonly seq: number; readonly hash: string } = { seq: 0, hash: GENESIS },
): ChainBreak | null {
  let previous = after
  let budget: string | null = null
  for (const row of rows) {
    const what = breakBetween(previous, budget, row)
    if (what) return { seq: previous.seq + 1, what }
    previous = row.entry
    budget = row.entry.budget
  }
  return null
}

function breakBetween(previous: { seq: number; hash: string }, budget: string | null, row: Row): string | null {
  const { entry, update } = row
  if (entry.seq !== previous.seq + 1) return `seq ${entry.seq} does not follow ${previous.seq}`
  if (budget !== null && entry.budget !== budget) return 'the entry belongs to another budget'
  if (entry.prev !== previous.hash) return 'prev is not the hash of the entry before'
  if (entry.updateSha256 !== sha256Hex(update)) return 'the update is not the one that was hashed'
  if (entry.hash !== hashOrNull(row)) return 'the entry is not what was hashed'
  return null
}

/** Damaged rows may hold what has no canonical form; that is a break, not a failure of the check. */
function hashOrNull(row: Row): string | null {
  try {
    return entryHash(row.entry)
  } catch {
    return null
  }
}
