import canonicalize from 'canonicalize'
import { sha256Hex } from '../../records/sha256'

import type { Operation } from '../../sheet/change'

/**
 * What makes two deliveries the same edit. A page's edit is known by its id and the update's bytes. An edit by submit() is
 * made anew at each try, so its bytes differ: it is known by its id and the SHA-256 of its operations' RFC 8785 JSON, and
 * both stand in the journal's edit id, 'id:hash', which is hashed in the chain like everything else. No page's edit id has a
 * colon in it.
 */
export type EditKey = {
  /** As the sender named it. */
  readonly editId: string
  /** As the journal keeps it. */
  readonly stored: string
  /** SHA-256 of what the sender means by it. */
  readonly content: string
  readonly by: 'update' | 'operations'
}

export const EDIT_ID = /^[A-Za-z0-9_.-]{1,100}$/

export function keyOfUpdate(editId: string, update: Uint8Array): EditKey {
  return { editId, stored: editId, content: sha256Hex(update), by: 'update' }
}

/** @throws Error where an operation has no RFC 8785 form */
export function keyOfOperations(editId: string, operations: readonly Operation[]): EditKey {
  const canonical = canonicalize(operations)
  if (canonical === undefined) throw new Error('The operations have no RFC 8785 form.')
  const content = sha256Hex(canonical)
  return { editId, stored: `${prefixOf(editId)}${content}`, content, by: 'operations' }
}

/** What the journal's edit ids of one id by submit() begin with. */
export function prefixOf(editId: string): string {
  return `${editId}:`
}
