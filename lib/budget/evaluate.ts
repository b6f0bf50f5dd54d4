import { judge } from './allowance/judge'
import { worstVerdict } from './allowance/verdict'
import { type Context, rowsOf } from './context'
import { ENGINE } from './engine'
import type { Evaluation, EvidenceData } from './evaluation'
import { flagsOf } from './flagsOf'
import { lanesOf } from './lanes'
import { lineEvaluations } from './lineEvaluation'
import { lineItems } from './lineItem'
import { Losses } from './losses'
import { RESISTANCE, TEMPERATURE, typedValue } from './quantities'
import { inOrder } from './record'
import type { Budget } from './schema'
import { signallingOf } from './signalling'

/**
 * The one place where decibels are added. Screens, trail, documents, command line and API show what it returns.
 * Pure: the same budget gives the same evaluation. Results per line are remembered by content, so that evaluating again after
 * one change costs little.
 * @param _evidence loss data of the evidence files; no model of this version reads them
 */
export function evaluate(budget: Budget, _evidence: EvidenceData): Evaluation {
  const items = lineItems(budget)
  const signalling = signallingOf(budget.head)
  const context: Context = {
    budget,
    signalling,
    items,
    rows: rowsOf(budget, items),
    lanes: lanesOf(budget, items),
    losses: new Losses(typedValue(RESISTANCE, budget.head.reference), signalling),
    referenceTemperature: typedValue(TEMPERATURE, budget.head.referenceTemperature),
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
    flags: flagsOf({ context, judged, lines: lines.evaluations }, lines.drafts),
  }
}
