import type { Budget } from '../../budget/schema'
import type { Operation, Place } from '../change'
import type { BrowserStorage } from '../outbox'
import type { Cell, Present, RefusalCode, Role, TrailEntry } from '../wire'
import type { Locks } from './locks'

export type SheetOptions = {
  /** Budget id; also the last part of the socket's address. */
  readonly budget: string
  /** Person id of the signed-in person: what is kept is kept for this person. */
  readonly person: string
  /** Address of the socket without the budget, such as 'wss://example.org/sheet'. */
  readonly url: string
  readonly params?: Readonly<Record<string, string>>
  readonly storage: BrowserStorage
  readonly locks: Locks
  /** For Node, which has no WebSocket of its own. */
  readonly WebSocketPolyfill?: typeof WebSocket
  /** Milliseconds since 1970; the clock of the machine if left out. */
  readonly now?: () => number
  /** Longest pause before the next attempt to connect, in milliseconds. */
  readonly maxBackoff?: number
  /** Entries that the page was made with, newest first. */
  readonly trail?: readonly TrailEntry[]
}

export type ConnectionState = {
  /** connecting: not yet, for the first time. live: what others do arrives. offline: will be tried again. closed: will not. */
  readonly state: 'connecting' | 'live' | 'offline' | 'closed'
  readonly words: string
  /** Close code of the socket, where there was one. */
  readonly code: number | null
}

/** An edit that did not get into the budget, with what was typed. */
export type RefusedEdit = {
  readonly id: string
  readonly code: RefusalCode
  readonly reason: string
  /** When it was made, milliseconds since 1970. */
  readonly time: number
  readonly parts: readonly { readonly place: Place; readonly typed: string }[]
  /** Makes the edit again on what stands there now; it leaves the list if that is done. */
  enterAgain(): EditResult
  dismiss(): void
}

/** What a screen shows of the session. A new object at every change; what did not change inside keeps its identity. */
export type SheetSnapshot = {
  /** Grows when the document was made anew after a refusal or in a new epoch: key the worksheet by it. */
  readonly generation: number
  /** Null until it is loaded. */
  readonly budget: Budget | null
  readonly connection: ConnectionState
  readonly role: Role | null
  /** How many edits are not acknowledged yet, in all tabs of this person. */
  readonly unsaved: number
  /** Their places, as placeKey gives them. */
  readonly unsavedPlaces: ReadonlySet<string>
  readonly refused: readonly RefusedEdit[]
  readonly people: readonly Present[]
  /** Newest first. */
  readonly trail: readonly TrailEntry[]
  readonly lastAcknowledged: { readonly seq: number; readonly time: number } | null
  readonly canUndo: boolean
  readonly canRedo: boolean
  /** False where this browser forgets unsaved edits with the page. */
  readonly durable: boolean
  /** In words: this browser could not keep something. */
  readonly fault: string | null
}

export type EditResult =
  | { readonly ok: true }
  /** index: which operation; null where it is not about one of them. */
  | { readonly ok: false; readonly index: number | null; readonly reason: string }

export type SheetSession = {
  subscribe(listener: () => void): () => void
  getSnapshot(): SheetSnapshot
  /** Makes one edit: shown at once, sent when possible. */
  edit(operations: readonly Operation[]): EditResult
  undo(): EditResult
  redo(): EditResult
  /** Tells the others which cell this person is in. */
  setCell(cell: Cell | null): void
  /** Resolves when all that was done so far is kept in the browser. */
  settled(): Promise<void>
  destroy(): Promise<void>
}
