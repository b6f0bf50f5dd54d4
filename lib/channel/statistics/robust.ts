/** 1/Φ⁻¹(¾): makes the median absolute deviation the standard deviation of a normal distribution (Rousseeuw & Croux, 1993). */
const NORMAL = 1.482602218505602

/** @returns the middle one, or the mean of the two in the middle; NaN of none */
export function median(values: ArrayLike<number>): number {
  const sorted = Float64Array.from(values).sort()
  const half = sorted.length >> 1
  const upper = sorted[half] ?? Number.NaN
  return sorted.length % 2 === 1 ? upper : ((sorted[half - 1] ?? Number.NaN) + upper) / 2
}

/** Standard deviation by the median absolute deviation about a centre: up to half of the values may be wild. */
export function robustSigma(values: ArrayLike<number>, centre: number): number {
  return NORMAL * median(Float64Array.from(values, (value) => Math.abs(value - centre)))
}
