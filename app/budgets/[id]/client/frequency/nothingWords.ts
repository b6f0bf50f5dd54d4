import type { AllowanceEvaluation, Evaluation } from '../../../../../lib/budget/evaluation'
import type { Budget } from '../../../../../lib/budget/schema'

/** Why there is nothing to join, and what to do first. */
export function nothingWords(
  budget: Budget,
  { signalling }: Pick<Evaluation, 'signalling'>,
  { from, to, atHz, lines }: Pick<AllowanceEvaluation, 'from' | 'to' | 'atHz' | 'lines'>,
  lacking: number,
): string {
  if (from === null || to === null)
    return 'Nothing to join: the allowance does not know where it starts and ends. Choose its planes.'
  if (atHz === null || signalling.symbolRate === null)
    return 'Nothing to join: the band is not known. Give the rate and the code of the link.'
  if (budget.head.reference === null)
    return 'Nothing to join: two-ports are joined in a reference impedance. Give that of the link.'
  if (lines.length === 0) return 'Nothing to join: there is no line between the planes.'
  return lacking === 0
    ? 'Nothing to join: the lines have no frequencies in common, or give no number there.'
    : 'Nothing to join: no line between the planes has data over the band.'
}
