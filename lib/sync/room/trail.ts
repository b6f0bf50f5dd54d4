import type { Budget } from '../../budget/schema'
import type { Entry, Journal } from '../../records/journal/types'
import type { Effect, TrailEntry } from '../../sheet/wire'
import type { Log } from '../clock'
import type { Evaluator, Margins } from '../evaluator'
import { effectsBetween } from './effects'

/** A committed edit, with the budget that it led to and the name of who made it. */
export type Committed = { readonly entry: Entry; readonly after: Budget; readonly personName: string }

/**
 * Finds out what each committed edit did to the margins, keeps it beside the chain, and tells everybody. Off the write path:
 * edits are acknowledged before, and an effect that fails fails nothing else.
 */
export class Trail {
  private waiting: Committed[] = []
  private running: Promise<void> | null = null
  private before: Budget
  private margins: Margins | null = null
  private added = 0
  private done = 0
  private waiters: { until: number; resolve: () => void }[] = []

  constructor(
    private readonly budget: string,
    start: Budget,
    private readonly journal: Pick<Journal, 'saveEffects'>,
    private readonly tell: (entries: TrailEntry[]) => void,
    private readonly evaluator: Pick<Evaluator, 'margins'>,
    private readonly log: Log,
  ) {
    this.before = start
  }

  add(committed: readonly Committed[]): void {
    if (committed.length === 0) return
    this.waiting.push(...committed)
    this.added += committed.length
    this.running ??= this.run()
  }

  /** Resolves when everything that was added until now has been kept and sent. */
  kept(): Promise<void> {
    const until = this.added
    if (this.done >= until) return Promise.resolve()
    return new Promise((resolve) => this.waiters.push({ until, resolve }))
  }
  get isIdle(): boolean {
    return this.running === null
  }

  private async run(): Promise<void> {
    while (this.waiting.length > 0) {
      const batch = this.waiting
      this.waiting = []
      const found: { entry: TrailEntry; known: boolean }[] = []
      for (const committed of batch) {
        // One evaluation at a time, so that frames are read in between.
        await new Promise((resolve) => setImmediate(resolve))
        const effects = await this.effectsOf(committed)
        found.push({
          entry: trailEntry(committed.entry, committed.personName, effects ?? []),
          known: effects !== null,
        })
      }
      await this.keep(found.flatMap(({ entry, known }) => (known ? [{ seq: entry.seq, effects: entry.effects }] : [])))
      this.tell(found.map(({ entry }) => entry))
      this.done += batch.length
      const isDue = ({ until }: { until: number }) => until <= this.done
      for (const { resolve } of this.waiters.filter(isDue)) resolve()
      this.waiters = this.waiters.filter((waiter) => !isDue(waiter))
    }
    this.running = null
  }

  private async effectsOf({ entry, after }: Committed): Promise<Effect[] | null> {
    try {
      const earlier = this.margins ?? (await this.evaluator.margins(this.before))
      const later = await this.evaluator.margins(after)
      const effects = effectsBetween(this.before, earlier, after, later)
      this.margins = later
      return effects
    } catch (cause) {
      this.log(`The effect of entry ${entry.seq} of budget ${this.budget} could not be found`, cause)
      this.margins = null
      return null
    } finally {
      this.before = after
    }
  }

  private async keep(rows: readonly { seq: number; effects: Effect[] }[]): Promise<void> {
    try {
      await this.journal.saveEffects(this.budget, rows)
    } catch (cause) {
      this.log(`Effects of budget ${this.budget} were not kept; they can be found again`, cause)
    }
  }
}

export function trailEntry(entry: Entry, personName: string, effects: Effect[]): TrailEntry {
  const { seq, epoch, kind, editId, person, door, time, changes, hash } = entry
  return { seq, epoch, kind, editId, person, personName, door, time, changes: [...changes], effects, hash }
}
