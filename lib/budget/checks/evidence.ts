import type { LineItem } from '../lineItem'
import { livingRecord } from '../record'
import type { Budget, RecordOf } from '../schema'

export type EvidenceRecord = RecordOf<'evidence'>

/** The file that proves the line's number, else its loss class's. */
export function evidenceIdOf({ line, lossClass }: LineItem): string | null {
  return line.evidence ?? lossClass?.evidence ?? null
}

export function evidenceOf(budget: Budget, item: LineItem): EvidenceRecord | null {
  return livingRecord(budget, 'evidence', evidenceIdOf(item))
}
