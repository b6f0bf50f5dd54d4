import type { Asked } from '../budget/context'
import { AT_NYQUIST, evaluate } from '../budget/evaluate'
import type { Evaluation, EvidenceData } from '../budget/evaluation'
import { type MarginSummary, margins } from '../budget/margins'
import type { Budget } from '../budget/schema'

export type Margins = Readonly<Record<string, MarginSummary>>

/**
 * Evaluates budgets with the evidence files that they name. In the server it stands for a worker's queue, so that neither a
 * large file nor many random builds hold up those who edit.
 */
export type Evaluator = {
  evaluate(budget: Budget, asked: Asked): Promise<Evaluation>
  /** The margins alone, for the trail: the same as an evaluation's, with less to carry. */
  margins(budget: Budget): Promise<Margins>
}

/** Evaluates where it is called, with evidence that has been read. */
export function evaluatorHere(evidence: EvidenceData): Evaluator {
  return {
    evaluate: async (budget, asked) => evaluate(budget, evidence, asked),
    margins: async (budget) => margins(evaluate(budget, evidence, AT_NYQUIST)),
  }
}
