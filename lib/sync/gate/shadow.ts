import * as Y from 'yjs'
import type { Budget } from '../../budget/schema'
import type { Change } from '../../sheet/change'
import { createMirror, type Mirror } from '../../sheet/mirror'
import { createDoc } from '../../sheet/seed'
import { judgeFrame } from './frame'
import { type Refusal, Refuse, refuse } from './refusal'
import { judgeResult } from './result'
import { withWrites } from './writes'

/** What an accepted update does to the budget. */
export type Accepted = { readonly refused: null; readonly changes: readonly Change[]; readonly after: Budget }
/** `deep`: the shadow had to be built anew, which costs; such refusals are rationed. */
export type Rejected = { readonly refused: Refusal; readonly deep: boolean }

/**
 * The document as it will be when everything accepted is committed: an edit is tried here before anybody else is touched by
 * it (write path, rule 4).
 */
export class Shadow {
  private doc: Y.Doc
  private mirror: Mirror
  private before: ReadonlyMap<number, number> = new Map()

  /** @param base the live document's state and the accepted, uncommitted updates in order: what a rebuild starts from */
  constructor(private readonly base: () => { live: Y.Doc; accepted: readonly Uint8Array[] }) {
    this.doc = createDoc()
    this.mirror = this.build()
  }

  /** The budget as it will be. */
  get budget(): Budget {
    return this.mirror.json
  }

  /** A copy of the document's state, to make edits on. */
  state(): Uint8Array {
    return Y.encodeStateAsUpdate(this.doc)
  }

  /** Both stages of the gate, all or nothing. Never throws. */
  offer(update: Uint8Array, clientId: number, owned: boolean): Accepted | Rejected {
    const frame = judgeFrame(this.doc, update, clientId, owned)
    if (frame.refused) return { refused: frame.refused, deep: false }
    try {
      return { refused: null, ...this.apply(update, clientId, frame) }
    } catch (cause) {
      this.rebuild()
      if (cause instanceof Refuse) return { refused: cause.refusal, deep: true }
      return { refused: { code: 'invalid-result', reason: 'The edit cannot be applied; reload the page.' }, deep: true }
    }
  }

  /** Back to what is accepted. */
  rebuild(): void {
    this.destroy()
    this.doc = createDoc()
    this.mirror = this.build()
  }

  destroy(): void {
    this.mirror.destroy()
    this.doc.destroy()
  }

  private build(): Mirror {
    const { live, accepted } = this.base()
    this.doc.transact(() => {
      Y.applyUpdate(this.doc, Y.encodeStateAsUpdate(live))
      for (const update of accepted) Y.applyUpdate(this.doc, update)
    })
    this.doc.on('afterTransaction', (transaction: Y.Transaction) => {
      this.before = transaction.beforeState
    })
    return createMirror(this.doc)
  }

  private apply(update: Uint8Array, clientId: number, frame: { end: number; lanes: readonly string[] }) {
    const earlier = this.mirror.json
    Y.applyUpdate(this.doc, update)
    const { store } = this.doc
    if (store.pendingStructs !== null || store.pendingDs !== null || Y.getState(store, clientId) !== frame.end)
      refuse('malformed', 'Part of the edit cannot be applied; reload the page.')
    const changes = this.taken()
    const after = this.mirror.json
    judgeResult(earlier, after, changes, frame.lanes)
    return { changes: withWrites(changes, update, this.doc, this.before), after }
  }

  /** The mirror throws where a record or a field has gone or is no single value any more. */
  private taken(): Change[] {
    try {
      return this.mirror.take()
    } catch (cause) {
      const words = cause instanceof Error ? cause.message : 'The edit leaves the layout.'
      return refuse('invalid-result', `${words} Nothing is deleted from a budget; set 'removed' or empty the field.`)
    }
  }
}
