import canonicalize from 'canonicalize'
import { sha256Hex } from '../sha256'
import type { Entry } from './types'

/** `prev` of the first entry of every budget. */
export const GENESIS = '0'.repeat(64)

/** What the writer knows of an entry before it stands in the chain. */
export type EntryParts = Omit<Entry, 'v' | 'updateSha256' | 'prev' | 'hash'>

/**
 * Makes a chained entry: adds the update's SHA-256, the hash before (GENESIS for the first) and the entry's own hash.
 * @throws where the parts have no RFC 8785 form (NaN, an infinity, a lone surrogate)
 */
export function sealEntry(parts: EntryParts, update: Uint8Array, prev: string): Entry {
  const { budget, epoch, seq, kind, editId, person, door, time, clientId, changes, engine } = parts
  const unsealed: Omit<Entry, 'hash'> = {
    v: 1,
    budget,
    epoch,
    seq,
    kind,
    editId,
    person,
    door,
    time,
    clientId,
    updateSha256: sha256Hex(update),
    changes,
    engine,
    prev,
  }
  return { ...unsealed, hash: entryHash(unsealed) }
}

/** SHA-256 over the RFC 8785 JSON of everything in the entry but its hash (write path, rule 5). */
export function entryHash(entry: Omit<Entry, 'hash'>): string {
  const { v, budget, epoch, seq, kind, editId, person, door, time, clientId, updateSha256, changes, engine, prev } =
    entry
  const hashed = {
    v,
    budget,
    epoch,
    seq,
    kind,
    editId,
    person,
    door,
    time,
    clientId,
    updateSha256,
    changes,
    engine,
    prev,
  }
  const canonical = canonicalize(hashed)
  if (canonical === undefined) throw new Error('The entry has no RFC 8785 form.')
  return sha256Hex(canonical)
}
