import type { Evaluation } from './evaluation'
import type { Verdict } from './schema'

/** One allowance in short, as the trail keeps it beside an edit. */
export type MarginSummary = {
  readonly verdict: Verdict
  readonly marginDb: number | null
  /** Known losses in the judged conditions; null where a plane is missing. */
  readonly knownDb: number | null
}

/** By allowance id. */
export function margins(evaluation: Evaluation): Record<string, MarginSummary> {
  return Object.fromEntries(
    evaluation.allowances.map(({ id, verdict, marginDb, knownDb, from }) => [
      id,
      { verdict, marginDb, knownDb: from === null ? null : knownDb },
    ]),
  )
}
