import * as Y from 'yjs'
import type { Budget } from '../../budget/schema'
import type { Entry, Row } from '../../records/journal/types'
import { readBudget } from '../../sheet/seed'
import type { Committer, Committing } from '../committer'
import type { Refusal } from '../gate/refusal'
import type { Accepted } from '../gate/shadow'
import type { Admission } from './admission'
import type { Bindings } from './bindings'
import type { Chain } from './chain'
import { Intake } from './intake'
import type { KnownEdits } from './knownEdits'
import { type Actor, type Answer, type Incoming, onlySender, type Queued, refused } from './queued'
import type { Roster } from './roster'
import type { Committed } from './trail'

export type WritePathParts = {
  readonly live: Y.Doc
  readonly chain: Chain
  readonly bindings: Bindings
  readonly known: KnownEdits
  readonly roster: Roster
  readonly admission: Admission
  readonly committer: Committer
  readonly now: () => number
  readonly events: WritePathEvents
}

/** An edit before its content is looked at. */
export type Asked = Pick<Incoming, 'actor' | 'epoch' | 'key'>

export type WritePathEvents = {
  /** The live document has changed; `from` is the connection that made all of it, if one did. */
  spread(update: Uint8Array, from: string | null): void
  /** Committed and acknowledged. */
  told(committed: readonly Committed[]): void
  /** Accepted: it will be committed unless somebody is stopped or the disk fails. */
  accepted(update: Uint8Array): void
  /** Some of what was accepted does not stand any more. */
  undone(): void
  /** The person has had more edits refused than they may cost. */
  abused(person: string): void
  /** The journal could not be written. */
  unwritten(): void
  /** The live document cannot follow the journal. */
  broken(cause: unknown): void
}

/** Bytes and number of edits that may wait for a slow disk. */
const MOST_BYTES = 64 * 1024 * 1024
const MOST_WAITING = 5_000

/**
 * The way of an edit: session, gate, queue, session again, journal, live document, everybody else, acknowledgement (write
 * path, rules 3 to 5). Here is the order of things; what each of them is stands in the parts.
 */
export class WritePath implements Committing {
  readonly intake: Intake
  /** The budget as committed. */
  budget: Budget
  /** After a failed commit, until the journal's head has been read again: edits are taken and wait. */
  private suspect = false
  private isClosed = false

  constructor(
    private readonly parts: WritePathParts,
    /** The newest entry that changed the budget, and is no binding. */
    public lastEdit: Entry,
  ) {
    this.intake = new Intake(parts.live)
    this.budget = readBudget(parts.live)
  }

  get hasMore(): boolean {
    return this.intake.hasWaiting
  }

  /** Gives a client id to a person who may write. @returns false where it is somebody else's */
  bind(actor: Actor, clientId: number): boolean {
    const { bindings, committer } = this.parts
    if (bindings.isFree(clientId)) {
      this.queueBind(actor, clientId)
      committer.request(this)
    }
    return bindings.mayUse(clientId, actor.identity.person)
  }

  /**
   * Takes an edit in: what is known already is answered, what is new enters. Resolves when it has entered or not, so that the
   * sender's next edit may follow; its answer may come later.
   */
  async receive(asked: Asked, enter: () => void, answer: (answer: Answer) => void): Promise<void> {
    const { known } = this.parts
    const searched = this.fromMemory(asked) ? null : known.read(asked.key).catch(() => refused(asked, NOT_READ))
    const inJournal = await searched
    // While the journal was read the same edit may have come another way, or its author may have been stopped. From here to
    // the queue nothing waits.
    const inMemory = this.fromMemory(asked)
    if (inMemory) void inMemory.then(answer)
    else if (inJournal) answer(inJournal)
    else enter()
  }

  /** Through the gate into the queue, at once; the answer comes when it is committed or refused. */
  offer(incoming: Incoming, answer: (answer: Answer) => void): void {
    const { admission, events } = this.parts
    const verdict = this.intake.offer(incoming.update, incoming.clientId, this.mayUse(incoming))
    if (!verdict.refused) {
      this.accept(incoming, verdict, answer)
      return
    }
    if (verdict.deep && !admission.spendDeep(incoming.actor)) events.abused(incoming.actor.identity.person)
    answer(refused(incoming, verdict.refused))
  }

  /** Queues what has passed the gate. */
  accept(incoming: Incoming, verdict: Accepted, answer: (answer: Answer) => void): void {
    const { bindings, known, committer, events } = this.parts
    if (bindings.isFree(incoming.clientId)) this.queueBind(incoming.actor, incoming.clientId)
    const { changes, after } = verdict
    const answered = new Promise<Answer>((resolve) => {
      this.intake.queue({ ...incoming, kind: 'edit', changes, after, answer: resolve })
    })
    known.queued(incoming.key, answered)
    void answered.then(answer)
    events.accepted(incoming.update)
    committer.request(this)
  }

  /** Called again when roles that were being read are known, or the journal's head has been found as it should be. */
  resume(): void {
    if (this.intake.hasWaiting) this.parts.committer.request(this)
  }

  take(limit: number): readonly Row[] {
    const { roster, chain, admission, now } = this.parts
    if (!roster.isSettled || this.suspect || this.isClosed) return []
    const dropped = this.intake.sift(
      (item) => (item.kind === 'edit' ? admission.stopped(item.actor) : null),
      (edit) => this.mayUse(edit),
    )
    for (const { item, refusal } of dropped) this.refuse(item, refusal)
    if (dropped.length > 0) this.parts.events.undone()
    return chain.seal(this.intake.take(limit), now())
  }

  stored(rows: readonly Row[]): void {
    const { chain, bindings, known, events } = this.parts
    const last = rows.at(-1)
    if (last) chain.moveTo(last.entry)
    const landed = this.intake.landed()
    const { update, fault } = this.apply(landed)
    const edits = landed.flatMap((item, index) => {
      const entry = rows[index]?.entry
      return item.kind === 'edit' && entry ? [{ item, entry }] : []
    })
    for (const item of landed) if (item.kind === 'bind') bindings.commit(item.clientId)
    for (const { item, entry } of edits) {
      known.landed(item.key)
      this.budget = item.after
      this.lastEdit = entry
    }
    if (update) events.spread(update, onlySender(edits.map(({ item }) => item)))
    for (const { item, entry } of edits) item.answer({ editId: item.key.editId, seq: entry.seq, head: entry.hash })
    events.told(edits.map(({ item, entry }) => ({ entry, after: item.after, personName: item.actor.identity.name })))
    if (fault) events.broken(fault.cause)
  }

  failed(): void {
    this.suspect = true
    this.refuseAll()
    this.parts.events.undone()
    this.parts.events.unwritten()
  }

  /** After a failed commit: the journal's head is what it was. */
  trustAgain(): void {
    this.suspect = false
    this.resume()
  }

  /** Nothing more is taken; what waits is refused. */
  close(): void {
    this.isClosed = true
    this.refuseAll()
    this.intake.destroy()
  }

  /** One transaction on the live document. It gave no trouble in the shadow; if it does here, the room is loaded anew. */
  private apply(landed: readonly Queued[]): { update: Uint8Array | null; fault: { cause: unknown } | null } {
    const { live } = this.parts
    const updates: Uint8Array[] = []
    const keep = (update: Uint8Array) => updates.push(update)
    live.on('update', keep)
    try {
      live.transact(() => {
        for (const item of landed) if (item.kind === 'edit') Y.applyUpdate(live, item.update)
      })
      return { update: updates[0] ?? null, fault: null }
    } catch (cause) {
      return { update: null, fault: { cause } }
    } finally {
      live.off('update', keep)
    }
  }

  /** What can be said of an edit from memory: that it may not come in, or is under way already. */
  private fromMemory(asked: Asked): Promise<Answer> | null {
    const { admission, known } = this.parts
    const refusal =
      admission.stopped(asked.actor) ?? admission.spent(asked.actor) ?? this.full() ?? this.wrongEpoch(asked.epoch)
    return refusal ? Promise.resolve(refused(asked, refusal)) : known.find(asked.key)
  }

  private full(): Refusal | null {
    if (this.isClosed) return { code: 'not-stored', reason: 'The budget is being closed; try again.' }
    const { size, bytes } = this.intake
    if (size < MOST_WAITING && bytes < MOST_BYTES) return null
    return { code: 'not-stored', reason: 'Too many edits wait for the disk; try again.' }
  }

  private wrongEpoch(epoch: number): Refusal | null {
    if (epoch === this.parts.chain.head.epoch) return null
    return { code: 'epoch', reason: 'The worksheet has been renewed; reload the page and enter it again.' }
  }

  private mayUse({ actor, clientId }: Pick<Incoming, 'actor' | 'clientId'>): boolean {
    return this.parts.bindings.mayUse(clientId, actor.identity.person)
  }

  private queueBind(actor: Actor, clientId: number): void {
    this.parts.bindings.reserve(clientId, actor.identity.person)
    this.intake.queue({ kind: 'bind', actor, clientId })
  }

  private refuseAll(): void {
    for (const item of this.intake.clear())
      this.refuse(item, { code: 'not-stored', reason: 'The server could not write; nothing was kept. Try again.' })
  }

  private refuse(item: Queued, refusal: Refusal): void {
    if (item.kind === 'bind') {
      this.parts.bindings.release(item.clientId)
      return
    }
    this.parts.known.refused(item.key)
    item.answer(refused(item, refusal))
  }
}

const NOT_READ: Refusal = { code: 'not-stored', reason: 'The journal cannot be read just now; try again.' }
