import { NORMAL_95 } from './tolerance'

/** A share that was found by counting, and the interval that holds the true one with 95 % confidence. */
export type Fraction = {
  readonly value: number
  readonly low: number
  readonly high: number
}

/**
 * The share of hits in trials that have nothing to do with each other, with its 95 % interval by the score (Wilson, J. Am.
 * Stat. Assoc. 22, 1927): from 0 to 1, and never without width where all or none hit.
 * @param trials at least 1
 */
export function fractionOf(hits: number, trials: number): Fraction {
  const value = hits / trials
  const squared = NORMAL_95 * NORMAL_95
  const middle = (hits + squared / 2) / (trials + squared)
  const half = (NORMAL_95 / (trials + squared)) * Math.sqrt(trials * value * (1 - value) + squared / 4)
  return { value, low: Math.max(0, middle - half), high: Math.min(1, middle + half) }
}
