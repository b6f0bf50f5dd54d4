import * as Y from 'yjs'
import type { Journal } from '../records/journal/types'
import { sha256Hex } from '../records/sha256'
import type { Log } from './clock'
import { loadDocument } from './room/load'

/**
 * Makes snapshots by replay, never from a live document: what loads from them has gone through the same door as everything
 * else (write path, rule 8). One at a time, because a replay holds up the process.
 */
export class Snapshots {
  private last: Promise<void> = Promise.resolve()

  constructor(
    private readonly journal: Journal,
    private readonly log: Log,
  ) {}

  /** @returns the entry that the newest snapshot stands at then, or null where none could be made; never rejects */
  make(budget: string): Promise<number | null> {
    const made = this.last.then(() => this.makeOne(budget))
    this.last = made.then(() => undefined)
    return made
  }

  async idle(): Promise<void> {
    await this.last
  }

  private async makeOne(budget: string): Promise<number | null> {
    try {
      const loaded = await loadDocument(this.journal, budget)
      if (loaded === null || 'damaged' in loaded) return null
      const { doc, head, snapshotSeq } = loaded
      const state = Y.encodeStateAsUpdateV2(doc)
      doc.destroy()
      if (head.seq > snapshotSeq)
        await this.journal.saveSnapshot(budget, { seq: head.seq, hash: head.hash, state, sha256: sha256Hex(state) })
      return head.seq
    } catch (cause) {
      this.log(`No snapshot of budget ${budget} could be made; loading it takes longer`, cause)
      return null
    }
  }
}
