import type { AllowanceEvaluation, Evaluation } from '../../lib/budget/evaluation'

/**
 * Other judged conditions of the same limit: same planes, same frequency, same decibels. Limits between different planes
 * or at another frequency are never drawn into one picture.
 */
export function companionsOf(evaluation: Evaluation, allowance: AllowanceEvaluation): AllowanceEvaluation[] {
  return evaluation.allowances.filter(
    (other) =>
      other.id !== allowance.id &&
      other.from === allowance.from &&
      other.to === allowance.to &&
      other.atHz === allowance.atHz &&
      other.limitDb === allowance.limitDb,
  )
}

/** ± of the sum in dB: the evaluation's three standard deviations, grouped. */
export function threeSigma(allowance: AllowanceEvaluation): number | null {
  return allowance.rssDb
}
