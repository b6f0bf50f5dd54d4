import type { Asked } from '../../budget/context'
import type { Evaluation } from '../../budget/evaluation'
import type { Budget } from '../../budget/schema'
import type { Margins } from '../../sync/evaluator'

/** What the worker is asked. */
export type Question = {
  readonly id: number
  readonly budget: Budget
  /** Null: for the margins alone. */
  readonly asked: Asked | null
  /** False: without the evidence files of this server, for a budget that is stored nowhere. */
  readonly files: boolean
}

export type Answer =
  | { readonly id: number; readonly evaluation: Evaluation }
  | { readonly id: number; readonly margins: Margins }
  | { readonly id: number; readonly failed: string }
