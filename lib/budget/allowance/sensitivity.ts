import type { Context } from '../context'
import { type Sensitivity, sensitivities } from '../sensitivity'
import type { LaneSum } from './laneSums'

/** Decibels per tolerance of each input between the planes, in the deciding lane, the largest first; null where not asked for. */
export function sensitivityOf(context: Context, lane: LaneSum, atHz: number | null): Sensitivity[] | null {
  const { reference } = context.losses
  if (!context.asked.sweep || atHz === null || reference === null) return null
  const lines = lane.lines.flatMap(({ item, sign, loss }) => {
    if (sign === 0 || loss.nominal === null) return []
    const { minusDb, plusDb, varied } = loss.random
    const computed = loss.computed && varied.length > 0 ? { model: loss.computed, varied } : null
    return [{ id: item.id, sign, tolerance: { minusDb, plusDb }, computed }]
  })
  return sensitivities(lines, atHz, reference)
}
