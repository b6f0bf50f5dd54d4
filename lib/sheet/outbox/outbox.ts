import { FIRST_META, type Meta, type OutboxRecord, type RefusedRecord } from './record'
import { type Batch, reduce, type Storage, type Stored } from './storage'

/**
 * The stored edits as one tab sees them: its own batches at once, those of other tabs when they tell. Batches are stored
 * in the order in which they came.
 */
export class Outbox {
  private stored: Stored = { meta: FIRST_META, records: [], refused: [] }
  private waiting = 0
  private last: Promise<void> = Promise.resolve()
  private readonly unwatch: () => void
  /** Why the browser could not keep something, in words; null while all is well. */
  fault: string | null = null

  constructor(
    private readonly storage: Storage,
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

  /** Reads what is stored, unless own batches are still on their way: then it is read after the last of them. */
  async look(): Promise<void> {
    await this.enqueue(async () => {
      const stored = await this.storage.read()
      // A batch that came meanwhile is not in what was read.
      if (this.waiting > 1) return
      this.stored = stored
      this.changed()
    })
  }

  /** Stores a batch. It holds for this tab at once; if another tab was first and a condition fails, its state is taken over. */
  commit(batch: Batch): void {
    const next = reduce(this.stored, batch)
    if (next === null) return
    this.stored = next
    void this.enqueue(async () => {
      if (!(await this.storage.write(batch))) void this.look()
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
    this.waiting++
    this.last = this.last.then(job).then(
      () => void this.waiting--,
      (error: unknown) => {
        this.waiting--
        this.fault = `This browser could not keep a change: ${error instanceof Error ? error.message : String(error)}`
        this.changed()
      },
    )
    return this.last
  }
}
