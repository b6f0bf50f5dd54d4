import type { Budget } from '../../../../../lib/budget/schema'
import type { Operation } from '../../../../../lib/sheet/change'
import type { SheetSnapshot } from '../../../../../lib/sheet/session/types'
import type { Cell, Role } from '../../../../../lib/sheet/wire'

/** What the worksheet shows: the session's state, or the server's first state until the session has one. */
export type SheetState = Omit<SheetSnapshot, 'budget' | 'role'> & { readonly budget: Budget; readonly role: Role }

/** What the worksheet can have done. Every function keeps its identity as long as the page is open. */
export type SheetDeeds = {
  /** The budget as it is now, for deeds that depend on it (an order key between two rows). */
  read(): Budget
  /** Commits one edit. @returns null, or why it was refused here, in a sentence that says what to do. */
  edit(operations: readonly Operation[]): string | null
  undo(): void
  redo(): void
  /** Says to the others where this person is. */
  stand(cell: Cell | null): void
}
