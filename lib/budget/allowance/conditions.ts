import type { Context } from '../context'
import { type Conditions, conditionsOf } from '../corner'
import { livingRecord } from '../record'
import type { Allowance, Statistic } from '../schema'

/** What an allowance asks to be judged at. */
export type JudgedConditions = {
  readonly statistic: Statistic
  /** The one lane, or null for the worst. */
  readonly lane: number | null
  /** Null: the reference corner. */
  readonly corner: Conditions | null
  /** Why it cannot be judged there; the sums are then those of the reference corner and the worst lane. */
  readonly problem: string | null
  readonly problemField: 'judgedCorner' | 'judgedLane' | null
}

export function judgedConditions(context: Context, allowance: Allowance): JudgedConditions {
  const statistic = allowance.judgedStatistic ?? 'nominal'
  const { judgedLane, judgedCorner } = allowance
  if (judgedLane !== null && judgedLane > context.lanes.count) {
    const has = context.lanes.count === 1 ? 'one lane' : `${context.lanes.count} lanes`
    const problem = `it is to be judged at lane ${judgedLane}, and the link has ${has}`
    return { statistic, lane: null, corner: null, problem, problemField: 'judgedLane' }
  }
  if (judgedCorner === null) return { statistic, lane: judgedLane, corner: null, problem: null, problemField: null }
  const corner = livingRecord(context.budget, 'corners', judgedCorner)
  const conditions = corner
    ? conditionsOf(judgedCorner, corner, context.losses.referenceTemperature)
    : 'the corner that it is to be judged at does not exist or was taken out'
  if (typeof conditions === 'string') {
    return { statistic, lane: judgedLane, corner: null, problem: conditions, problemField: 'judgedCorner' }
  }
  return { statistic, lane: judgedLane, corner: conditions, problem: null, problemField: null }
}
