import { type LimitCurve, limitAt, worstAgainst } from '../../channel/limits'
import type { CurveEvaluation } from '../evaluation'

/** Hz below which a curve is not asked for although it begins there: the sweep starts here. */
const LOWEST_ASKED = 0.05e9
/** A band that ends a hair before the curve still reaches it. */
const EDGE = 1e-6

/**
 * Holds the cascade's loss against a limit curve. What is joined may miss it even while lines lack data.
 * @param held dB held back at every frequency
 * @param complete whether every line between the planes is in the loss
 */
export function judgeCurve(
  curve: LimitCurve,
  hz: Float64Array,
  lossDb: Float64Array,
  held: number,
  complete: boolean,
): CurveEvaluation {
  const from = hz[0] ?? Number.POSITIVE_INFINITY
  const to = hz[hz.length - 1] ?? 0
  const reaches = from <= Math.max(curve.from, LOWEST_ASKED) * (1 + EDGE) && to >= curve.to * (1 - EDGE)
  const missed = worstAgainst(curve, hz, held === 0 ? lossDb : lossDb.map((db) => db + held))
  return {
    whole: complete && reaches,
    missed: missed && {
      fromHz: missed.missedFromHz,
      toHz: missed.missedToHz,
      worstDb: missed.worstDb,
      worstAtHz: missed.worstAtHz,
    },
  }
}

/** The limit at each frequency; null outside the curve. */
export function limitsOver(curve: LimitCurve, hz: Float64Array): (number | null)[] {
  return Array.from(hz, (at) => limitAt(curve, at))
}
