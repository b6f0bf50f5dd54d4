import type { Meta, OutboxRecord, RefusedRecord } from './record'

export type Stored = {
  readonly meta: Meta
  /** In the order in which they were made. */
  readonly records: readonly OutboxRecord[]
  readonly refused: readonly RefusedRecord[]
}

/** Changes that are stored together or not at all. */
export type Batch = {
  /** Only if this is still the generation, and this record is still there. */
  readonly ifGeneration?: number
  readonly ifRecord?: string
  readonly remove?: readonly string[]
  readonly add?: readonly OutboxRecord[]
  readonly refuse?: readonly RefusedRecord[]
  readonly dismiss?: readonly string[]
  readonly meta?: Partial<Meta>
  /** Updates for the cache of what the server has: received from it, or acknowledged by it; never an unsent edit. */
  readonly updates?: readonly Uint8Array[]
  /** Empties the cache first. */
  readonly dropUpdates?: boolean
}

/**
 * What a browser keeps of one budget for one person: unsent edits, refused edits, and a cache of the server's document.
 * All tabs share it. The cache never holds an edit that is neither acknowledged nor in the outbox, because both leave and
 * enter in one transaction: so there is no edit that only this browser sees and nobody sends.
 */
export interface BrowserStorage {
  /** False where nothing outlives the page. */
  readonly durable: boolean
  read(): Promise<Stored>
  /** The cached updates, oldest first, and a mark of how far they go. */
  updates(): Promise<{ updates: Uint8Array[]; through: number }>
  /** Puts one update in the place of the cached ones up to the mark. */
  compact(through: number, update: Uint8Array): Promise<void>
  /** @returns false where a condition of the batch did not hold, and nothing was stored */
  write(batch: Batch): Promise<boolean>
  /** Calls back when somebody else (another tab) has written. @returns how to stop */
  watch(listener: () => void): () => void
  close(): void
}

/** The stored state after a batch, or null where a condition does not hold. */
export function reduce(stored: Stored, batch: Batch): Stored | null {
  if (batch.ifGeneration !== undefined && batch.ifGeneration !== stored.meta.generation) return null
  if (batch.ifRecord !== undefined && !stored.records.some((record) => record.editId === batch.ifRecord)) return null
  const { remove = [], add = [], refuse = [], dismiss = [] } = batch
  const gone = new Set(remove)
  const dismissed = new Set(dismiss)
  return {
    meta: { ...stored.meta, ...batch.meta },
    records:
      gone.size + add.length === 0
        ? stored.records
        : [...stored.records.filter((record) => !gone.has(record.editId)), ...add],
    refused:
      dismissed.size + refuse.length === 0
        ? stored.refused
        : [...stored.refused.filter((record) => !dismissed.has(record.editId)), ...refuse],
  }
}
