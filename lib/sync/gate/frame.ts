import * as Y from 'yjs'
import { type DecodedEdit, decodeEdit, type Range } from './decode'
import { judgeItems } from './items'
import { gap, type Refusal, Refuse, refuse } from './refusal'

/** What a frame would bring. 'erased': it only deletes what somebody else has deleted meanwhile. */
export type FrameVerdict =
  | {
      readonly refused: null
      readonly brings: 'something' | 'erased'
      /** The clock of the client id after the edit. */
      readonly end: number
      /** Keys of the lane values that it writes. */
      readonly lanes: readonly string[]
    }
  | { readonly refused: Refusal }

/**
 * The gate's first stage: judges an update against what the shadow holds, and touches nothing (write path, rule 4).
 * Never throws.
 * @param clientId the id that the edit's header names; all that the edit brings must be of this id
 * @param owned whether the id belongs to the person at the other end
 */
export function judgeFrame(shadow: Y.Doc, update: Uint8Array, clientId: number, owned: boolean): FrameVerdict {
  try {
    const edit = decodeEdit(update)
    const known = Y.getState(shadow.store, clientId)
    const fresh = freshStructs(shadow.store, edit, clientId, owned)
    const lanes = judgeItems(shadow, fresh)
    const last = fresh.at(-1)
    const end = last ? last.id.clock + last.length : known
    judgeRanges(shadow.store, edit.deletes, clientId, end)
    if (last || erasesAnything(shadow.store, edit.deletes)) return { refused: null, brings: 'something', end, lanes }
    if (edit.structs.length === 0 && edit.deletes.size > 0) return { refused: null, brings: 'erased', end, lanes }
    return refuse('malformed', 'The edit brings nothing new under a new edit id; reload the page.')
  } catch (cause) {
    if (cause instanceof Refuse) return { refused: cause.refusal }
    return { refused: { code: 'malformed', reason: 'The edit cannot be read; reload the page.' } }
  }
}

/** Structs that the shadow does not have yet, in the order of their clocks; what it has is ignored. @throws Refuse */
function freshStructs(store: Y.Doc['store'], edit: DecodedEdit, clientId: number, owned: boolean) {
  const known = Y.getState(store, clientId)
  const fresh: (Y.Item | Y.GC)[] = []
  for (const struct of edit.structs) {
    const { client, clock } = struct.id
    if (clock + struct.length <= Y.getState(store, client)) continue
    if (client !== clientId || !owned)
      refuse('foreign-client-id', 'The edit was made under the client id of another page or person; reload the page.')
    if (clock > known && fresh.length === 0) gap(client, known)
    if (clock < known) refuse('malformed', 'Part of the edit is known already; send each edit as it was made.')
    fresh.push(struct)
  }
  return fresh
}

/** A range past what is known would delete somebody's future edits as they arrive. @throws Refuse */
function judgeRanges(
  store: Y.Doc['store'],
  deletes: ReadonlyMap<number, readonly Range[]>,
  clientId: number,
  end: number,
): void {
  for (const [client, ranges] of deletes) {
    const known = client === clientId ? end : Y.getState(store, client)
    const last = ranges.at(-1)
    if (!last || last.clock + last.len <= known) continue
    if (client === clientId) gap(client, known)
    refuse('malformed', 'The edit deletes what does not exist yet.')
  }
}

function erasesAnything(store: Y.Doc['store'], deletes: ReadonlyMap<number, readonly Range[]>): boolean {
  for (const [client, ranges] of deletes) {
    const structs = store.clients.get(client) ?? []
    for (const { clock, len } of ranges) {
      for (let index = Y.findIndexSS(structs, clock); index < structs.length; index++) {
        const struct = structs[index]
        if (!struct || struct.id.clock >= clock + len) break
        if (!struct.deleted) return true
      }
    }
  }
  return false
}
