import type { AllowanceEvaluation } from '../../lib/budget/evaluation'
import type { Budget } from '../../lib/budget/schema'
import { decibels } from '../words/decibels'

/** Whose share is overrun, largest first: flagged even where the total fits. */
export function pastShares(allowance: AllowanceEvaluation, budget: Budget): string[] {
  const past = allowance.shares.filter((share) => share.freeDb < -0.005).sort((a, b) => a.freeDb - b.freeDb)
  return past.map(({ of, freeDb }) => {
    const record = of.kind === 'assembly' ? budget.assemblies[of.ref] : of.kind === 'line' ? budget.lines[of.ref] : null
    return `${record?.name?.trim() || of.ref}: ${decibels(-freeDb)} dB past its share`
  })
}
