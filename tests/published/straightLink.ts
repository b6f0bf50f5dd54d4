import { generateNKeysBetween } from 'fractional-indexing'
import { evaluate } from '../../lib/budget/evaluate'
import type { AllowanceEvaluation, Evaluation } from '../../lib/budget/evaluation'
import { type BudgetFile, budgetSchema } from '../../lib/budget/schema'

type Lines = NonNullable<BudgetFile['lines']>
type Part = Omit<Lines[string], 'order'>
type Allowance = NonNullable<BudgetFile['allowances']>[string]

export type StraightLink = {
  readonly head: Omit<BudgetFile['head'], 'schemaVersion'>
  readonly lossClasses?: BudgetFile['lossClasses']
  /** In channel order, between the two planes. */
  readonly parts: Readonly<Record<string, Part>>
  readonly planes: readonly [Code, Code]
  readonly allowance: Omit<Allowance, 'order' | 'from' | 'to'>
}
type Code = NonNullable<NonNullable<BudgetFile['planes']>[string]['code']>

/** A budget file of one allowance, with every line between its two planes. */
export function straightLink(link: StraightLink): BudgetFile {
  const ids = Object.keys(link.parts)
  const [first = '', ...keys] = generateNKeysBetween(null, null, ids.length + 2)
  return {
    head: { schemaVersion: 1, ...link.head },
    lossClasses: link.lossClasses ?? {},
    lines: Object.fromEntries(ids.map((id, n) => [id, { ...link.parts[id], order: keys[n] ?? '' }])),
    planes: {
      start: { order: first, code: link.planes[0] },
      end: { order: keys.at(-1) ?? '', code: link.planes[1] },
    },
    allowances: { limit: { ...link.allowance, order: 'a0', from: 'start', to: 'end' } },
  }
}

/** The way of every door: the file is checked against the schema, then evaluated. */
export function evaluateFile(file: BudgetFile): Evaluation {
  return evaluate(budgetSchema.parse(JSON.parse(JSON.stringify(file))), new Map())
}

export function onlyAllowance(evaluation: Evaluation): AllowanceEvaluation {
  const [allowance, ...others] = evaluation.allowances
  if (!allowance || others.length > 0) throw new Error('The budget has not exactly one allowance.')
  return allowance
}
