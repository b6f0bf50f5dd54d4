export type Percentile = {
  /** In the unit of the samples. */
  readonly value: number
  /** One standard deviation of it, because only so many were drawn. */
  readonly error: number
}

/**
 * The order statistic that a share p of the samples does not exceed (rank ⌈pN⌉; Hyndman & Fan 1996, type 1), with its
 * standard error √(p(1 − p)/N)/density (JCGM 101:2008, from memory). The density is what the samples around show: as many
 * ranks to each side as one standard deviation of the rank, √(Np(1 − p)).
 * @param sorted rising, at least one
 * @param p between 0 and 1
 */
export function percentileOf(sorted: Float64Array, p: number): Percentile {
  const n = sorted.length
  // pN may come out a hair above the whole number that it is.
  const rank = Math.min(n, Math.max(1, Math.ceil(p * n - 1e-9)))
  const reach = Math.max(1, Math.round(Math.sqrt(n * p * (1 - p))))
  const low = Math.max(1, rank - reach)
  const high = Math.min(n, rank + reach)
  const at = (place: number) => sorted[place - 1] as number
  // A density of (high − low)/N over this stretch; at an end of the samples only one side shows it.
  const error = high > low ? ((at(high) - at(low)) * reach) / (high - low) : 0
  return { value: at(rank), error }
}
