import { Ration } from '../ration'
import type { Answer } from '../room/queued'

/** Gaps in a row that an honest page may make. */
const GAPS = 3
/** Refusals per minute of one connection. */
const REFUSALS = 30

/** How much one connection is put up with: one refused edit is answered, not punished (write path, rule 10). */
export class Patience {
  private gaps = 0
  private readonly refusals: Ration
  private readonly broken = new Set<number>()

  constructor(now: () => number) {
    this.refusals = new Ration(REFUSALS, 60_000, now)
  }

  /** @returns false where it is used up */
  after(answer: Answer, clientId: number): boolean {
    if ('seq' in answer) {
      this.gaps = 0
      return true
    }
    if (answer.code !== 'gap') {
      // What the page sent after a refused edit hangs on it, and arrives as gaps.
      this.broken.add(clientId)
      return this.refusals.spend('')
    }
    if (this.broken.has(clientId)) return true
    this.gaps++
    return this.gaps < GAPS
  }
}
