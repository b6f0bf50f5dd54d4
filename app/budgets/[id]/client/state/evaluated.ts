import { evaluate } from '../../../../../lib/budget/evaluate'
import type { Evaluation, EvidenceData } from '../../../../../lib/budget/evaluation'
import type { Budget } from '../../../../../lib/budget/schema'

const NO_EVIDENCE: EvidenceData = new Map()
const known = new WeakMap<Budget, Evaluation>()

/** The evaluation of a budget, made once for each state of it: the same function as the server's. */
export function evaluated(budget: Budget): Evaluation {
  const evaluation = known.get(budget) ?? evaluate(budget, NO_EVIDENCE)
  known.set(budget, evaluation)
  return evaluation
}
