import type { Identity } from '../../access/identity'
import type { Budget } from '../../budget/schema'
import type { Change } from '../../sheet/change'
import type { Acknowledged, Door, Refused } from '../../sheet/wire'
import type { Refusal } from '../gate/refusal'
import type { EditKey } from './editKey'

export type Answer = Acknowledged | Refused

/** Who does something, and the way in. */
export type Actor = { readonly identity: Identity; readonly door: Door }

/** An edit as it comes in, from a socket or through submit(). */
export type Incoming = {
  readonly actor: Actor
  /** The connection that it came on; null for submit(). */
  readonly from: string | null
  readonly epoch: number
  readonly key: EditKey
  readonly clientId: number
  readonly update: Uint8Array
}

/** Accepted and not yet committed. */
export type QueuedEdit = Incoming & {
  readonly kind: 'edit'
  readonly changes: readonly Change[]
  /** The budget with this edit in it. */
  readonly after: Budget
  readonly answer: (answer: Answer) => void
}
/** A client id that is to be given to a person. */
export type QueuedBind = { readonly kind: 'bind'; readonly actor: Actor; readonly clientId: number }
export type Queued = QueuedEdit | QueuedBind

/** An edit that came to nothing, such as setting what is set already: it has an entry, so that it can be asked about. */
export const NO_UPDATE = new Uint8Array([0, 0])

export function refused({ key }: Pick<Incoming, 'key'>, refusal: Refusal): Refused {
  return { editId: key.editId, ...refusal }
}

/** The connection that sent all of these, which needs no copy of them. */
export function onlySender(edits: readonly QueuedEdit[]): string | null {
  const [first] = edits
  return first && edits.every(({ from }) => from === first.from) ? first.from : null
}
