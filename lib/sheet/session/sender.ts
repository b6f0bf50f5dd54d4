import * as Y from 'yjs'
import type { Batch, Outbox, OutboxRecord } from '../outbox'
import type { Acknowledged, Refused } from '../wire'

type SenderHooks = {
  /** @returns false where there is no connection */
  send(record: OutboxRecord): boolean
  /** The server has the edit. */
  accepted(record: OutboxRecord): void
  /** The document must be made anew; the batch goes with it. */
  renew(batch: Batch): void
  now(): number
}

/** After 'not stored' the server gets this long before it is asked again, in milliseconds. */
const RETRY_AFTER = 2000

/**
 * Sends the outbox in order, one edit at a time: what comes behind a refused edit hangs on it and would be refused for
 * nothing. Only the tab that holds the lock has `active` set.
 */
export class Sender {
  active = false
  /** The server has said welcome and the document holds what it has. */
  private live = false
  private inFlight: string | null = null
  /** Set after a gap: the edit to go on from. */
  private startAt: string | null = null
  private retry: ReturnType<typeof setTimeout> | null = null

  constructor(
    private readonly outbox: Outbox,
    private readonly hooks: SenderHooks,
  ) {}

  connected(): void {
    this.live = true
    this.pump()
  }

  disconnected(): void {
    this.live = false
    this.inFlight = null
    this.startAt = null
    if (this.retry !== null) clearTimeout(this.retry)
    this.retry = null
  }

  /** Sends the next edit, if there is one and none is on its way. */
  pump(): void {
    if (!this.active || !this.live || this.inFlight !== null || this.retry !== null) return
    const { epoch, generation } = this.outbox.meta
    const ready = this.outbox.records.filter((each) => each.epoch === epoch && each.generation === generation)
    const record = ready.find((each) => each.editId === this.startAt) ?? ready[0]
    if (record === undefined) return
    if (this.hooks.send(record)) this.inFlight = record.editId
  }

  acknowledged({ editId, seq, head }: Acknowledged): void {
    const record = this.find(editId)
    if (this.inFlight === editId) this.inFlight = null
    if (this.startAt === editId) this.startAt = null
    if (record !== null) {
      const { meta } = this.outbox
      const furthest = seq > meta.seq ? { seq, head } : {}
      this.outbox.commit({
        ifRecord: editId,
        remove: [editId],
        updates: [record.update],
        meta: {
          ...furthest,
          acknowledged: { seq: Math.max(seq, meta.acknowledged?.seq ?? 0), time: this.hooks.now() },
        },
      })
      this.hooks.accepted(record)
    }
    this.pump()
  }

  refused(refusal: Refused): void {
    const record = this.find(refusal.editId)
    if (record === null) return
    this.inFlight = null
    switch (refusal.code) {
      case 'gap':
        this.fillGap(record, refusal.missing ?? null)
        return
      case 'not-stored':
        this.retry = setTimeout(() => {
          this.retry = null
          this.pump()
        }, RETRY_AFTER)
        return
      case 'epoch':
        this.hooks.renew(NEW_EPOCH)
        return
      case 'not-allowed':
        // Signed out, or no longer a member: the edits wait for the next time that this person is let in.
        this.live = false
        return
      case 'read-only':
        // No other edit will fare better.
        this.giveUp(this.outbox.records, refusal)
        return
      default:
        this.giveUp([record], refusal)
    }
  }

  private giveUp(records: readonly OutboxRecord[], { code, reason }: Refused): void {
    this.hooks.renew({
      remove: records.map((each) => each.editId),
      refuse: records.map(({ editId, deed, time }) => ({ editId, deed, time, code, reason })),
    })
  }

  /** Goes on from the edit that brings the missing clock; without one, the document holds what the server has not. */
  private fillGap(record: OutboxRecord, missing: Refused['missing'] | null): void {
    const bringer = missing ? this.outbox.records.find((each) => brings(each, missing)) : undefined
    if (bringer === undefined || bringer.editId === record.editId || this.startAt !== null) {
      this.hooks.renew({ dropUpdates: true })
      return
    }
    this.startAt = bringer.editId
    this.pump()
  }

  private find(editId: string): OutboxRecord | null {
    return this.outbox.records.find((each) => each.editId === editId) ?? null
  }
}

/** The server has begun the document anew: forget the copy, keep the edits, ask which epoch it is. */
export const NEW_EPOCH: Batch = { dropUpdates: true, meta: { epoch: null, seq: 0, head: null } }

function brings(record: OutboxRecord, { clientId, clock }: { clientId: number; clock: number }): boolean {
  const { from, to } = Y.parseUpdateMeta(record.update)
  return (from.get(clientId) ?? Number.POSITIVE_INFINITY) <= clock && clock < (to.get(clientId) ?? 0)
}
