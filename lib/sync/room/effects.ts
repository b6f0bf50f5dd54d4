import type { MarginSummary } from '../../budget/margins'
import type { Budget } from '../../budget/schema'
import type { Effect } from '../../sheet/wire'
import type { Margins } from '../evaluator'

/**
 * What an edit did to each allowance's verdict and margin: only those that moved. Derived from the margins of two states of the
 * budget and so recomputable at any time (write path, rule 5).
 */
export function effectsBetween(before: Budget, earlier: Margins, after: Budget, later: Margins): Effect[] {
  const allowances = [...new Set([...Object.keys(earlier), ...Object.keys(later)])]
  return allowances
    .map((allowance) => ({
      allowance,
      name: nameIn(after, allowance) ?? nameIn(before, allowance) ?? '',
      before: earlier[allowance] ?? null,
      after: later[allowance] ?? null,
    }))
    .filter((effect) => !same(effect.before, effect.after))
}

function nameIn(budget: Budget, allowance: string): string | null {
  return Object.hasOwn(budget.allowances, allowance) ? (budget.allowances[allowance]?.name ?? null) : null
}

function same(a: MarginSummary | null, b: MarginSummary | null): boolean {
  if (a === null || b === null) return a === b
  return a.verdict === b.verdict && close(a.marginDb, b.marginDb) && close(a.knownDb, b.knownDb)
}

/** A sum in another order differs in its last digits; that is no effect of anything. */
function close(a: number | null, b: number | null): boolean {
  return a === null || b === null ? a === b : Math.abs(a - b) < 1e-9
}
