import { z } from 'zod'
import type { Identity } from '../../access/identity'
import { roleAllows } from '../../access/identity'
import { SCHEMA_VERSION } from '../../budget/schema'
import type { Journal } from '../../records/journal/types'
import { CLOSE } from '../../sheet/closeCodes'
import type { Hello, Role } from '../../sheet/wire'
import { because, type CloseReason } from '../closing'
import { MAX_ID } from '../gate/decode'
import type { Actor } from '../room/queued'
import type { Room } from '../room/room'
import type { Rooms } from '../rooms'

const whole = z.number().int().min(0).max(Number.MAX_SAFE_INTEGER)
const hello: z.ZodType<Hello> = z.strictObject({
  person: z.string().max(100),
  epoch: whole.nullable(),
  clientId: whole.max(MAX_ID),
  seq: whole,
  head: z.string().length(64).nullable(),
  schemaVersion: whole,
})

/** @returns null where the message is no hello */
export function readHello(header: unknown): Hello | null {
  const result = hello.safeParse(header)
  return result.success ? result.data : null
}

export type Admitted = { readonly room: Room; readonly role: Role }

/**
 * Judges who says hello against the session, the roles and the journal, and binds the client id of who may write (write path,
 * rule 3). @throws where the journal or the roles cannot be read
 */
export async function judgeHello(
  said: Hello,
  actor: Actor,
  budget: string,
  rooms: Rooms,
  journal: Pick<Journal, 'entries'>,
): Promise<Admitted | { readonly close: CloseReason }> {
  const { identity } = actor
  if (said.person !== identity.person) return { close: CLOSE.otherPerson }
  const room = await rooms.get(budget)
  if (room === null) return { close: CLOSE.notFound }
  if ('locked' in room) return { close: because(CLOSE.notReady, room.locked) }
  const role = await room.enter(identity.person)
  if (role === null) return { close: CLOSE.notAllowed }
  if (said.schemaVersion !== SCHEMA_VERSION) return { close: CLOSE.reload }
  if (said.epoch !== null && said.epoch !== room.state.head.epoch) return { close: CLOSE.reload }
  if (!(await holds(journal, budget, said))) return { close: CLOSE.lostHistory }
  if (room.isClosed) return { close: CLOSE.notReady }
  // A client id of somebody else's: a page that is made anew has another one.
  if (roleAllows(role, 'editor') && !room.bind(actor, said.clientId)) return { close: CLOSE.reload }
  return { room, role }
}

/** Whether the journal still has what it once acknowledged to this page. */
async function holds(journal: Pick<Journal, 'entries'>, budget: string, { seq, head }: Hello): Promise<boolean> {
  if (seq === 0) return true
  const [entry] = await journal.entries(budget, { after: seq - 1, limit: 1 })
  return entry !== undefined && entry.seq === seq && entry.hash === head
}

export function doorOf(identity: Identity): Actor['door'] {
  return identity.via === 'cookie' ? 'screen' : 'token'
}
