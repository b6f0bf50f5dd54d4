import type { EvidenceData, LossAt } from '../evaluation'
import type { Findings } from '../findings'
import type { Budget, Line, LossClass } from '../schema'
import type { Computed, Surroundings } from './piece'

/** What a model may know. */
export type ModelInput = {
  /** The line, with the values of one lane. */
  readonly line: Line
  readonly fields: Findings<'lines'>
  /** The loss class that the line names, and its fields; null where it names none that exists. */
  readonly lossClass: LossClass | null
  readonly classFields: Findings<'lossClasses'> | null
  /** Layers of the line's assembly, evidence records: read only through livingRecord and inOrder. */
  readonly budget: Budget
  readonly evidence: EvidenceData
  /** What a computed model recomputes its physics in. */
  readonly surroundings: Surroundings
  /** Hz that the loss is asked at. A computed model answers for all frequencies and does not read it. */
  readonly hz: number
  /** Ω, differential; null where the budget does not say it. */
  readonly reference: number | null
  /** Bd; null where the link does not say it. */
  readonly symbolRate: number | null
  /** Continues 'this is …' where a frequency is a well-known mistake for the Nyquist frequency, else null. */
  readonly mistake: (hz: number) => string | null
}

/** The loss of one line at one frequency, before skew, corner and tolerance. */
export type ModelLoss = {
  readonly db: number
  readonly by: NonNullable<LossAt['by']>
  /** dB to each side that moving in frequency added; adds to the tolerance. */
  readonly spreadDb: number
}

/**
 * Finds the loss at the frequency, or a piece computed from its physics that is asked at any; or writes down in the findings
 * why there is neither and answers null.
 */
export type Model = (input: ModelInput) => ModelLoss | Computed | null
