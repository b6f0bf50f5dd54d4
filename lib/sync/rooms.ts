import type { Sessions } from '../access/service'
import type { Journal } from '../records/journal/types'
import type { Records } from '../records/types'
import { CLOSE } from '../sheet/closeCodes'
import type { Cancel, Clock, Log } from './clock'
import type { Committer } from './committer'
import type { Evaluator } from './evaluator'
import { fillEffects } from './room/fillEffects'
import { loadDocument } from './room/load'
import { Room } from './room/room'
import type { Snapshots } from './snapshots'

export type RoomsDeps = {
  readonly journal: Journal
  readonly records: Pick<Records, 'budgets'>
  readonly sessions: Sessions
  readonly committer: Committer
  readonly snapshots: Snapshots
  readonly clock: Clock
  readonly log: Log
  readonly engine: string
  readonly evaluator: Pick<Evaluator, 'margins'>
  /** Budgets whose record and journal do not agree: id → what to do. */
  readonly problems: ReadonlyMap<string, string>
}

/** The budget exists and is not served: `locked` says why and what to do. */
export type Locked = { readonly locked: string }

/** How often rooms are looked at, how long an empty one stays, in milliseconds; entries between two snapshots. */
const LOOK = 15_000
const STAYS = 60_000
const SNAPSHOT_ENTRIES = 500

/** All budgets that are open in this process, each once. */
export class Rooms {
  private readonly opening = new Map<string, Promise<Room | Locked | null>>()
  private readonly open = new Map<string, { room: Room; usedAt: number }>()
  private readonly locks: Map<string, Locked>
  private readonly stopLooking: Cancel
  private isClosing = false

  constructor(private readonly deps: RoomsDeps) {
    this.locks = new Map([...deps.problems].map(([budget, locked]) => [budget, { locked }]))
    this.stopLooking = deps.clock.every(LOOK, () => this.look())
  }

  /** The room of a budget, loaded if need be. @returns null where there is no such budget */
  async get(budget: string): Promise<Room | Locked | null> {
    if (this.isClosing) return { locked: 'The server is stopping; try again in a minute.' }
    const here = this.open.get(budget)
    if (here) {
      here.usedAt = this.deps.clock.now()
      return here.room
    }
    const opening = this.opening.get(budget) ?? this.load(budget)
    this.opening.set(budget, opening)
    return opening.finally(() => this.opening.delete(budget))
  }

  /** The room, if it is open. */
  peek(budget: string): Room | null {
    return this.open.get(budget)?.room ?? null
  }

  /** Why a budget is not served, if that is known. */
  lockOf(budget: string): Locked | null {
    return this.locks.get(budget) ?? null
  }

  /** A damaged budget is not served until the next start, when it may have been restored. */
  lock(budget: string, why: string): Locked {
    this.deps.log(`Budget ${budget} is not served: ${why}`)
    const locked = { locked: why }
    this.locks.set(budget, locked)
    return locked
  }

  all(): Room[] {
    return [...this.open.values()].map(({ room }) => room)
  }

  /** Lets nobody in any more, waits until everything accepted is committed, and closes all rooms, with a snapshot each. */
  async close(): Promise<void> {
    this.isClosing = true
    this.stopLooking()
    await Promise.all(this.opening.values())
    for (const room of this.all()) await room.quiet()
    for (const room of this.all()) await this.let(room, CLOSE.restart)
  }

  private async load(budget: string): Promise<Room | Locked | null> {
    const { journal, records, evaluator, log } = this.deps
    const record = await records.budgets.byId(budget)
    if (!record) return null
    if (record.state === 'abandoned')
      return { locked: 'This budget was never finished; make it anew, or import its file again.' }
    const known = this.lockOf(budget)
    if (known) return known
    const loaded = (await loadDocument(journal, budget)) ?? { damaged: 'The journal does not hold this budget.' }
    if ('damaged' in loaded) return this.lock(budget, loaded.damaged)
    const bound = await journal.bindings(budget)
    const room = new Room(budget, loaded, bound, {
      ...this.deps,
      renamed: (id, name) => this.rename(id, name),
      broken: (broken) => this.evict(broken),
    })
    this.open.set(budget, { room, usedAt: this.deps.clock.now() })
    fillEffects(journal, evaluator, budget, room.state).catch((cause) =>
      log(`Effects of budget ${budget} that a stop left out could not be found`, cause),
    )
    return room
  }

  /** A room that cannot go on is let go at once; whoever comes next loads it from the journal. */
  private evict(room: Room): void {
    this.open.delete(room.budget)
    room.close(CLOSE.notReady)
  }

  private look(): void {
    const { clock, snapshots } = this.deps
    for (const entry of this.open.values()) {
      const { room } = entry
      if (room.isBusy) entry.usedAt = clock.now()
      if (clock.now() - entry.usedAt >= STAYS) {
        void this.let(room, CLOSE.notReady)
      } else if (room.state.head.seq - room.snapshotSeq >= SNAPSHOT_ENTRIES) {
        room.snapshotSeq = room.state.head.seq
        void snapshots.make(room.budget)
      }
    }
  }

  private async let(room: Room, reason: typeof CLOSE.restart | typeof CLOSE.notReady): Promise<void> {
    const { head } = room.state
    this.open.delete(room.budget)
    room.close(reason)
    if (head.seq > room.snapshotSeq) await this.deps.snapshots.make(room.budget)
  }

  /** The record's name follows the head's: it is shown where the journal is not read. */
  private rename(budget: string, name: string | null): void {
    this.deps.records.budgets
      .rename(budget, name ?? '')
      .catch((cause) => this.deps.log(`The record of budget ${budget} kept its old name`, cause))
  }
}
