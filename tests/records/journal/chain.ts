import { GENESIS, sealEntry } from '../../../lib/records/journal/entry'
import type { Entry, Row } from '../../../lib/records/journal/types'

/** Rows that follow each other, the first after `previous` (by default the first of the budget). */
export function chain(
  count: number,
  { budget = 'b1', previous = null as Entry | null, kind = 'edit' as Entry['kind'], bytes = 20 } = {},
): Row[] {
  const rows: Row[] = []
  let last = previous
  for (let index = 0; index < count; index += 1) {
    const seq = (last?.seq ?? 0) + 1
    const update = new Uint8Array(bytes).fill(seq % 256)
    last = sealEntry(
      {
        budget,
        epoch: 1,
        seq,
        kind: seq === 1 && kind === 'edit' ? 'seed' : kind,
        editId: `edit-${seq}`,
        person: 'p1',
        door: 'screen',
        time: 1_700_000_000_000 + seq,
        clientId: kind === 'bind' ? 4_000_000_000 + seq : null,
        changes: [{ section: 'lines', id: 'l1', field: 'lossDb', kind: 'set', before: seq - 1, after: seq }],
        engine: '0.1.0',
      },
      update,
      last?.hash ?? GENESIS,
    )
    rows.push({ entry: last, update })
  }
  return rows
}

export function lastOf(rows: readonly Row[]): Entry {
  const last = rows.at(-1)
  if (!last) throw new Error('The chain is empty.')
  return last.entry
}
