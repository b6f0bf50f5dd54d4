import type { Context } from '../context'
import { distinctLanes, inLane } from '../lanes'
import type { LineItem } from '../lineItem'
import type { LineLoss } from '../lineLoss'
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
  /** Why the corner cannot be judged in this lane, as half a sentence. */
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
  const between = new Set(span.items.map(({ id }) => id))
  const named = conditions.problem === null ? allowance.judgedLane : null
  const numbers = named === null ? distinctLanes(context.lanes, span.items) : [named]
  const signs = span.items.map((item) => signOf(context, item, between))
  return numbers.map((number) => {
    const lines = span.items.map((own, index) => {
      const item = inLane(context.lanes, own, number)
      const sign = signs[index] ?? 'unnamed'
      const given = atHz !== null && sign !== 'unnamed'
      const loss = given ? context.losses.at(item, atHz, conditions.corner) : NO_NUMBER
      return { item, sign: sign === 'unnamed' ? (-1 as const) : sign, loss }
    })
    return laneSum(number, lines)
  })
}

const NO_NUMBER: LineLoss = {
  nominal: null,
  by: null,
  spread: { lowExtreme: 0, highExtreme: 0, lowThreeSigma: 0, highThreeSigma: 0 },
  cornerUnknown: null,
  drafts: [],
}

function signOf(context: Context, item: LineItem, between: ReadonlySet<string>): Counted['sign'] | 'unnamed' {
  if (item.line.kind !== 'overlap') return 1
  const how = overlapIn(context, item, between)
  return how === 'subtracts' ? -1 : how === 'outside' ? 0 : 'unnamed'
}

function laneSum(number: number, lines: readonly Counted[]): LaneSum {
  const blocking = lines.find(({ sign, loss }) => sign !== 0 && loss.cornerUnknown !== null)
  return { number, lines, sum: sumOf(lines), cornerUnknown: blocking?.loss.cornerUnknown ?? null }
}
