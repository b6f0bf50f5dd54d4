import { generateKeyBetween, generateNKeysBetween } from 'fractional-indexing'
import type { Budget } from '../budget/schema'
import type { Operation } from './change'

/** A line or a plane in channel order; both share one space of order keys. */
export type Row = { readonly section: 'lines' | 'planes'; readonly id: string; readonly order: string }

/** Beyond this length (of 128 allowed) the next insertion gives every row a new, short key. */
const LONG_KEY = 100

/** Lines and planes in channel order, removed ones too: by order key as UTF-16 code units, ties broken by id. */
export function rowsInOrder(budget: Budget): Row[] {
  const rows = (['lines', 'planes'] as const).flatMap((section) =>
    Object.entries(budget[section]).map(([id, record]): Row => ({ section, id, order: record.order })),
  )
  return rows.sort(compareRows)
}

export function compareRows(a: { order: string; id: string }, b: { order: string; id: string }): number {
  if (a.order !== b.order) return a.order < b.order ? -1 : 1
  return a.id < b.id ? -1 : a.id > b.id ? 1 : 0
}

/**
 * A key that sorts after a and before b; null in place of a neighbour stands for an end.
 * @returns null where there is none: both keys are equal (two people inserted at the same place at once), or one of them
 * is not such as the library makes (the schema admits 'a10'). orderForInsert then gives the neighbours new keys.
 */
export function orderBetween(a: string | null, b: string | null): string | null {
  if (a !== null && b !== null && a >= b) return null
  try {
    return generateKeyBetween(a, b)
  } catch {
    return null
  }
}

/**
 * Where a new or moved row goes.
 * @param after id of the row that it comes after, or null for the start
 * @param moving id of the row that is moved, which is no neighbour to itself
 * @returns its key, and operations that give other rows new keys where equal, unusable or overlong ones stand in the way;
 * put them into the same edit
 */
export function orderForInsert(
  budget: Budget,
  after: string | null,
  moving: string | null = null,
): { order: string; shifts: Operation[] } {
  const rows = rowsInOrder(budget).filter((row) => row.id !== moving)
  const at = after === null ? 0 : rows.findIndex((row) => row.id === after) + 1
  const previous = rows[at - 1]?.order ?? null
  const behind = rows.slice(at)
  const crowd = behind.slice(0, behind.findLastIndex((row) => row.order === previous) + 1)
  const next = behind[crowd.length]?.order ?? null

  const keys: string[] = []
  for (let last = previous; keys.length <= crowd.length; ) {
    const key = orderBetween(last, next)
    if (key === null || key.length > LONG_KEY) return respaced(rows, at)
    keys.push(key)
    last = key
  }
  const [order = '', ...others] = keys
  return { order, shifts: crowd.map((row, index) => setOrder(row, others[index] ?? row.order)) }
}

function respaced(rows: readonly Row[], at: number): { order: string; shifts: Operation[] } {
  const keys = generateNKeysBetween(null, null, rows.length + 1)
  const [order = generateKeyBetween(null, null)] = keys.splice(at, 1)
  return { order, shifts: rows.map((row, index) => setOrder(row, keys[index] ?? row.order)) }
}

function setOrder(row: Row, order: string): Operation {
  return { op: 'set', section: row.section, id: row.id, field: 'order', value: order }
}
