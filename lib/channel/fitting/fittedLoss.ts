import type { Refusal } from '../networks/refusal'
import { leastSquares } from './leastSquares'

/** weighted: four terms, rows weighted by 10^(−IL/20). four-term: the same unweighted. three-term: without the constant. */
export type FitForm = 'weighted' | 'four-term' | 'three-term'

export type FitOptions = {
  readonly form: FitForm
  /** Hz, both inclusive; the whole data where left out. */
  readonly from?: number
  readonly to?: number
}

export type FittedLoss = {
  /** dB with f in GHz: a0 + a1·√f + a2·f + a4·f². */
  readonly coefficients: readonly [a0: number, a1: number, a2: number, a4: number]
  /** dB at Hz; null outside the band that was fitted. */
  readonly at: (hz: number) => number | null
  /** Hz: the points that were fitted. */
  readonly hz: Float64Array
  /** dB at each of them: loss − fit. */
  readonly deviation: Float64Array
  readonly rmsDb: number
  /** The largest size of the deviation, and from its lowest to its highest value. */
  readonly maxDb: number
  readonly rippleDb: number
}

const GHZ = 1e9
/** Np of one decibel. */
const NEPER = Math.LN10 / 20
/** As many points for each term, so that the deviation says something. */
const POINTS_A_TERM = 2

/**
 * The smooth part of an insertion loss, by least squares (IEEE 802.3 Annex 93A from memory: four terms, weighted; the
 * unweighted forms are those of earlier clauses, 802.3ba). The weight is that of the measured row, ripple included.
 * @param hz rising
 * @param lossDb dB, positive, one for each frequency
 * @returns a sentence where there is nothing to fit: too few points, a loss that is not finite, a band too narrow
 */
export function fittedLoss(
  hz: Float64Array,
  lossDb: Float64Array,
  { form, from = 0, to = Number.POSITIVE_INFINITY }: FitOptions,
): FittedLoss | Refusal {
  let first = 0
  while (first < hz.length && (hz[first] as number) < from) first++
  let end = hz.length
  while (end > first && (hz[end - 1] as number) > to) end--
  const band = hz.subarray(first, end)
  const loss = lossDb.subarray(first, end)
  const terms = form === 'three-term' ? 3 : 4
  if (band.length < POINTS_A_TERM * terms)
    return {
      reason: `A fit of ${terms} terms needs at least ${POINTS_A_TERM * terms} points; the band has ${band.length}.`,
    }
  for (let i = 0; i < band.length; i++)
    if (!Number.isFinite(loss[i]))
      return {
        reason: `The loss at ${((band[i] as number) / GHZ).toPrecision(6)} GHz is not a finite number of decibels.`,
      }
  const solved = solve(band, loss, terms, form === 'weighted')
  if (!solved) return { reason: 'The band is too narrow to tell the terms of the fit apart.' }
  const [a0, a1, a2, a4] = terms === 4 ? solved : [0, ...solved]
  return described(band, loss, [a0 as number, a1 as number, a2 as number, a4 as number])
}

function solve(band: Float64Array, loss: Float64Array, terms: number, weighted: boolean): Float64Array | null {
  const count = band.length
  const columns = new Float64Array(terms * count)
  const right = new Float64Array(count)
  const skip = 4 - terms
  for (let i = 0; i < count; i++) {
    const f = (band[i] as number) / GHZ
    const weight = weighted ? Math.exp(-NEPER * (loss[i] as number)) : 1
    if (skip === 0) columns[i] = weight
    columns[(1 - skip) * count + i] = weight * Math.sqrt(f)
    columns[(2 - skip) * count + i] = weight * f
    columns[(3 - skip) * count + i] = weight * f * f
    right[i] = weight * (loss[i] as number)
  }
  return leastSquares(columns, right)
}

function described(hz: Float64Array, loss: Float64Array, coefficients: FittedLoss['coefficients']): FittedLoss {
  const [a0, a1, a2, a4] = coefficients
  const smooth = (f: number) => a0 + a1 * Math.sqrt(f) + (a2 + a4 * f) * f
  const deviation = new Float64Array(hz.length)
  let squares = 0
  let low = Number.POSITIVE_INFINITY
  let high = Number.NEGATIVE_INFINITY
  for (let i = 0; i < hz.length; i++) {
    const differs = (loss[i] as number) - smooth((hz[i] as number) / GHZ)
    deviation[i] = differs
    squares += differs * differs
    if (differs < low) low = differs
    if (differs > high) high = differs
  }
  const lowest = hz[0] as number
  const highest = hz[hz.length - 1] as number
  return {
    coefficients,
    at: (at) => (at >= lowest && at <= highest ? smooth(at / GHZ) : null),
    hz,
    deviation,
    rmsDb: Math.sqrt(squares / hz.length),
    maxDb: Math.max(-low, high),
    rippleDb: high - low,
  }
}
