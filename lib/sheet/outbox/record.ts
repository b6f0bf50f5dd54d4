import type { Scalar } from '../../budget/schema'
import type { Operation } from '../change'
import type { RefusalCode, Role } from '../wire'

/** What the person did, as typed, and the values that stood there: enough to do it again in another document. */
export type Deed = {
  readonly kind: 'edit' | 'undo' | 'redo'
  readonly operations: readonly Operation[]
  /** For each operation the value that it was made on. */
  readonly bases: readonly Scalar[]
}

/** One committed edit that the server has not acknowledged yet. */
export type OutboxRecord = {
  readonly editId: string
  readonly epoch: number
  /** The client's document that the update belongs to; in a newer one the deed is done again. */
  readonly generation: number
  readonly clientId: number
  readonly update: Uint8Array
  readonly deed: Deed
  /** Milliseconds since 1970. */
  readonly time: number
}

/** An edit that the server refused, or that no longer fitted, kept until the person has entered it again or dismissed it. */
export type RefusedRecord = {
  readonly editId: string
  readonly deed: Deed
  readonly code: RefusalCode
  readonly reason: string
  readonly time: number
}

/** What a browser knows of one budget for one person, beside the edits. */
export type Meta = {
  /** Null until the server has said it. */
  readonly epoch: number | null
  readonly generation: number
  /** The furthest entry that the server has named, with its hash: shown at the hello, so that a loss is found. */
  readonly seq: number
  readonly head: string | null
  readonly role: Role | null
  readonly acknowledged: { readonly seq: number; readonly time: number } | null
}

export const FIRST_META: Meta = { epoch: null, generation: 1, seq: 0, head: null, role: null, acknowledged: null }
