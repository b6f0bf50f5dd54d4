import type { Context } from '../context'
import type { Conditions } from '../corner'
import { distinctLanes, inLane } from '../lanes'
import type { LineItem } from '../lineItem'
import { type LineLoss, noLoss } from '../lineLoss'
import type { Allowance } from '../schema'
import type { JudgedConditions } from './conditions'
import { overlapIn } from './overlap'
import type { Span } from './span'
import { type Counted, type Sum, sumOf } from './sum'

/** What lies between the planes in one lane. */
export type LaneSum = {
  readonly number: number
  readonly lines: readonly Counted[]
  readonly sum: Sum
  /** Why the corner cannot be judged in this lane, as half a sentence; the sum is then that of the reference corner. */
  readonly cornerUnknown: string | null
}

/** The sum of every lane that is to be looked at: the named one, or each that differs and one that stands for the others. */
export function laneSums(
  context: Context,
  allowance: Allowance,
  span: Span,
  conditions: JudgedConditions,
  atHz: number | null,
): LaneSum[] {
  const named = conditions.problem === null ? allowance.judgedLane : null
  const numbers = named === null ? distinctLanes(context.lanes, span.items) : [named]
  const inCorner = laneCounter(context, span, conditions.corner, atHz)
  const inReference = laneCounter(context, span, null, atHz)
  return numbers.map((number) => {
    const lines = inCorner(number)
    const cornerUnknown = lines.find(({ loss }) => loss.cornerUnknown !== null)?.loss.cornerUnknown ?? null
    const shown = cornerUnknown === null ? lines : inReference(number)
    return { number, lines: shown, sum: sumOf(shown), cornerUnknown }
  })
}

/** What each line counts in a lane. Lines without values of their own in a lane are looked up once for all lanes. */
function laneCounter(context: Context, span: Span, corner: Conditions | null, atHz: number | null) {
  const between = new Set(span.items.map(({ id }) => id))
  const count = (own: LineItem, item: LineItem): Counted => {
    const sign = signOf(context, own, between)
    if (sign === 'unnamed') return { item, sign: -1, loss: NO_NUMBER }
    return { item, sign, loss: atHz === null ? NO_NUMBER : context.losses.at(item, atHz, corner) }
  }
  const alike: Counted[] = []
  return (lane: number): Counted[] =>
    span.items.map((own, index) => {
      const item = inLane(context.lanes, own, lane)
      if (item !== own) return count(own, item)
      alike[index] ??= count(own, own)
      return alike[index]
    })
}

const NO_NUMBER: LineLoss = noLoss([])

function signOf(context: Context, item: LineItem, between: ReadonlySet<string>): Counted['sign'] | 'unnamed' {
  if (item.line.kind !== 'overlap') return 1
  const how = overlapIn(context, item, between)
  return how === 'subtracts' ? -1 : how === 'outside' ? 0 : 'unnamed'
}
