import type { Evaluation } from '../../../../../lib/budget/evaluation'
import type { Budget } from '../../../../../lib/budget/schema'
import { frequencyWords } from '../../../../words/decibels'

/** Frequency that a number typed without one is taken to be stated at: the allowance's in view, else the Nyquist frequency. */
export function statedAt(budget: Budget, evaluation: Evaluation, allowance: string | null): string | null {
  const typed = allowance === null ? null : (budget.allowances[allowance]?.at ?? null)
  const { nyquist } = evaluation.signalling
  return typed ?? (nyquist === null ? null : frequencyWords(nyquist))
}
