/** Numerator and denominator of Hart's rational function 5666, highest power first. */
const ABOVE = [
  3.52624965998911e-2, 0.700383064443688, 6.37396220353165, 33.912866078383, 112.079291497871, 221.213596169931,
  220.206867912376,
]
const BELOW = [
  8.83883476483184e-2, 1.75566716318264, 16.064177579207, 86.7807322029461, 296.564248779674, 637.333633378831,
  793.826512519948, 440.413735824752,
]

/**
 * Cumulative normal distribution of mean 0 and standard deviation 1, within 2e-15 (Hart et al., Computer Approximations,
 * 1968, algorithm 5666, and a continued fraction beyond 7.07, as put together by West 2005; coefficients from memory,
 * checked against a general-purpose library).
 */
export function normalCdf(x: number): number {
  const z = Math.abs(x)
  const density = Math.exp(-0.5 * z * z)
  const far = z < 7.07106781186547 ? (density * horner(ABOVE, z)) / horner(BELOW, z) : density * beyond(z)
  return x > 0 ? 1 - far : far
}

function horner(coefficients: readonly number[], z: number): number {
  let sum = 0
  for (let n = 0; n < coefficients.length; n++) sum = sum * z + (coefficients[n] as number)
  return sum
}

function beyond(z: number): number {
  let fraction = z + 0.65
  for (let n = 4; n >= 1; n--) fraction = z + n / fraction
  return 1 / (fraction * Math.sqrt(2 * Math.PI))
}

/** Φ at equal steps from −REACH to REACH; between them a straight line is within 3e-7. */
const REACH = 8
const STEPS_PER_UNIT = 512
const TABLE = Float64Array.from({ length: 2 * REACH * STEPS_PER_UNIT + 2 }, (_, n) =>
  normalCdf(n / STEPS_PER_UNIT - REACH),
)

/**
 * Deviates of mean 0 and standard deviation 1 that lie anywhere from −√3 to √3 (rectangular), made of normal ones so that both
 * rise together: √3(2Φ(z) − 1), to 1e-6.
 */
export function fillRectangular(normal: Float64Array, out: Float64Array): void {
  const scale = 2 * Math.sqrt(3)
  for (let n = 0; n < out.length; n++) {
    const z = normal[n] as number
    const at = (Math.min(REACH, Math.max(-REACH, z)) + REACH) * STEPS_PER_UNIT
    const step = at | 0
    const low = TABLE[step] as number
    out[n] = scale * (low + ((TABLE[step + 1] as number) - low) * (at - step) - 0.5)
  }
}
