import type { Effect } from '../../sheet/wire'
import { sha256Hex } from '../sha256'
import { plainBytes } from './columns'
import type { Connection } from './connection'
import type { Snapshot } from './types'
import type { Writer } from './writer'

/** Snapshots and effects: kept beside the chain, derived from it, and never trusted further than it. */
export type Beside = {
  saveSnapshot(budget: string, snapshot: Snapshot): Promise<void>
  loadSnapshot(budget: string): Promise<Snapshot | null>
  saveEffects(budget: string, rows: readonly { seq: number; effects: readonly Effect[] }[]): Promise<void>
  effects(budget: string, seqs: readonly number[]): Promise<Map<number, Effect[]>>
}

export function besideTheChain(writer: Writer, reader: Connection): Beside {
  return {
    saveSnapshot: (budget, { seq, hash, sha256, state }) =>
      writer.write('INSERT OR REPLACE INTO snapshots (budget, seq, hash, sha256, state) VALUES (?, ?, ?, ?, ?)', [
        budget,
        seq,
        hash,
        sha256,
        state,
      ]),

    async loadSnapshot(budget) {
      // The join drops a snapshot of an entry that the chain does not hold.
      const found = await reader.all<Snapshot>(
        `SELECT snapshots.seq, snapshots.hash, snapshots.sha256, snapshots.state FROM snapshots
         JOIN entries ON entries.budget = snapshots.budget AND entries.seq = snapshots.seq AND entries.hash = snapshots.hash
         WHERE snapshots.budget = ? ORDER BY snapshots.seq DESC`,
        [budget],
      )
      const sound = found.find(({ state, sha256 }) => sha256Hex(state) === sha256)
      return sound ? { ...sound, state: plainBytes(sound.state) } : null
    },

    async saveEffects(budget, rows) {
      if (rows.length === 0) return
      await writer.write(
        `INSERT OR REPLACE INTO effects (budget, seq, effects)
         SELECT ?, json_extract(value, '$.seq'), json_extract(value, '$.effects') FROM json_each(?)`,
        [budget, JSON.stringify(rows)],
      )
    },

    async effects(budget, seqs) {
      const found = await reader.all<{ seq: number; effects: string }>(
        'SELECT seq, effects FROM effects WHERE budget = ? AND seq IN (SELECT value FROM json_each(?)) ORDER BY seq',
        [budget, JSON.stringify(seqs)],
      )
      return new Map(found.map(({ seq, effects }) => [seq, JSON.parse(effects)]))
    },
  }
}
