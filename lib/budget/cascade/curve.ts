import { type CurveMiss, type LimitCurve, limitAt, worstAgainst } from '../../channel/limits'
import type { CurveEvaluation } from '../evaluation'
import { reaches } from './grid'
import { valueAt } from './overGrid'

/**
 * Holds the cascade's loss against a limit curve. What is joined may miss it even while lines lack data; where nothing passes, or
 * no steady state is, there is no number to hold against it, and the rest cannot say that it is kept.
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
  const known = (_: number, k: number) => Number.isFinite(lossDb[k])
  const at = hz.filter(known)
  const missed = worse(
    worstAgainst(
      curve,
      at,
      lossDb.filter(known).map((db) => db + held),
    ),
    atEnds(curve, hz, lossDb, held),
  )
  return {
    whole: complete && at.length === hz.length && reaches(hz, curve.from, curve.to),
    missed: missed && {
      fromHz: missed.missedFromHz,
      toHz: missed.missedToHz,
      worstDb: missed.worstDb,
      worstAtHz: missed.worstAtHz,
    },
  }
}

/** Between two samples a piece of the curve may begin and end. */
function atEnds(curve: LimitCurve, hz: Float64Array, lossDb: Float64Array, held: number): CurveMiss | null {
  const ends = curve.pieces.flatMap(({ fromHz, toHz }) => [fromHz, toHz])
  const known = ends.flatMap((end) => {
    const db = valueAt(hz, lossDb, end)
    return db === null ? [] : [{ end, db: db + held }]
  })
  return worstAgainst(
    curve,
    known.map(({ end }) => end),
    known.map(({ db }) => db),
  )
}

function worse(a: CurveMiss | null, b: CurveMiss | null): CurveMiss | null {
  if (a === null || b === null) return a ?? b
  return {
    ...(b.worstDb > a.worstDb ? b : a),
    missedFromHz: Math.min(a.missedFromHz, b.missedFromHz),
    missedToHz: Math.max(a.missedToHz, b.missedToHz),
  }
}

/** The limit at each frequency; null outside the curve. */
export function limitsOver(curve: LimitCurve, hz: Float64Array): (number | null)[] {
  return Array.from(hz, (at) => limitAt(curve, at))
}
