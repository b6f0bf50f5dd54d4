import type { SqlValue } from './connection'
import type { Entry, Row } from './types'

/** The columns of an entry, in the order in which `valuesOf` gives them; the update follows. */
const ENTRY_COLUMNS = [
  'v',
  'budget',
  'epoch',
  'seq',
  'kind',
  'editId',
  'person',
  'door',
  'time',
  'clientId',
  'updateSha256',
  'changes',
  'engine',
  'prev',
  'hash',
] as const

export const ENTRY = ENTRY_COLUMNS.join(', ')
export const ROW = `${ENTRY}, "update"`

const PARAMETERS = ENTRY_COLUMNS.length + 1

/** SQLite takes 32,766 parameters in one statement, and a commit is one statement. */
export const MAX_ROWS = Math.floor(32_766 / PARAMETERS)

export type StoredEntry = Omit<Entry, 'changes'> & { readonly changes: string }
export type StoredRow = StoredEntry & { readonly update: Uint8Array }

export function insertOf(rows: number): string {
  const values = `(${Array(PARAMETERS).fill('?').join(',')})`
  return `INSERT INTO entries (${ROW}) VALUES ${Array(rows).fill(values).join(',')}`
}

export function valuesOf({ entry, update }: Row): SqlValue[] {
  const stored: StoredEntry = { ...entry, changes: JSON.stringify(entry.changes) }
  return [...ENTRY_COLUMNS.map((column) => stored[column]), update]
}

export function toEntry(stored: StoredEntry): Entry {
  return { ...stored, changes: JSON.parse(stored.changes) }
}

export function toRow({ update, ...stored }: StoredRow): Row {
  return { entry: toEntry(stored), update: plainBytes(update) }
}

/** The driver answers Buffers; a plain Uint8Array over the same memory compares and encodes as callers expect. */
export function plainBytes(bytes: Uint8Array): Uint8Array {
  return new Uint8Array(bytes.buffer, bytes.byteOffset, bytes.byteLength)
}
