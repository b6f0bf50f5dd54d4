import type { Budget, Scalar } from '../../budget/schema'
import type { Entry, Journal } from '../../records/journal/types'
import type { Change } from '../../sheet/change'
import type { Evaluator } from '../evaluator'
import { effectsBetween } from './effects'
import type { BudgetState } from './room'

/** As many entries as one group of commits may leave without effects when the process ends at once. */
const LOOKED_AT = 100

/**
 * Effects are found after the commit, so a process that ends in between leaves the last ones out. Finds them from the changes,
 * going back from the present budget.
 */
export async function fillEffects(
  journal: Journal,
  evaluator: Pick<Evaluator, 'margins'>,
  budget: string,
  present: BudgetState,
): Promise<void> {
  const { seq: last } = present.head
  const latest = await journal.latest(budget, { before: last + 1, limit: LOOKED_AT })
  const entries = latest.filter(({ kind }) => kind === 'edit')
  const known = await journal.effects(
    budget,
    entries.map(({ seq }) => seq),
  )
  const missing = entries.findLastIndex(({ seq }) => !known.has(seq))
  if (missing < 0) return
  const found: { seq: number; effects: ReturnType<typeof effectsBetween> }[] = []
  let after = present.budget
  let later = await evaluator.margins(after)
  for (const entry of entries.slice(0, missing + 1)) {
    const before = budgetBefore(after, entry)
    const earlier = await evaluator.margins(before)
    if (!known.has(entry.seq)) found.push({ seq: entry.seq, effects: effectsBetween(before, earlier, after, later) })
    after = before
    later = earlier
  }
  await journal.saveEffects(budget, found)
}

/** The budget before an entry, from the budget after it. */
export function budgetBefore(after: Budget, entry: Pick<Entry, 'changes'>): Budget {
  const before = structuredClone(after)
  for (const change of entry.changes.toReversed()) undo(before, change)
  return before
}

function undo(budget: Budget, change: Change): void {
  if (change.kind === 'overtaken') return
  if (change.section === 'head') {
    set(budget.head, change.field, change.before)
  } else if (change.section === 'laneValues') {
    set(budget.laneValues, `${change.id}/${change.field}`, change.before)
  } else if (change.kind === 'add') {
    delete budget[change.section][change.id]
  } else {
    const record = budget[change.section][change.id]
    if (record) set(record, change.field, change.before)
  }
}

function set(fields: object, field: string, value: Scalar): void {
  Reflect.set(fields, field, value)
}
