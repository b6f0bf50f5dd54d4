import type { Change } from '../../sheet/change'
import type { Door, Effect } from '../../sheet/wire'

/**
 * One row of the journal. Rows of a budget form a chain: `hash` is the SHA-256 of the row's RFC 8785 JSON, in which the
 * update stands as its SHA-256 and `prev` is the hash before. A 'bind' row gives a Yjs client id to a person.
 */
export type Entry = {
  readonly v: 1
  readonly budget: string
  readonly epoch: number
  readonly seq: number
  readonly kind: 'seed' | 'edit' | 'bind'
  readonly editId: string
  readonly person: string
  readonly door: Door
  readonly time: number
  /** 'bind' rows: the client id; else null. */
  readonly clientId: number | null
  readonly updateSha256: string
  readonly changes: readonly Change[]
  readonly engine: string
  readonly prev: string
  readonly hash: string
}

/** A row to be written: the entry and the update as it was received (empty for 'bind'). */
export type Row = { readonly entry: Entry; readonly update: Uint8Array }

export type Head = { readonly epoch: number; readonly seq: number; readonly hash: string }
export type Snapshot = {
  readonly seq: number
  readonly hash: string
  readonly state: Uint8Array
  readonly sha256: string
}

/** The append-only, hash-chained record of every budget. Only committed and synced rows can be read. */
export interface Journal {
  /** Writes all rows in one INSERT, synced to disk before it resolves; none of them if any does not follow. One call at a time. */
  append(rows: readonly Row[]): Promise<void>
  head(budget: string): Promise<Head | null>
  /** Entries with seq > after, in order. */
  entries(budget: string, range: { after: number; limit: number }): Promise<Entry[]>
  /** The newest entries, newest first, with seq < before if given. */
  latest(budget: string, range: { before?: number; limit: number }): Promise<Entry[]>
  /** Rows with their updates, seq > after, in order. */
  rows(budget: string, after: number): Promise<Row[]>
  findEdit(budget: string, editId: string): Promise<Entry | null>
  /** The first edit whose id begins with this; edits by submit() are kept as 'id:hash of the operations'. */
  findEditStarting(budget: string, prefix: string): Promise<Entry | null>
  /** Client id → person, from the 'bind' rows. */
  bindings(budget: string): Promise<Map<number, string>>
  budgets(): Promise<string[]>
  saveSnapshot(budget: string, snapshot: Snapshot): Promise<void>
  /** The newest snapshot whose own hash holds, or null. */
  loadSnapshot(budget: string): Promise<Snapshot | null>
  /** Effects are kept beside the chain: derived, recomputable, not hashed. */
  saveEffects(budget: string, rows: readonly { seq: number; effects: readonly Effect[] }[]): Promise<void>
  effects(budget: string, seqs: readonly number[]): Promise<Map<number, Effect[]>>
  close(): Promise<void>
}
