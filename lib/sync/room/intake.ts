import type * as Y from 'yjs'
import type { Budget } from '../../budget/schema'
import type { Refusal } from '../gate/refusal'
import { type Accepted, type Rejected, Shadow } from '../gate/shadow'
import { NO_UPDATE, type Queued, type QueuedBind, type QueuedEdit } from './queued'

export type Dropped = { readonly item: Queued; readonly refusal: Refusal }

/**
 * What is accepted and not yet in the live document, in order: waiting for the next commit, or written by the one in
 * flight. Keeps the shadow equal to live plus these (write path, rule 4). No input or output.
 */
export class Intake {
  private waiting: Queued[] = []
  private flying: Queued[] = []
  /** Bytes of the updates that are under way. */
  bytes = 0
  private readonly shadow: Shadow

  constructor(live: Y.Doc) {
    this.shadow = new Shadow(() => ({
      live,
      accepted: [...this.flying, ...this.waiting].flatMap((item) => (item.kind === 'edit' ? [item.update] : [])),
    }))
  }

  /** The budget as it will be when everything accepted is committed. */
  get budget(): Budget {
    return this.shadow.budget
  }
  get size(): number {
    return this.waiting.length + this.flying.length
  }
  get hasWaiting(): boolean {
    return this.waiting.length > 0
  }
  /** Whether an edit, and not only a binding, is under way. */
  get hasEdits(): boolean {
    return [...this.waiting, ...this.flying].some(({ kind }) => kind === 'edit')
  }
  state(): Uint8Array {
    return this.shadow.state()
  }

  /** Tries an update; the caller queues it at once where it was accepted. */
  offer(update: Uint8Array, clientId: number, owned: boolean): Accepted | Rejected {
    return this.shadow.offer(update, clientId, owned)
  }

  /** What accepting an edit without an update comes to. */
  nothing(): Accepted {
    return { refused: null, changes: [], after: this.shadow.budget }
  }

  queue(item: Queued): void {
    this.waiting.push(item)
    this.bytes += weightOf([item])
  }

  /**
   * Takes out what may not be committed any more, and gates again what was accepted after it: it may have been built on
   * what is taken out. To be called while nothing is in flight.
   */
  sift(judge: (item: Queued) => Refusal | null, owned: (edit: QueuedEdit) => boolean): Dropped[] {
    const items = this.waiting
    const first = items.findIndex((item) => judge(item) !== null)
    if (first < 0) return []
    const dropped: Dropped[] = []
    this.waiting = items.slice(0, first)
    this.shadow.rebuild()
    for (const item of items.slice(first)) {
      const refusal = judge(item) ?? this.again(item, owned)
      if (refusal) dropped.push({ item, refusal })
    }
    this.bytes = weightOf(this.waiting)
    return dropped
  }

  /** The next commit's rows, at most `limit`; they are in flight then. */
  take(limit: number): readonly Queued[] {
    this.flying = this.waiting.splice(0, limit)
    return this.flying
  }

  /** The commit is on disk: what was in flight goes into the live document now. */
  landed(): readonly Queued[] {
    const landed = this.flying
    this.flying = []
    this.bytes -= weightOf(landed)
    return landed
  }

  /** The commit failed: nothing of it is stored, and nothing that came after it can stand. */
  clear(): Queued[] {
    const lost = [...this.flying, ...this.waiting]
    this.flying = []
    this.waiting = []
    this.bytes = 0
    this.shadow.rebuild()
    return lost
  }

  destroy(): void {
    this.shadow.destroy()
  }

  private again(item: Queued, owned: (edit: QueuedEdit) => boolean): Refusal | null {
    if (item.kind === 'bind') {
      this.waiting.push(item satisfies QueuedBind)
      return null
    }
    const verdict =
      item.update === NO_UPDATE ? this.nothing() : this.shadow.offer(item.update, item.clientId, owned(item))
    if (verdict.refused) return verdict.refused
    this.waiting.push({ ...item, changes: verdict.changes, after: verdict.after })
    return null
  }
}

function weightOf(items: readonly Queued[]): number {
  return items.reduce((sum, item) => sum + (item.kind === 'edit' ? item.update.length : 0), 0)
}
