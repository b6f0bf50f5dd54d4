import type { Budget, Scalar } from '../../../../../lib/budget/schema'
import type { Operation } from '../../../../../lib/sheet/change'
import { newId } from '../../../../../lib/sheet/ids'
import { orderForInsert, type Row, rowsInOrder } from '../../../../../lib/sheet/order'
import { setField } from './records'

/** What people do with the rows of the channel, as operations on the sheet. */

export type NewRow = { readonly section: 'lines' | 'planes'; readonly values: Readonly<Record<string, Scalar>> }

/** Rows that are in the budget, in channel order. `keep`: rows that stay although removed, since somebody types in them. */
export function shownRows(budget: Budget, keep: (row: Row) => boolean = () => false): readonly Row[] {
  return rowsInOrder(budget).filter((row) => !budget[row.section][row.id]?.removed || keep(row))
}

/** Adds a row below another, or at the end. @returns the operations and the new record's id, to put the focus there. */
export function addRow(
  budget: Budget,
  below: string | null,
  row: NewRow,
): { readonly operations: readonly Operation[]; readonly id: string } {
  const id = newId()
  const after = below ?? rowsInOrder(budget).at(-1)?.id ?? null
  const { order, shifts } = orderForInsert(budget, after)
  return { operations: [{ op: 'add', section: row.section, id, values: { ...row.values, order } }, ...shifts], id }
}

/** Moves a row past its shown neighbour; nothing at the ends. Only the moved row is written where its keys allow it. */
export function moveRow(budget: Budget, id: string, by: -1 | 1): readonly Operation[] {
  const rows = shownRows(budget)
  const from = rows.findIndex((row) => row.id === id)
  const row = rows[from]
  const neighbour = rows[from + by]
  if (!row || !neighbour) return []
  const after = by > 0 ? neighbour.id : (rows[from - 2]?.id ?? null)
  const { order, shifts } = orderForInsert(budget, after, id)
  return [setField(row.section, id, 'order', order), ...shifts]
}

export function removeRow(row: Pick<Row, 'section' | 'id'>): readonly Operation[] {
  return [setField(row.section, row.id, 'removed', true)]
}

export function restoreRow(row: Pick<Row, 'section' | 'id'>): readonly Operation[] {
  return [setField(row.section, row.id, 'removed', false)]
}
