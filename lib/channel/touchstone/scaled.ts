import { LARGEST_POWER, POWER, REST } from './powers'

const SPLITTER = 134217729
/** Relative bound, with room to spare, of what the steps below can err by: each errs by a few 2^-104. */
const DOUBT = 2 ** -97

/**
 * (high·10^lowDigits + low)·10^exponent, correctly rounded, or NaN where this arithmetic cannot be sure of it.
 *
 * Pairs of doubles (Dekker, Numer. Math. 18, 1971) carry 106 bits; the answer counts only if everything within the
 * error bound rounds to the same double (Ziv, ACM Trans. Math. Softw. 17, 1991), so a tie or a near tie is NaN.
 * @param high an integer from 1 to 10^9
 * @param low an integer below 10^lowDigits, lowDigits at most 15
 */
export function scaled(high: number, low: number, lowDigits: number, exponent: number): number {
  if (exponent > LARGEST_POWER || exponent < -LARGEST_POWER) return Number.NaN
  const shift = POWER[LARGEST_POWER + lowDigits] as number
  const shifted = high * shift
  const sum = shifted + low
  const sumRest = productRest(high, shift, shifted) + (low - (sum - shifted))
  const power = POWER[LARGEST_POWER + exponent] as number
  const estimate = sum * power
  const correction =
    productRest(sum, power, estimate) + (sum * (REST[LARGEST_POWER + exponent] as number) + sumRest * power)
  const value = estimate + correction
  const rest = correction - (value - estimate)
  const doubt = value * DOUBT
  return value + (rest + doubt) === value && value + (rest - doubt) === value ? value : Number.NaN
}

/** a·b − product, exact: Veltkamp's split and Dekker's product. */
function productRest(a: number, b: number, product: number): number {
  const ta = SPLITTER * a
  const aHigh = ta - (ta - a)
  const aLow = a - aHigh
  const tb = SPLITTER * b
  const bHigh = tb - (tb - b)
  const bLow = b - bHigh
  return aLow * bLow - (product - aHigh * bHigh - aLow * bHigh - aHigh * bLow)
}
