import type { AllowanceEvaluation, Evaluation } from '../../lib/budget/evaluation'
import type { Basis, Budget, Grade, Owner } from '../../lib/budget/schema'

/** One line with what the picture needs of it. */
export type SpanLine = {
  readonly id: string
  readonly number: number
  readonly name: string
  readonly place: 'inside' | 'before' | 'after'
  readonly countedDb: number | null
  readonly lowDb: number | null
  readonly highDb: number | null
  readonly lengthM: number | null
  readonly basis: Basis | null
  readonly grade: Grade
  readonly owner: Owner | null
  readonly group: string
  readonly overlap: boolean
  readonly assembly: string | null
}

export type Span = {
  readonly lines: readonly SpanLine[]
  /** Planes with the index of the line that follows them. */
  readonly planes: readonly { readonly id: string; readonly at: number }[]
  readonly allowance: AllowanceEvaluation | null
}

/**
 * The lines in channel order as one allowance sees them. Without the allowance, or where one of its planes is missing,
 * every line is inside with its own nominal loss: the level can still be drawn, the ground cannot.
 */
export function spanOf(evaluation: Evaluation, budget: Budget, allowanceId: string): Span {
  const allowance = evaluation.allowances.find((one) => one.id === allowanceId) ?? null
  const bounded = allowance !== null && allowance.from !== null && allowance.to !== null
  const counted = new Map(bounded ? allowance.lines.map((line) => [line.id, line]) : [])
  const planes: { id: string; at: number }[] = []
  const lines: SpanLine[] = []
  let place: SpanLine['place'] = bounded ? 'before' : 'inside'
  for (const row of evaluation.rows) {
    if ('plane' in row) {
      planes.push({ id: row.plane, at: lines.length })
      if (bounded && row.plane === allowance.from && place === 'before') place = 'inside'
      else if (bounded && row.plane === allowance.to) place = 'after'
      continue
    }
    const line = budget.lines[row.line]
    const facts = evaluation.lines[row.line]
    if (!line || !facts) continue
    const { nominalDb, lowDb, highDb } = facts.loss
    const own = { countedDb: line.kind === 'overlap' && nominalDb !== null ? -nominalDb : nominalDb, lowDb, highDb }
    const known = counted.get(row.line) ?? own
    lines.push({
      id: row.line,
      number: lines.length + 1,
      name: line.name?.trim() || line.kind || 'line',
      place,
      countedDb: known.countedDb,
      lowDb: known.lowDb,
      highDb: known.highDb,
      lengthM: facts.lengthM,
      basis: facts.basis,
      grade: facts.grade,
      owner: facts.owner,
      group: facts.group,
      overlap: line.kind === 'overlap',
      assembly: line.assembly,
    })
  }
  return { lines, planes, allowance }
}
