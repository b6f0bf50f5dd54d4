import type { ChannelEvaluation } from '../evaluation'

/** Straight line between the two neighbouring samples; null outside the grid. */
export function valueAt(hz: Float64Array, values: Float64Array, at: number): number | null {
  const above = hz.findIndex((one) => one >= at)
  if (above === -1) return null
  const high = values[above] as number
  if (hz[above] === at) return high
  if (above === 0) return null
  const low = values[above - 1] as number
  const [from, to] = [hz[above - 1] as number, hz[above] as number]
  return low + ((high - low) * (at - from)) / (to - from)
}

/** Return loss at Nyquist, and the least at or below it. */
export function worstReturn(
  hz: Float64Array,
  returnDb: Float64Array,
  nyquist: number,
): NonNullable<ChannelEvaluation['returnLoss']> {
  let worst = 0
  for (let k = 1; k < hz.length && (hz[k] as number) <= nyquist; k++) {
    if ((returnDb[k] as number) < (returnDb[worst] as number)) worst = k
  }
  return {
    atNyquistDb: valueAt(hz, returnDb, nyquist),
    worstDb: returnDb[worst] as number,
    worstAtHz: hz[worst] as number,
  }
}
