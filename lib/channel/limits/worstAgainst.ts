import { limitAt } from './limitAt'
import type { LimitCurve } from './piece'

/** Where a loss lies over a limit curve. */
export type CurveMiss = {
  /** Lowest and highest sample over the limit, in Hz; between them there may be samples that keep it. */
  readonly missedFromHz: number
  readonly missedToHz: number
  /** The largest excess over the limit in dB, and where. */
  readonly worstDb: number
  readonly worstAtHz: number
}

/** Sums of decimal fractions are off by some 1e-14 dB. */
const EXACT = 1e-9

/**
 * Holds a sampled loss against a limit curve. Only the samples within the curve's pieces are judged: whoever asks makes
 * sure that they reach over the band that is to be judged (curve.from to curve.to), else nothing is said about the rest.
 * @param hz frequencies by rising frequency, in Hz
 * @param lossDb positive losses at them, in dB
 * @returns null where no sample lies over the limit
 * @throws RangeError for lists of different length and for a loss that is not a number
 */
export function worstAgainst(curve: LimitCurve, hz: ArrayLike<number>, lossDb: ArrayLike<number>): CurveMiss | null {
  if (hz.length !== lossDb.length) throw new RangeError(`${hz.length} frequencies, ${lossDb.length} losses`)
  let first = Number.NaN
  let last = Number.NaN
  let worst = 0
  let worstAt = Number.NaN
  for (let i = 0; i < hz.length; i++) {
    const at = hz[i] as number
    const loss = lossDb[i] as number
    if (!Number.isFinite(loss)) throw new RangeError(`the loss at ${at} Hz is not a number`)
    const limit = limitAt(curve, at)
    if (limit === null || loss <= limit + EXACT) continue
    if (worst === 0) first = at
    last = at
    if (loss - limit <= worst) continue
    worst = loss - limit
    worstAt = at
  }
  return worst === 0 ? null : { missedFromHz: first, missedToHz: last, worstDb: worst, worstAtHz: worstAt }
}
