import * as Y from 'yjs'
import type { Sessions } from '../../access/service'
import type { Budget } from '../../budget/schema'
import type { Entry, Head, Journal } from '../../records/journal/types'
import type { Operation } from '../../sheet/change'
import { CLOSE } from '../../sheet/closeCodes'
import type { Role } from '../../sheet/wire'
import type { Cancel, Clock, Log } from '../clock'
import type { CloseReason } from '../closing'
import type { Committer } from '../committer'
import type { Evaluator } from '../evaluator'
import { Admission } from './admission'
import { Bindings } from './bindings'
import { Chain } from './chain'
import type { EditKey } from './editKey'
import { KnownEdits } from './knownEdits'
import type { Loaded } from './load'
import { Peers } from './peers'
import type { Actor, Answer, Incoming } from './queued'
import { Roster } from './roster'
import { Submissions } from './submissions'
import { type Committed, Trail } from './trail'
import { WritePath } from './writePath'

/** What is committed of a budget. `lastEdit`: the newest entry that is no binding. */
export type BudgetState = { readonly budget: Budget; readonly head: Head; readonly lastEdit: Entry }

export type RoomDeps = {
  readonly journal: Journal
  readonly sessions: Sessions
  readonly committer: Committer
  readonly clock: Clock
  readonly log: Log
  readonly engine: string
  readonly evaluator: Pick<Evaluator, 'margins'>
  /** The name in the budget's head is another one now. */
  readonly renamed: (budget: string, name: string | null) => void
  /** The room cannot go on: it is taken out, and loaded anew when somebody comes. */
  readonly broken: (room: Room) => void
}

/** Every connection hears from the server at least this often; the page's provider gives up after 30 s. Milliseconds. */
export const PRESENCE_INTERVAL = 15_000
/** Between two looks at a journal that cannot be read. Milliseconds. */
const EXAMINE_AGAIN = 1_000

/** One budget that is open in this process. */
export class Room {
  readonly peers: Peers
  private readonly roster: Roster
  private readonly chain: Chain
  private readonly path: WritePath
  private readonly trail: Trail
  private readonly submissions: Submissions
  private readonly stopPresence: Cancel
  private receiving = 0
  private name: string | null
  isClosed = false
  /** The entry that the newest snapshot stands at. */
  snapshotSeq: number

  constructor(
    readonly budget: string,
    private readonly loaded: Loaded,
    bound: Map<number, string>,
    private readonly deps: RoomDeps,
  ) {
    const { journal, sessions, committer, clock, log, engine, evaluator } = deps
    this.snapshotSeq = loaded.snapshotSeq
    this.peers = new Peers(clock)
    const bindings = new Bindings(bound, (clientId) => Y.getState(loaded.doc.store, clientId) > 0)
    this.chain = new Chain(budget, engine, loaded.head)
    this.roster = new Roster((person) => sessions.role(person, budget), {
      changed: (person, role) => this.roleChanged(person, role),
      settled: () => this.path.resume(),
    })
    this.path = new WritePath(
      {
        live: loaded.doc,
        chain: this.chain,
        bindings,
        known: new KnownEdits(journal, budget),
        roster: this.roster,
        admission: new Admission(this.roster, ({ identity }) => sessions.valid(identity), clock.now),
        committer,
        now: clock.now,
        events: {
          spread: (update, from) => this.peers.sendUpdate(update, from),
          told: (committed) => this.told(committed),
          accepted: (update) => this.submissions.follow(update),
          undone: () => this.submissions.drop(),
          abused: (person) => this.closePerson(person, CLOSE.refused),
          unwritten: () => void this.examine(),
          broken: (cause) => this.breakDown('The live document could not follow the journal', cause),
        },
      },
      loaded.lastEdit,
    )
    this.name = this.path.budget.head.name
    this.submissions = new Submissions(budget, this.path, bindings)
    this.trail = new Trail(
      budget,
      this.path.budget,
      journal,
      (entries) => this.peers.sendTrail(entries),
      evaluator,
      log,
    )
    this.stopPresence = clock.every(PRESENCE_INTERVAL, () => this.tick())
  }

  /** What is committed. */
  get state(): BudgetState {
    return { budget: this.path.budget, head: this.chain.head, lastEdit: this.path.lastEdit }
  }

  /** Somebody is here, or something is under way. */
  get isBusy(): boolean {
    return this.peers.size > 0 || this.isWorking
  }
  private get isWorking(): boolean {
    return this.receiving > 0 || this.path.intake.size > 0 || !this.trail.isIdle
  }

  /** What of the committed document the other end does not have. @throws where the state vector cannot be read */
  missingFrom(stateVector: Uint8Array): Uint8Array {
    return Y.encodeStateAsUpdate(this.loaded.doc, stateVector)
  }

  /** The role of somebody who comes in. @throws where it cannot be read */
  enter(person: string): Promise<Role | null> {
    return this.roster.enter(person)
  }

  /** Somebody's membership was changed. */
  membershipChanged(person: string): void {
    this.roster.invalidate(person)
  }

  /** @returns false where the client id is somebody else's */
  bind(actor: Actor, clientId: number): boolean {
    return this.path.bind(actor, clientId)
  }

  /**
   * Takes one edit in. Resolves when it has passed the gate or not, so that a sender's next edit may follow; the answer comes
   * when it is committed or refused.
   */
  async receive(incoming: Incoming, answer: (answer: Answer) => void): Promise<void> {
    await this.counted(() => this.path.receive(incoming, () => this.path.offer(incoming, answer), answer))
  }

  /** Makes an edit from operations and takes it in like any other. */
  submit(actor: Actor, key: EditKey, operations: readonly Operation[], expectedSeq: number | null): Promise<Answer> {
    const asked = { actor, key, epoch: this.chain.head.epoch }
    return this.counted(() => this.submissions.submit(asked, operations, expectedSeq))
  }

  /** Resolves when the effects of what is committed now are kept. */
  effectsKept(): Promise<void> {
    return this.trail.kept()
  }

  /** Resolves when all that came in is committed and answered, and its effects are kept. */
  async quiet(): Promise<void> {
    do {
      await this.deps.committer.idle()
      await this.trail.kept()
      await new Promise((resolve) => setImmediate(resolve))
    } while (this.isWorking)
  }

  closeSession(session: string): void {
    for (const peer of this.peers.all()) if (peer.identity.session === session) peer.close(CLOSE.signInAgain)
  }

  /** Lets everybody go and everything with it. What is queued is refused: wait for the committer first. */
  close(reason: CloseReason): void {
    if (this.isClosed) return
    this.isClosed = true
    this.stopPresence()
    for (const peer of this.peers.all()) peer.close(reason)
    this.path.close()
    this.submissions.drop()
    this.loaded.doc.destroy()
  }

  private async counted<T>(run: () => Promise<T>): Promise<T> {
    this.receiving++
    try {
      return await run()
    } finally {
      this.receiving--
    }
  }

  private tick(): void {
    for (const peer of this.peers.all()) if (!this.deps.sessions.valid(peer.identity)) peer.close(CLOSE.signInAgain)
    this.peers.sendPresence()
  }

  private told(committed: readonly Committed[]): void {
    const { name } = this.path.budget.head
    if (name !== this.name) this.deps.renamed(this.budget, name)
    this.name = name
    this.trail.add(committed)
  }

  private roleChanged(person: string, role: Role | null): void {
    for (const peer of this.peers.all()) {
      if (peer.identity.person !== person) continue
      if (role === null) peer.close(CLOSE.notAllowed)
      else peer.roleChanged(role)
    }
  }

  private closePerson(person: string, reason: CloseReason): void {
    for (const peer of this.peers.all()) if (peer.identity.person === person) peer.close(reason)
  }

  /** After a failed commit nothing is written until the journal's head has been read and is ours. */
  private async examine(): Promise<void> {
    if (this.isClosed) return
    try {
      const head = await this.deps.journal.head(this.budget)
      if (head?.seq === this.chain.head.seq && head.hash === this.chain.head.hash) return this.path.trustAgain()
      this.breakDown('The journal holds another head than this process wrote')
    } catch (cause) {
      this.deps.log(`The journal's head of budget ${this.budget} cannot be read; trying again`, cause)
      this.deps.clock.after(EXAMINE_AGAIN, () => void this.examine())
    }
  }

  private breakDown(what: string, cause?: unknown): void {
    this.deps.log(`${what}: budget ${this.budget} is loaded anew`, cause)
    this.deps.broken(this)
  }
}
