import type { EvidenceData, EvidenceNetwork } from '../../../../../lib/budget/evaluation'
import { type NeededFile, neededFiles } from '../../../../../lib/budget/evidence/needed'
import type { Budget } from '../../../../../lib/budget/schema'
import { Listeners } from './listeners'
import { readAs } from './readAs'

export type ReadEvidence = {
  /** What has been read so far; another map whenever a file was read. */
  readonly networks: EvidenceData
  /** A file that the budget needs is being read. */
  readonly reading: boolean
}

export const NOTHING_READ: ReadEvidence = { networks: new Map(), reading: false }

/**
 * The networks that the page evaluates with: reads what the budget needs, one file after the other, so that a large one is
 * in memory alone. A read that failed is tried again with the next state of the budget; a file that the server does not
 * have, once the budget's list of files has changed.
 */
export class EvidenceReader {
  private budget: Budget | null = null
  private needed: readonly NeededFile[] = []
  private readonly networks = new Map<string, { readonly as: string; readonly network: EvidenceNetwork }>()
  private readonly missed = new Map<string, 'absent' | 'failed'>()
  private busy = false
  private state = NOTHING_READ
  private readonly listeners = new Listeners()
  readonly subscribe = this.listeners.add

  constructor(private readonly read: (file: NeededFile) => Promise<EvidenceNetwork | null>) {}

  readonly getSnapshot = (): ReadEvidence => this.state

  show(budget: Budget): void {
    if (budget === this.budget) return
    const listed = budget.evidence !== this.budget?.evidence
    for (const [as, how] of this.missed) if (how === 'failed' || listed) this.missed.delete(as)
    this.budget = budget
    this.needed = neededFiles(budget)
    this.next(this.state.networks)
  }

  private next(networks: EvidenceData): void {
    const file = this.needed.find((each) => this.unread(each))
    this.publish({ networks, reading: file !== undefined })
    if (file && !this.busy) void this.take(file)
  }

  private unread(file: NeededFile): boolean {
    const as = readAs(file)
    return this.networks.get(file.sha256)?.as !== as && !this.missed.has(as)
  }

  private async take(file: NeededFile): Promise<void> {
    const as = readAs(file)
    this.busy = true
    const read = await this.read(file).catch(() => 'failed' as const)
    this.busy = false
    if (read === null || read === 'failed') {
      this.missed.set(as, read ?? 'absent')
      return this.next(this.state.networks)
    }
    this.networks.set(file.sha256, { as, network: read })
    this.next(new Map([...this.networks].map(([sha256, { network }]) => [sha256, network])))
  }

  private publish(state: ReadEvidence): void {
    if (state.networks === this.state.networks && state.reading === this.state.reading) return
    this.state = state
    this.listeners.tell()
  }
}
