import type { Evaluation, EvidenceNetwork } from '../../../../../lib/budget/evaluation'
import type { NeededFile } from '../../../../../lib/budget/evidence/needed'
import type { Budget } from '../../../../../lib/budget/schema'

/** What the worker is asked: the network in a file of a budget, or everything that an evaluation can say. */
export type Question = { readonly id: number; readonly budgetId: string } & (
  | { readonly file: NeededFile }
  | { readonly budget: Budget }
)

export type Answer =
  /** Null: the server has no such file. */
  | { readonly id: number; readonly network: EvidenceNetwork | null }
  | { readonly id: number; readonly evaluation: Evaluation }
  /** Why not, in a sentence for the person. */
  | { readonly id: number; readonly failed: string }
