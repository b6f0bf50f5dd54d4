import type { ChannelEvaluation } from '../evaluation'
import { reaches } from './grid'

/** Straight line between the two neighbouring samples; null outside the grid, and where they are no numbers. */
export function valueAt(hz: Float64Array, values: Float64Array, at: number): number | null {
  const above = hz.findIndex((one) => one >= at)
  if (above === -1) return null
  const high = values[above] as number
  if (hz[above] === at) return finite(high)
  if (above === 0) return null
  const low = values[above - 1] as number
  const [from, to] = [hz[above - 1] as number, hz[above] as number]
  return finite(low + ((high - low) * (at - from)) / (to - from))
}

/** What JSON can say: Infinity, where nothing passes or comes back, is null; −0 is 0. */
export function finite(db: number): number | null {
  return Number.isFinite(db) ? db + 0 : null
}

/** Return loss at Nyquist, and the least at or below it; null where the grid begins above it, or the chain has no steady state. */
export function worstReturn(
  hz: Float64Array,
  returnDb: Float64Array,
  nyquist: number,
): ChannelEvaluation['returnLoss'] {
  let worst = -1
  for (let k = 0; k < hz.length && (hz[k] as number) <= nyquist; k++) {
    const db = returnDb[k] as number
    if (Number.isNaN(db)) return null
    if (worst < 0 || db < (returnDb[worst] as number)) worst = k
  }
  if (worst < 0) return null
  return {
    whole: reaches(hz, 0, nyquist),
    atNyquistDb: valueAt(hz, returnDb, nyquist),
    worstDb: finite(returnDb[worst] as number),
    worstAtHz: hz[worst] as number,
  }
}
