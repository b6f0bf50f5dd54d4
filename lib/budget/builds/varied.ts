import type { Computed } from '../models/piece'
import { decibelsOf } from './decibels'

/** A parameter of a computed model that varies from build to build, in SI units. */
export type Varied = {
  /** The line's field. */
  readonly field: string
  readonly nominal: number
  /** A limit to both sides, three standard deviations of a normal distribution; above 0. */
  readonly tolerance: number
  /** What it can be at all: a stub cannot be shorter than nothing. Draws beyond end there. */
  readonly min: number
  readonly max: number
}

/** The decibels of a computed line over its varied parameters, each given as a share of its tolerance away from nominal. */
export type Surface = (shares: ArrayLike<number>) => number

/**
 * The model itself as such a function, at one frequency; NaN where it gives no number.
 * @param reference Ω, differential
 */
export function surfaceOf(computed: Computed, varied: readonly Varied[], hz: number, reference: number): Surface {
  return (shares) => {
    const values: Record<string, number> = { ...computed.values }
    varied.forEach((parameter, k) => {
      values[parameter.field] = valueAt(parameter, shares[k] ?? 0)
    })
    return decibelsOf(computed.build(values), hz, reference)
  }
}

/** The parameter's value so many tolerances away from nominal. */
export function valueAt({ nominal, tolerance, min, max }: Varied, share: number): number {
  return Math.min(max, Math.max(min, nominal + share * tolerance))
}

/** How many tolerances the parameter may go down and up before what it can be ends, at most the given number. */
export function reachOf({ nominal, tolerance, min, max }: Varied, most: number): { down: number; up: number } {
  return {
    down: Math.max(0, Math.min(most, (nominal - min) / tolerance)),
    up: Math.max(0, Math.min(most, (max - nominal) / tolerance)),
  }
}
