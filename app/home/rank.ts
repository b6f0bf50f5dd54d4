import type { AllowanceEvaluation, Evaluation } from '../../lib/budget/evaluation'
import { VERDICTS } from '../../lib/budget/schema'
import type { BudgetSummary } from '../../lib/sync/services'

/** Decibels that say how urgent an allowance is: its margin, or what is left. */
const air = (allowance: AllowanceEvaluation) => allowance.marginDb ?? allowance.leftDb ?? Number.POSITIVE_INFINITY

/** The allowance that decides a budget's verdict; of several, the one with the least air. Null without allowances. */
export function decidingAllowance(evaluation: Evaluation): AllowanceEvaluation | null {
  const same = evaluation.allowances.filter((allowance) => allowance.verdict === evaluation.verdict)
  return same.reduce<AllowanceEvaluation | null>((least, one) => (least && air(least) <= air(one) ? least : one), null)
}

/** The ones that need work come first: locked, then by verdict, then by margin, then by name. */
export function worstFirst(budgets: readonly BudgetSummary[]): BudgetSummary[] {
  const keyed = budgets.map((budget) => {
    const deciding = decidingAllowance(budget.evaluation)
    return {
      budget,
      rank: budget.locked === null ? VERDICTS.indexOf(budget.verdict) : -1,
      air: deciding ? air(deciding) : 0,
    }
  })
  keyed.sort((a, b) => a.rank - b.rank || a.air - b.air || a.budget.name.localeCompare(b.budget.name))
  return keyed.map(({ budget }) => budget)
}
