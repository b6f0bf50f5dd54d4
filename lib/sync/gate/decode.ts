import * as Y from 'yjs'
import { LIMITS } from '../../budget/schema'
import { refuse } from './refusal'

/** Ids and clocks are unsigned 32-bit numbers; Yjs itself would take up to 2^53 − 1. */
export const MAX_ID = 2 ** 32 - 1
/** A run of deleted or collected content: an honest edit's are as long as what it overwrote. */
export const MAX_RUN = 10_000
/** One import of a full budget makes some 50,000; each costs memory before it is judged. */
export const MAX_STRUCTS = 400_000

export type Range = { readonly clock: number; readonly len: number }
export type DecodedEdit = {
  readonly structs: readonly (Y.Item | Y.GC)[]
  /** By client id, ascending, without overlap. */
  readonly deletes: ReadonlyMap<number, readonly Range[]>
}

/**
 * Decodes an update and judges what can be judged without a document: sizes, numbers, order.
 * @throws Refuse, or whatever the decoder throws on malformed bytes
 */
export function decodeEdit(update: Uint8Array): DecodedEdit {
  if (update.length > LIMITS.editBytes) refuse('too-large', 'The edit is over 4 MB; make it in several parts.')
  const { structs, ds } = Y.decodeUpdate(update)
  if (structs.length > MAX_STRUCTS) refuse('too-large', 'The edit has too many parts; make it in several edits.')
  return { structs: judgeStructs(structs), deletes: judgeDeletes(ds.clients) }
}

function judgeStructs(structs: readonly (Y.Item | Y.GC | Y.Skip)[]): (Y.Item | Y.GC)[] {
  const ends = new Map<number, number>()
  return structs.map((struct) => {
    if (struct instanceof Y.Skip) refuse('malformed', 'The edit leaves out clocks of its own; send it whole.')
    const { client, clock } = struct.id
    const end = clock + struct.length
    if (client > MAX_ID || end > MAX_ID) refuse('malformed', 'A client id or a clock is over 2^32 − 1.')
    if (struct.length < 1) refuse('malformed', 'The edit has an empty part.')
    // Yjs keeps only the last block of a client id, so a second block could hide what was judged here.
    if (clock !== (ends.get(client) ?? clock)) refuse('malformed', 'The clocks of the edit do not follow each other.')
    ends.set(client, end)
    const isRun = struct instanceof Y.GC || struct.content instanceof Y.ContentDeleted
    if (isRun && struct.length > MAX_RUN) refuse('malformed', 'The edit has an overlong run of deleted content.')
    return struct
  })
}

function judgeDeletes(clients: ReadonlyMap<number, readonly Range[]>): ReadonlyMap<number, readonly Range[]> {
  for (const [client, ranges] of clients) {
    let end = 0
    for (const range of ranges) {
      // Overlapping ranges would make applying them quadratic; Yjs writes them sorted and merged.
      if (range.clock < end || range.len < 1) refuse('malformed', 'The delete set is not sorted and merged.')
      end = range.clock + range.len
    }
    if (client > MAX_ID || end > MAX_ID) refuse('malformed', 'A client id or a clock is over 2^32 − 1.')
  }
  return clients
}
