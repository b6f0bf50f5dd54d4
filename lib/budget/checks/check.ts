import type { Judged } from '../allowance/judge'
import type { Context } from '../context'
import type { EvidenceData, LineEvaluation } from '../evaluation'
import type { FlagDraft } from '../flags'
import type { LineItem } from '../lineItem'
import type { EvidenceRecord } from './evidence'

/** What a check looks at: the budget in order, its lines at Nyquist, its allowances judged. */
export type Checked = {
  readonly context: Context
  readonly lines: ReadonlyMap<string, LineEvaluation>
  readonly judged: readonly Judged[]
  /** The networks in the evidence files, by SHA-256. */
  readonly evidence: EvidenceData
}

/** One rule of the trade that a worksheet can check by itself. */
export type Check = (checked: Checked) => Iterable<FlagDraft>

/** What a check of one line may know beside the line and its loss class: nothing else, because its flags are remembered by it. */
export type Beside = {
  /** dB at Nyquist, in the lane where the line is worst; null: unknown. */
  readonly nominal: number | null
  /** Hz. */
  readonly nyquist: number | null
  /** Ω, differential. */
  readonly reference: number | null
  /** °C. */
  readonly referenceTemperature: number | null
  /** The file that proves the line's number, or its loss class's. */
  readonly evidence: EvidenceRecord | null
}

/** A rule that looks at one line alone. */
export type LineCheck = (item: LineItem, beside: Beside) => Iterable<FlagDraft>
