import { type BuildLine, type Builds, drawBuilds, responseOf, type Variation } from '../builds'
import type { Context } from '../context'
import { groupOf, type LineItem } from '../lineItem'
import type { LineLoss } from '../lineLoss'
import type { JudgedConditions } from './conditions'
import type { LaneSum } from './laneSums'
import type { Limit } from './limit'

/** The seed of a link that names none: the same builds every time. */
const SEED = 1

/**
 * Random builds of the link between an allowance's planes, in its judged corner, all lanes of each.
 * @param lane any lane of the span, for which lines count and with which sign
 * @returns null where none were asked for, and where a line has no number in some lane, or none in the corner
 */
export function buildsOf(
  context: Context,
  limit: Limit,
  conditions: JudgedConditions,
  lane: LaneSum,
  comparable: boolean,
): Builds | null {
  const { asked, lanes, budget } = context
  const { atHz } = limit
  if (asked.builds === 0 || atHz === null || lane.cornerUnknown !== null || conditions.problem !== null) return null
  const variationIn = (one: LineItem) =>
    variationOf(context.losses.at(one, atHz, conditions.corner), atHz, context.losses.reference)
  const lines: BuildLine[] = []
  for (const { item, sign } of lane.lines) {
    if (sign === 0) continue
    const own = context.items.find(({ id }) => id === item.id) ?? item
    const line = buildLine(own, sign, variationIn, lanes.differing.get(item.id))
    if (line === null) return null
    lines.push(line)
  }
  if (lines.length === 0) return null
  return drawBuilds({
    lines,
    lanes: lanes.count,
    limitDb: comparable ? limit.db : null,
    trials: asked.builds,
    seed: budget.head.seed ?? SEED,
  })
}

function buildLine(
  own: LineItem,
  sign: 1 | -1,
  variationIn: (item: LineItem) => Variation | null,
  differing: ReadonlyMap<number, LineItem> | undefined,
): BuildLine | null {
  const variation = variationIn(own)
  const lanes = new Map<number, Variation>()
  for (const [lane, item] of differing ?? []) {
    const inLane = variationIn(item)
    if (inLane === null) return null
    lanes.set(lane, inLane)
  }
  // A line may have its number in its lanes only; the lanes then stand for it.
  const common = variation ?? lanes.values().next().value ?? null
  return common && { ...common, id: own.id, group: groupOf(own), sign, lanes }
}

function variationOf(
  { nominal, random, computed, cornerUnknown }: LineLoss,
  hz: number,
  reference: number | null,
): Variation | null {
  if (nominal === null || cornerUnknown !== null) return null
  const { minusDb, plusDb, meaning, spreadDb, varied, times } = random
  const plain = { nominalDb: nominal, minusDb, plusDb, meaning, spreadDb, response: null }
  if (varied.length === 0 || computed === null || reference === null) return plain
  const of = responseOf(computed, varied, hz, reference)
  return of && { ...plain, response: { of, times } }
}
