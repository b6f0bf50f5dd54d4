import { evaluate } from '../../../lib/budget/evaluate'
import type { Evaluation, EvidenceData } from '../../../lib/budget/evaluation'
import type { FlagCode } from '../../../lib/budget/flags'
import type { BudgetFile } from '../../../lib/budget/schema'
import { link } from '../links'

export type Lines = NonNullable<BudgetFile['lines']>

/** 'line field' of every flag of one code that a link raises. */
export function flagged(code: FlagCode, parts: Partial<BudgetFile>, evidence: EvidenceData = new Map()): string[] {
  return evaluated(parts, evidence)
    .flags.filter((flag) => flag.code === code)
    .map(({ id, field }) => `${id} ${field}`)
}

/** What the only flag of this code says, and what it asks for. */
export function words(code: FlagCode, parts: Partial<BudgetFile>, evidence: EvidenceData = new Map()): string {
  const found = evaluated(parts, evidence).flags.filter((flag) => flag.code === code)
  if (found.length !== 1) throw new Error(`${found.length} flags of ${code}`)
  return `${found[0]?.message} ${found[0]?.todo}`
}

export function evaluated(parts: Partial<BudgetFile>, evidence: EvidenceData = new Map()): Evaluation {
  return evaluate(link(parts), evidence)
}
