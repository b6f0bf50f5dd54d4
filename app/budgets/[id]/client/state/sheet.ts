import type { Budget, Scalar } from '../../../../../lib/budget/schema'
import type { Operation, Place } from '../../../../../lib/sheet/change'
import type { Present, Role, TrailEntry } from '../../../../../lib/sheet/wire'

/** What the worksheet shows of the session, whatever keeps it. */
export type SheetState = {
  /** Grows when the session is made anew (a refusal, a new epoch): the worksheet is then built again. */
  readonly generation: number
  readonly budget: Budget
  readonly connection: Connection
  readonly role: Role
  /** Committed here and not yet acknowledged: the length of the outbox, and the places it writes. */
  readonly unsaved: number
  readonly unsavedPlaces: ReadonlySet<string>
  /** When the server last acknowledged an edit of this page; null before the first. Milliseconds since 1970. */
  readonly acknowledgedAt: number | null
  readonly refused: readonly RefusedValue[]
  readonly people: readonly Present[]
  /** Newest first; what has arrived since the page was made comes before what it was made with. */
  readonly trail: readonly TrailEntry[]
  readonly canUndo: boolean
  readonly canRedo: boolean
}

export type Connection =
  | { readonly is: 'connecting' }
  | { readonly is: 'connected' }
  /** Lost, and tried again. */
  | { readonly is: 'offline' }
  /** Not tried again; the words say what to do. */
  | { readonly is: 'closed'; readonly words: string }

/** A value that the server did not take, kept with its reason until the person enters it again or lets it go. */
export type RefusedValue = {
  readonly key: string
  readonly place: Place
  readonly value: Scalar
  readonly reason: string
}

/** What the worksheet can have done. Every function keeps its identity as long as the session lives. */
export type SheetDeeds = {
  /** The budget as it is now, for deeds that depend on it (an order key between two rows). */
  read(): Budget
  /** Commits one edit. @returns null, or why it was refused here, in a sentence that says what to do. */
  edit(operations: readonly Operation[]): string | null
  undo(): void
  redo(): void
  /** Says to the others where this person is. */
  stand(place: { section: string; id: string | null; field: string | null } | null): void
  enterAgain(key: string): void
  letGo(key: string): void
}
