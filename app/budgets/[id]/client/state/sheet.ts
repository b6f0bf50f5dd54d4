import type { Budget } from '../../../../../lib/budget/schema'
import type { Operation } from '../../../../../lib/sheet/change'
import type { SheetSnapshot } from '../../../../../lib/sheet/session'
import type { Cell, Role } from '../../../../../lib/sheet/wire'

/** What the worksheet shows: the session's state, or the server's first state until the session has one. */
export type SheetState = Omit<SheetSnapshot, 'budget' | 'role'> & { readonly budget: Budget; readonly role: Role }

/** What the worksheet can have done; each answers null, or why it was not done, in a sentence that says what to do. */
export type SheetDeeds = {
  /** The budget as it is now, for deeds that depend on it (an order key between two rows). */
  read(): Budget
  edit(operations: readonly Operation[]): string | null
  undo(): string | null
  redo(): string | null
  /** Says to the others where this person is. */
  stand(cell: Cell | null): void
}
