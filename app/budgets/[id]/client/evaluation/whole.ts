import type { Evaluation } from '../../../../../lib/budget/evaluation'
import type { Budget } from '../../../../../lib/budget/schema'
import { Listeners } from './listeners'
import type { ReadEvidence } from './reader'

/** An evaluation with everything over frequency and random builds. */
export type Whole = {
  /** The last one; of an older state of the budget while working. */
  readonly evaluation: Evaluation | null
  readonly working: boolean
  /** Why there is none of the latest state, in a sentence. */
  readonly failed: string | null
}

export const NO_WHOLE: Whole = { evaluation: null, working: true, failed: null }

/** After the last edit, so that typing on does not evaluate every step. */
const PAUSE_MS = 250

type State = { readonly budget: Budget; readonly networks: ReadEvidence['networks'] }

/**
 * Evaluates the latest state of a budget in full, while somebody looks: one evaluation at a time, and of the states that come
 * meanwhile only the last.
 */
export class WholeEvaluation {
  private lookers = 0
  private wanted: State | null = null
  /** The wanted state needs a file that is still being read. */
  private incomplete = false
  private settled: State | null = null
  private busy = false
  private pause: ReturnType<typeof setTimeout> | null = null
  private state = NO_WHOLE
  private readonly listeners = new Listeners()
  readonly subscribe = this.listeners.add

  constructor(private readonly evaluate: (budget: Budget) => Promise<Evaluation>) {}

  readonly getSnapshot = (): Whole => this.state

  /** Says that somebody looks. @returns for when they do so no longer */
  look(): () => void {
    this.lookers++
    if (this.state.failed !== null) this.settled = null
    this.start()
    return () => {
      this.lookers--
      if (this.lookers === 0) this.stopPause()
    }
  }

  show(budget: Budget, { networks, reading }: ReadEvidence): void {
    const first = this.wanted === null
    const edited = this.wanted?.budget !== budget
    if (edited || this.wanted?.networks !== networks) this.wanted = { budget, networks }
    this.incomplete = reading
    if (edited && !first && this.lookers > 0) {
      this.stopPause()
      this.pause = setTimeout(() => {
        this.pause = null
        this.start()
      }, PAUSE_MS)
    }
    this.start()
  }

  private start(): void {
    const { wanted } = this
    if (wanted === null || wanted === this.settled || this.lookers === 0) return
    this.publish({ ...this.state, working: true, failed: null })
    if (!this.busy && !this.incomplete && this.pause === null) void this.run(wanted)
  }

  private async run(state: State): Promise<void> {
    this.busy = true
    const found = await this.evaluate(state.budget).catch((error: unknown) =>
      error instanceof Error ? error.message : String(error),
    )
    this.busy = false
    const latest = state === this.wanted
    if (latest) this.settled = state
    if (typeof found !== 'string') this.publish({ evaluation: found, working: !latest, failed: null })
    else if (latest) this.publish({ ...this.state, working: false, failed: found })
    this.start()
  }

  /** Forgets a pause that has not ended. */
  stopPause(): void {
    if (this.pause !== null) clearTimeout(this.pause)
    this.pause = null
  }

  private publish(state: Whole): void {
    const { evaluation, working, failed } = this.state
    if (state.evaluation === evaluation && state.working === working && state.failed === failed) return
    this.state = state
    this.listeners.tell()
  }
}
