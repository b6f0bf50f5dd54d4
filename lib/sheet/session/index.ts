export { browserLocks, type Locks, noLocks } from './locks'
export { openSheet } from './session'
export { openBrowserStorage } from './storage'
export type { ConnectionState, EditResult, RefusedEdit, SheetOptions, SheetSession, SheetSnapshot } from './types'
