import { evaluate } from '../../budget/evaluate'
import { type MarginSummary, margins } from '../../budget/margins'
import type { Budget } from '../../budget/schema'
import type { Effect } from '../../sheet/wire'

/**
 * What an edit did to each allowance's verdict and margin: only those that moved. Derived from two states of the budget and
 * so recomputable at any time (write path, rule 5).
 */
export function effectsOf(before: Budget, after: Budget): Effect[] {
  return effectsBetween(before, marginsOf(before), after, marginsOf(after))
}

export type Margins = Readonly<Record<string, MarginSummary>>

export function marginsOf(budget: Budget): Margins {
  return margins(evaluate(budget, new Map()))
}

/** The same with the margins known, for a run of edits of which each starts where the last one ended. */
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
