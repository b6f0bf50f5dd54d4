import { FIRST_META, type Meta, type OutboxRecord, type RefusedRecord } from './record'
import { type Batch, type BrowserStorage, reduce, type Stored } from './storage'

/**
 * The stored edits as one tab sees them: its own batches at once, those of other tabs when they tell. Batches are stored
 * in the order in which they came.
 */
export class Outbox {
  private stored: Stored = { meta: FIRST_META, records: [], refused: [] }
  private writing = 0
  /** Another tab has written while own batches were on their way. */
  private unread = false
  private last: Promise<void> = Promise.resolve()
  private readonly unwatch: () => void
  /** Why the browser could not keep something, in words; null while all is well. */
  fault: string | null = null

  constructor(
    private readonly storage: BrowserStorage,
    private readonly changed: () => void,
  ) {
    this.unwatch = storage.watch(() => void this.look())
  }

  get meta(): Meta {
    return this.stored.meta
  }
  /** Edits that are not acknowledged yet, oldest first. */
  get records(): readonly OutboxRecord[] {
    return this.stored.records
  }
  get refused(): readonly RefusedRecord[] {
    return this.stored.refused
  }

  /** Reads what is stored; while own batches are on their way, after the last of them, so that none seems undone. */
  async look(): Promise<void> {
    await this.enqueue(async () => {
      const stored = this.writing > 0 ? null : await this.storage.read()
      if (stored === null || this.writing > 0) {
        this.unread = true
        return
      }
      this.unread = false
      this.stored = stored
      this.changed()
    })
  }

  /** Stores a batch. It holds for this tab at once; if another tab was first and a condition fails, its state is taken over. */
  commit(batch: Batch): void {
    const next = reduce(this.stored, batch)
    if (next === null) return
    this.stored = next
    this.writing++
    void this.enqueue(async () => {
      try {
        if (!(await this.storage.write(batch))) this.unread = true
      } finally {
        this.writing--
      }
      if (this.unread && this.writing === 0) void this.look()
    })
    this.changed()
  }

  /** Resolves when all batches so far are stored. */
  async settled(): Promise<void> {
    await this.last
  }

  async close(): Promise<void> {
    this.unwatch()
    await this.settled()
    this.storage.close()
  }

  private enqueue(job: () => Promise<void>): Promise<void> {
    this.last = this.last.then(job).catch((error: unknown) => {
      this.fault = `This browser could not keep a change: ${error instanceof Error ? error.message : String(error)}`
      this.changed()
    })
    return this.last
  }
}
