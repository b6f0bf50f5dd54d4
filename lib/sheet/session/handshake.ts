import type * as Y from 'yjs'
import { SCHEMA_VERSION } from '../../budget/schema'
import type { Meta } from '../outbox'
import type { Hello, Welcome } from '../wire'

/** Yjs may change a document's client id when it meets its own in what it receives: it is read now, and not kept. */
export function helloOf(person: string, { epoch, seq, head }: Meta, { clientID: clientId }: Y.Doc): Hello {
  return { person, epoch, clientId, seq, head, schemaVersion: SCHEMA_VERSION }
}

/** @returns what to keep of a welcome, or null if it is for another epoch than the document's */
export function afterWelcome(meta: Meta, { epoch, role, seq, head }: Welcome): Partial<Meta> | null {
  if (meta.epoch !== null && meta.epoch !== epoch) return null
  return seq > meta.seq ? { epoch, role, seq, head } : { epoch, role }
}
