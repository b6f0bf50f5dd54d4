import { evaluate } from '../../lib/budget/evaluate'
import { type Budget, budgetSchema, type Verdict } from '../../lib/budget/schema'
import osier from '../../seed-scenarios/osier.json'
import sedge from '../../seed-scenarios/sedge.json'
import tamarack from '../../seed-scenarios/tamarack.json'

export type Scenario = {
  readonly id: string
  readonly name: string
  readonly description: string
  readonly verdict: Verdict
  readonly words: string
  readonly budget: Budget
}

/** The invented example links that a budget can start from. */
export function scenarios(): Scenario[] {
  return Object.entries({ tamarack, osier, sedge }).map(([id, file]) => {
    const budget = budgetSchema.parse(file)
    const { verdict, allowances } = evaluate(budget, new Map())
    const deciding = allowances.find((allowance) => allowance.verdict === verdict)
    return {
      id,
      name: budget.head.name ?? id,
      description: [budget.head.protocol, budget.head.description].filter(Boolean).join('. '),
      verdict,
      words: deciding?.words ?? verdict,
      budget,
    }
  })
}
