import { sealEntry } from '../../records/journal/entry'
import type { Entry, Head, Row } from '../../records/journal/types'
import type { Queued } from './queued'

const NOTHING = new Uint8Array()

/** The end of a budget's chain of entries, and the rows that follow it. */
export class Chain {
  constructor(
    private readonly budget: string,
    private readonly engine: string,
    private end: Head & { readonly time: number },
  ) {}

  get head(): Head {
    return this.end
  }

  /**
   * The rows of a commit, sealed in order after the head. Time never goes back. The head moves when they are stored.
   * @throws Error where a row has no RFC 8785 form
   */
  seal(items: readonly Queued[], now: number): Row[] {
    let previous = this.end
    return items.map((item) => {
      const row = this.sealOne(item, previous, now)
      previous = endOf(row.entry)
      return row
    })
  }

  /** The rows are on disk. */
  moveTo(entry: Entry): void {
    this.end = endOf(entry)
  }

  private sealOne(item: Queued, previous: Head & { time: number }, now: number): Row {
    const { identity, door } = item.actor
    const update = item.kind === 'edit' ? item.update : NOTHING
    const parts = {
      budget: this.budget,
      epoch: previous.epoch,
      seq: previous.seq + 1,
      kind: item.kind,
      editId: item.kind === 'edit' ? item.key.stored : `bind:${item.clientId}`,
      person: identity.person,
      door,
      time: Math.max(now, previous.time),
      clientId: item.kind === 'edit' ? null : item.clientId,
      changes: item.kind === 'edit' ? item.changes : [],
      engine: this.engine,
    }
    return { entry: sealEntry(parts, update, previous.hash), update }
  }
}

function endOf({ epoch, seq, hash, time }: Entry): Head & { time: number } {
  return { epoch, seq, hash, time }
}
