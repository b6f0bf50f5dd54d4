import type { Evaluation } from '../../lib/budget/evaluation'
import type { Basis } from '../../lib/budget/schema'
import { PROOF_ORDER } from '../words/terms'

/** Decibels by basis of one allowance, most proven first, without those that nothing rests on. */
export function basisRows(evaluation: Evaluation, allowance: string): { basis: Basis | 'unsaid'; db: number }[] {
  const one = evaluation.allowances.find((other) => other.id === allowance)
  if (!one) return []
  return PROOF_ORDER.map((basis) => ({ basis, db: one.byBasis[basis] })).filter((row) => row.db > 0)
}
