/** Powers of ten from 10^−60 to 10^60 as pairs of doubles, power + rest, which hold them to 2^-105; 10^0 … 10^22 are exact. */
export const LARGEST_POWER = 60

const exponents = Array.from({ length: 2 * LARGEST_POWER + 1 }, (_, index) => index - LARGEST_POWER)

/** The double nearest to 10^(index − {@link LARGEST_POWER}). */
export const POWER = Float64Array.from(exponents, (exponent) => Number(`1e${exponent}`))
/** What that double lacks. */
export const REST = Float64Array.from(exponents, (exponent) => restOf(exponent))

function restOf(exponent: number): number {
  const nearest = Number(`1e${exponent}`)
  if (exponent >= 0) return Number(10n ** BigInt(exponent) - BigInt(nearest))
  const power = 10n ** BigInt(-exponent)
  const binary = 52 - Math.floor(Math.log2(nearest))
  const lacking = (1n << BigInt(binary)) - BigInt(nearest * 2 ** binary) * power
  return Number(lacking) / Number(power) / 2 ** binary
}
