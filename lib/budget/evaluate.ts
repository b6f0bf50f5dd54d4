import { judge } from './allowance/judge'
import { worstVerdict } from './allowance/verdict'
import { type Asked, type Context, rowsOf } from './context'
import { ENGINE } from './engine'
import type { Evaluation, EvidenceData } from './evaluation'
import { flagsOf } from './flagsOf'
import { lanesOf } from './lanes'
import { lineEvaluations } from './lineEvaluation'
import { lineItems } from './lineItem'
import { Losses } from './losses'
import { inOrder } from './record'
import type { Budget } from './schema'
import { signallingOf } from './signalling'

/** Everything that an evaluation can say: what is sealed, exported and shown in full. */
export const WHOLE: Asked = { sweep: true, builds: 100_000 }
/** Losses at the allowances' frequencies, verdicts and flags: what follows every edit at once. */
export const AT_NYQUIST: Asked = { sweep: false, builds: 0 }

/**
 * The one place where decibels are added. Screens, trail, documents, command line and API show what it returns.
 * Pure: the same budget gives the same evaluation. Results per line are remembered by content, so that evaluating again after
 * one change costs little.
 * @param evidence the networks in the evidence files, by SHA-256, read beforehand
 * @param asked how much beside the verdicts is wanted; verdicts and flags are the same whatever is asked, but that a cascade
 *   which was not asked for is not held against the sum
 */
export function evaluate(budget: Budget, evidence: EvidenceData, asked: Asked = AT_NYQUIST): Evaluation {
  const items = lineItems(budget, evidence)
  const signalling = signallingOf(budget.head)
  const context: Context = {
    budget,
    signalling,
    items,
    rows: rowsOf(budget, items),
    lanes: lanesOf(budget, items),
    losses: new Losses(budget, evidence, signalling),
    asked,
  }
  const judged = inOrder(budget, 'allowances').map(([id, allowance]) => judge(context, id, allowance))
  const allowances = judged.map(({ evaluation }) => evaluation)
  const lines = lineEvaluations(context)
  return {
    engine: ENGINE,
    signalling: context.signalling.evaluation,
    rows: context.rows,
    lines: Object.fromEntries(lines.evaluations),
    allowances,
    verdict: worstVerdict(allowances.map(({ verdict }) => verdict)),
    flags: flagsOf({ context, judged, lines: lines.evaluations, evidence }, lines.drafts),
  }
}
