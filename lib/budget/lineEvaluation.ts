import type { Context } from './context'
import type { LineEvaluation, LossAt } from './evaluation'
import type { LineDraft } from './flagsOf'
import { basisOf, gradeOf, groupOf, type LineItem, ownerOf } from './lineItem'
import type { LineLoss } from './lineLoss'
import { LENGTH, typedValue } from './quantities'

/** Every line at the Nyquist frequency in the reference corner, in the lane where it is worst. */
export function lineEvaluations(context: Context): {
  readonly evaluations: ReadonlyMap<string, LineEvaluation>
  readonly drafts: LineDraft[]
} {
  const drafts: LineDraft[] = []
  const evaluations = context.items.map((own): [string, LineEvaluation] => {
    const { item, lane, loss } = worstLane(context, own, drafts)
    return [
      own.id,
      {
        id: own.id,
        loss: lossAt(context.signalling.evaluation.nyquist, loss),
        lane,
        owner: ownerOf(item),
        basis: basisOf(item),
        grade: gradeOf(item),
        lengthM: typedValue(LENGTH, item.line.length),
        group: groupOf(item),
      },
    ]
  })
  return { evaluations: new Map(evaluations), drafts }
}

type InLane = { readonly item: LineItem; readonly lane: number | null; readonly loss: LineLoss | null }

/** A lane without a number is worse than any with one. */
function worstLane(context: Context, own: LineItem, drafts: LineDraft[]): InLane {
  const hz = context.signalling.evaluation.nyquist
  if (hz === null) return { item: own, lane: null, loss: null }
  const differing = context.lanes.differing.get(own.id)
  const candidates: InLane[] = []
  if ((differing?.size ?? 0) < context.lanes.count) {
    candidates.push({ item: own, lane: null, loss: context.losses.at(own, hz, null) })
  }
  for (const [lane, item] of differing ?? []) candidates.push({ item, lane, loss: context.losses.at(item, hz, null) })
  for (const { lane, loss } of candidates) drafts.push(...(loss?.drafts ?? []).map((draft) => ({ draft, lane })))
  return candidates.reduce((worst, next) => (height(next) > height(worst) ? next : worst))
}

function height({ loss }: InLane): number {
  return loss?.nominal ?? Number.POSITIVE_INFINITY
}

function lossAt(atHz: number | null, loss: LineLoss | null): LossAt {
  if (loss === null || loss.nominal === null)
    return { atHz, nominalDb: null, lowDb: null, highDb: null, by: null, beside: [] }
  const { lowExtreme, highExtreme } = loss.spread
  return {
    atHz,
    nominalDb: loss.nominal,
    lowDb: loss.nominal - lowExtreme,
    highDb: loss.nominal + highExtreme,
    by: loss.by,
    beside: loss.beside,
  }
}
