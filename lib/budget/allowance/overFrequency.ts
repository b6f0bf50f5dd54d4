import { formatScaled } from '../../channel/units'
import { channelOf } from '../cascade/channel'
import type { Context } from '../context'
import type { ChannelEvaluation } from '../evaluation'
import { LOSS, typedValue } from '../quantities'
import type { Allowance } from '../schema'
import type { JudgedConditions } from './conditions'
import type { LaneSum } from './laneSums'
import type { Limit } from './limit'
import { plainDb } from './words'

/** What is judged beside the loss at one frequency: a limit curve and a return-loss floor. */
export type OverFrequency = {
  /** Of the lane that decides; null: not asked for, or nothing to join. */
  readonly channel: ChannelEvaluation | null
  /** What is missed, as half sentences. */
  readonly missed: readonly string[]
  /** What is asked for and cannot be judged: 'limit curve', 'return loss'. */
  readonly unknown: readonly string[]
}

/** Decibels that are equal on paper may differ by some 1e-14. */
const EXACT = 1e-9

/**
 * Joins the two-ports of the deciding lane, and judges curve and floor in it and in the lane with the least loss: a long lane
 * misses a loss curve first, a short one a return-loss floor.
 */
export function overFrequency(
  context: Context,
  allowance: Allowance,
  limit: Limit,
  conditions: JudgedConditions,
  lane: LaneSum,
  shortest: LaneSum,
): OverFrequency {
  const asksCurve = (allowance.curve?.trim() ?? '') !== ''
  const asksFloor = allowance.returnLossFloor !== null
  const { atHz, curve } = limit
  if (atHz === null || (!context.asked.sweep && !asksCurve && !asksFloor)) {
    return { channel: null, missed: [], unknown: [] }
  }
  const lanes = lane === shortest || (!asksCurve && !asksFloor) ? [lane] : [lane, shortest]
  const swept = lanes.map(({ number, lines, cornerUnknown }) => ({
    where: lanes.length === 1 ? '' : ` in lane ${number}`,
    // Where the corner cannot be judged the lines are those of the reference corner.
    channel: channelOf(context, { lines, corner: cornerUnknown === null ? conditions.corner : null, atHz, curve }),
  }))
  const missed = new Set<string>()
  const unknown = new Set<string>()
  for (const { channel, where } of swept) {
    if (asksCurve) {
      const words = channel?.curve?.missed && curveWords(channel.curve.missed, where)
      if (words) missed.add(words)
      else if (!channel?.curve?.whole) unknown.add('limit curve')
    }
    if (!asksFloor) continue
    const floor = typedValue(LOSS, allowance.returnLossFloor)
    const { worstDb = null, worstAtHz = 0, whole = false } = channel?.returnLoss ?? {}
    if (floor !== null && worstDb !== null && worstDb < floor - EXACT)
      missed.add(floorWords(worstDb, worstAtHz, floor, where))
    else if (floor === null || !whole) unknown.add('return loss')
  }
  return { channel: swept[0]?.channel ?? null, missed: [...missed], unknown: [...unknown] }
}

type Miss = NonNullable<NonNullable<ChannelEvaluation['curve']>['missed']>

function curveWords({ worstDb, worstAtHz, fromHz, toHz }: Miss, where: string): string {
  const [from, to, at] = [fromHz, toHz, worstAtHz].map((hz) => formatScaled(hz, 'frequency'))
  return `limit curve missed by ${plainDb(worstDb)} dB at ${at} (${from} to ${to})${where}`
}

function floorWords(worstDb: number, worstAtHz: number, floor: number, where: string): string {
  return `return loss ${plainDb(worstDb)} dB at ${formatScaled(worstAtHz, 'frequency')} where ${plainDb(floor)} dB are asked for${where}`
}
