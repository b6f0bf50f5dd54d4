import { readFileSync } from 'node:fs'
import type { BudgetFile } from '../../lib/budget/schema'

/** One row of an example's table as it is printed: decibels, ± decibels and the correlation group ('' varies on its own). */
export type Row = readonly [line: string, db: number, plusMinus: number, group: string]

/** What the rows of a table come to on paper, computed from nothing but the printed figures. */
export function byHand(rows: readonly Row[]) {
  let total = 0
  let worst = 0
  let alone = 0
  const groups = new Map<string, number>()
  for (const [, db, plusMinus, group] of rows) {
    total += db
    worst += db + plusMinus
    if (group === '') alone += plusMinus * plusMinus
    else groups.set(group, (groups.get(group) ?? 0) + plusMinus)
  }
  // Linear inside a group, root of the sum of squares between groups; ± is a limit read as three sigma.
  let squares = alone
  for (const linear of groups.values()) squares += linear * linear
  return { total, worst, grouped: Math.sqrt(squares) }
}

export const plain = (...terms: number[]) => terms.reduce((total, term) => total + term, 0)

export function scenario(name: string): BudgetFile {
  const folder = new URL('../../seed-scenarios/', import.meta.url)
  return JSON.parse(readFileSync(new URL(`${name}.json`, folder), 'utf8')) as BudgetFile
}

type Lines = NonNullable<BudgetFile['lines']>
type Allowances = NonNullable<BudgetFile['allowances']>

/** The file with some fields of one line set otherwise. */
export function withLine(file: BudgetFile, id: string, change: Partial<Lines[string]>): BudgetFile {
  return { ...file, lines: { ...file.lines, [id]: { ...existing(file.lines, id), ...change } } }
}

export function withAllowance(file: BudgetFile, id: string, change: Partial<Allowances[string]>): BudgetFile {
  return { ...file, allowances: { ...file.allowances, [id]: { ...existing(file.allowances, id), ...change } } }
}

export function withLossPerLength(file: BudgetFile, id: string, lossPerLength: string): BudgetFile {
  return { ...file, lossClasses: { ...file.lossClasses, [id]: { ...existing(file.lossClasses, id), lossPerLength } } }
}

function existing<T>(records: Record<string, T> | undefined, id: string): T {
  const record = records?.[id]
  if (record === undefined) throw new Error(`The file has no '${id}'.`)
  return record
}
