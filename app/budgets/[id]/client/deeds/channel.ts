import { generateKeyBetween } from 'fractional-indexing'
import type { Budget, Scalar } from '../../../../../lib/budget/schema'
import type { Operation } from '../../../../../lib/sheet/change'
import { type ChannelRow, channelRows, newId, setField } from './place'

/** What people do with the rows of the channel, as operations on the sheet. */

export type NewRow = { readonly section: 'lines' | 'planes'; readonly values: Readonly<Record<string, Scalar>> }

/** Adds a row below another, or at the end. @returns the operation and the new record's id, to put the focus there. */
export function addRow(budget: Budget, below: string | null, row: NewRow): { operations: Operation[]; id: string } {
  const id = newId(row.section === 'lines' ? 'line' : 'plane')
  const values = { ...row.values, order: orderBelow(channelRows(budget), below) }
  return { operations: [{ op: 'add', section: row.section, id, values }], id }
}

/** Moves a row by one place; nothing at the ends. Only the moved row is written, so two people can move at once. */
export function moveRow(budget: Budget, id: string, by: -1 | 1): Operation[] {
  const rows = channelRows(budget)
  const from = rows.findIndex((row) => row.id === id)
  const row = rows[from]
  const to = from + by
  if (!row || to < 0 || to >= rows.length) return []
  return [setField(sectionOf(row), id, 'order', orderAfter(rows, by < 0 ? to - 1 : to))]
}

export function removeRow(row: Pick<ChannelRow, 'kind' | 'id'>): Operation[] {
  return [setField(sectionOf(row), row.id, 'removed', true)]
}

export const sectionOf = (row: Pick<ChannelRow, 'kind'>) => (row.kind === 'line' ? 'lines' : 'planes')

function orderBelow(rows: readonly ChannelRow[], below: string | null): string {
  const at = below === null ? rows.length - 1 : rows.findIndex((row) => row.id === below)
  return orderAfter(rows, at)
}

/**
 * A key that comes after rows[at] (-1: before all). Two rows made at the same moment may carry one key and be told apart by
 * id only; no key lies between them, so the new row goes below all of them.
 */
function orderAfter(rows: readonly ChannelRow[], at: number): string {
  const low = rows[at]?.order ?? null
  const high = rows.slice(at + 1).find((row) => low === null || row.order > low)?.order ?? null
  return generateKeyBetween(low, high)
}
