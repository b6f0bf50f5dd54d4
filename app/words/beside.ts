import type { LossAt } from '../../lib/budget/evaluation'
import type { Beside } from '../../lib/budget/models/piece'
import { decibels, signedDecibels } from './decibels'

export type Term = { readonly term: string; readonly value: string }

const WHAT: Readonly<Record<Beside['what'], string>> = {
  mismatch: "by mismatch in the link's reference",
  dissipated: 'turned into heat',
  native: "in the file's own reference",
  point: 'at the point, ripple included',
}

const BY: Readonly<Record<NonNullable<LossAt['by']>, string>> = {
  stated: 'as stated',
  moved: 'moved in frequency',
  table: 'between points',
  computed: 'computed',
  measured: 'out of its file',
}

/** How the number was found, and the other ways to look at it: none of them counts in the sum. */
export function besideWords({ by, beside }: Pick<LossAt, 'by' | 'beside'>): readonly Term[] {
  const found = by === null ? [] : [{ term: 'found', value: BY[by] }]
  // A mismatch is a difference and may be negative; the others are losses.
  const others = beside.map(({ what, db }) => ({
    term: WHAT[what],
    value: `${what === 'mismatch' ? signedDecibels(db) : decibels(db)} dB`,
  }))
  return [...found, ...others]
}
