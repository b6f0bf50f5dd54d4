import type { Judged } from '../allowance/judge'
import type { Context } from '../context'
import type { LineEvaluation } from '../evaluation'
import type { FlagDraft } from '../flags'

/** What a check looks at: the budget in order, its lines at Nyquist, its allowances judged. */
export type Checked = {
  readonly context: Context
  readonly lines: ReadonlyMap<string, LineEvaluation>
  readonly judged: readonly Judged[]
}

/** One rule of the trade that a worksheet can check by itself. */
export type Check = (checked: Checked) => Iterable<FlagDraft>
