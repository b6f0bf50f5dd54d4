import * as decoding from 'lib0/decoding'
import * as encoding from 'lib0/encoding'
import type { Change } from './change'

/**
 * Messages beside the y-websocket protocol's own (0 sync, 1 awareness). Each is a type, a JSON header and,
 * for an edit, the update's bytes. Numbers and names are fixed: old tabs may still be open when a server is renewed.
 */
export const MESSAGE = {
  edit: 100,
  acknowledged: 101,
  refused: 102,
  hello: 103,
  welcome: 104,
  presence: 105,
  cell: 106,
  trail: 107,
} as const

export type Role = 'viewer' | 'editor' | 'approver' | 'owner'

export type EditHeader = { editId: string; epoch: number; clientId: number }
export type Acknowledged = { editId: string; seq: number; head: string }
export type Refused = {
  editId: string
  code: RefusalCode
  reason: string
  /** Set with code 'gap': the first clock of the client id that the server does not have. */
  missing?: { clientId: number; clock: number }
}
export type RefusalCode =
  | 'gap'
  | 'malformed'
  | 'foreign-client-id'
  | 'edit-id-reused'
  | 'outside-layout'
  | 'bad-value'
  | 'too-large'
  | 'invalid-result'
  | 'not-allowed'
  | 'not-stored'
  | 'epoch'
  | 'read-only'
  | 'conflict'
export type Hello = {
  person: string
  epoch: number | null
  clientId: number
  seq: number
  head: string | null
  schemaVersion: number
}
export type Welcome = { person: string; name: string; role: Role; epoch: number; seq: number; head: string }
export type Cell = { section: string; id: string | null; field: string | null }
export type Present = {
  connection: string
  person: string
  name: string
  initials: string
  colour: number
  cell: Cell | null
  me: boolean
}
/** A committed entry with what it did to each margin, as the trail shows it. */
export type TrailEntry = {
  seq: number
  epoch: number
  kind: 'seed' | 'edit' | 'bind'
  editId: string
  person: string
  personName: string
  door: Door
  time: number
  changes: Change[]
  effects: Effect[]
  hash: string
}
export type Effect = { allowance: string; name: string; before: EffectSide; after: EffectSide }
export type EffectSide = { verdict: string; marginDb: number | null; knownDb: number | null } | null
export type Door = 'screen' | 'token' | 'import' | 'restore'

export type Message =
  | { type: typeof MESSAGE.edit; header: EditHeader; update: Uint8Array }
  | { type: typeof MESSAGE.acknowledged; header: Acknowledged }
  | { type: typeof MESSAGE.refused; header: Refused }
  | { type: typeof MESSAGE.hello; header: Hello }
  | { type: typeof MESSAGE.welcome; header: Welcome }
  | { type: typeof MESSAGE.presence; header: Present[] }
  | { type: typeof MESSAGE.cell; header: Cell | null }
  | { type: typeof MESSAGE.trail; header: TrailEntry[] }

export function encodeMessage(message: Message): Uint8Array {
  const encoder = encoding.createEncoder()
  encoding.writeVarUint(encoder, message.type)
  encoding.writeVarString(encoder, JSON.stringify(message.header))
  if (message.type === MESSAGE.edit) encoding.writeVarUint8Array(encoder, message.update)
  return encoding.toUint8Array(encoder)
}

/** Reads the body of a message whose type has been read; throws on malformed bytes. The header is not yet judged. */
export function decodeBody(type: number, decoder: decoding.Decoder): { header: unknown; update: Uint8Array | null } {
  const header: unknown = JSON.parse(decoding.readVarString(decoder))
  const update = type === MESSAGE.edit ? decoding.readVarUint8Array(decoder) : null
  return { header, update }
}
