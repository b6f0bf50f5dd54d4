import type { Journal, Row } from '../records/journal/types'
import type { Clock, Log } from './clock'

/** What has rows to write: a room, or a budget that is being made. All calls are made while no commit is in flight. */
export type Committing = {
  /** The rows that are ready now, at most `limit`; checked for the last time. */
  take(limit: number): readonly Row[]
  /** They are on disk. */
  stored(rows: readonly Row[]): void
  /** None of them is. */
  failed(cause: unknown): void
  /** Whether there is more to write. */
  readonly hasMore: boolean
}

/**
 * Commits begin at least this many milliseconds apart, so that edits gather when many come; one that comes after a pause goes
 * at once.
 */
const GATHER = 5
/** Rows of one commit; the journal takes some 2,000 in one INSERT. */
const MOST_ROWS = 1_500

/**
 * Commits for the whole process: one at a time, one INSERT with the rows of all rooms that have some (write path, rule 5). What
 * comes while a commit is in flight goes into the next one.
 */
export class Committer {
  private waiting = new Set<Committing>()
  private running: Promise<void> | null = null
  private begun = Number.NEGATIVE_INFINITY

  constructor(
    private readonly journal: Pick<Journal, 'append'>,
    private readonly clock: Clock,
    private readonly log: Log,
  ) {}

  request(member: Committing): void {
    this.waiting.add(member)
    this.running ??= this.run()
  }

  /** Resolves when nothing is waiting or in flight. */
  async idle(): Promise<void> {
    while (this.running) await this.running
  }

  private async run(): Promise<void> {
    while (this.waiting.size > 0) {
      const wait = Math.min(GATHER, Math.max(0, this.begun + GATHER - this.clock.now()))
      await new Promise<void>((resolve) => this.clock.after(wait, resolve))
      this.begun = this.clock.now()
      await this.commit()
    }
    // At once, not in a later microtask: a request in between would be forgotten.
    this.running = null
  }

  private async commit(): Promise<void> {
    const members = [...this.waiting]
    this.waiting.clear()
    const taken: { member: Committing; rows: readonly Row[] }[] = []
    let room = MOST_ROWS
    for (const member of members) {
      const rows = room > 0 ? this.take(member, room) : []
      if (rows.length > 0) taken.push({ member, rows })
      else if (room <= 0) this.waiting.add(member)
      room -= rows.length
    }
    if (taken.length === 0) return
    const failure = await this.append(taken.flatMap(({ rows }) => rows))
    for (const { member, rows } of taken) {
      this.guard(() => (failure ? member.failed(failure.cause) : member.stored(rows)))
      if (member.hasMore) this.waiting.add(member)
    }
  }

  private take(member: Committing, limit: number): readonly Row[] {
    try {
      return member.take(limit)
    } catch (cause) {
      this.guard(() => member.failed(cause))
      return []
    }
  }

  private async append(rows: readonly Row[]): Promise<{ cause: unknown } | null> {
    try {
      await this.journal.append(rows)
      return null
    } catch (cause) {
      this.log(`A commit of ${rows.length} rows failed; nothing of it is stored`, cause)
      return { cause }
    }
  }

  /** One room's failure may not stop the others. */
  private guard(run: () => void): void {
    try {
      run()
    } catch (cause) {
      this.log('A room failed after a commit', cause)
    }
  }
}
