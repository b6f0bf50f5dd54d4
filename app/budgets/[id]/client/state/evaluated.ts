import { evaluate } from '../../../../../lib/budget/evaluate'
import type { Evaluation, EvidenceData } from '../../../../../lib/budget/evaluation'
import type { Budget } from '../../../../../lib/budget/schema'

type Known = { readonly networks: EvidenceData; readonly evaluation: Evaluation }
const known = new WeakMap<Budget, Known>()

/**
 * The evaluation of a budget, made once for each state of it and of what has been read of its files: the same function as
 * the server's.
 */
export function evaluated(budget: Budget, networks: EvidenceData): Evaluation {
  const last = known.get(budget)
  if (last?.networks === networks) return last.evaluation
  const evaluation = evaluate(budget, networks)
  known.set(budget, { networks, evaluation })
  return evaluation
}
