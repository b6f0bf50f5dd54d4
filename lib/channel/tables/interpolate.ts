import { holdsAt } from '../lines'
import type { Point } from './parsePoints'

export type Interpolated = {
  readonly value: number
  /** How far a power law through the same two points lies away; 0 on a point. */
  readonly differs: number
}

/**
 * Straight line in frequency between the two neighbouring points; never beyond the first and the last, where only
 * the ±2 % that every stated number holds within is allowed.
 * @param points by rising frequency
 * @returns null outside the points
 */
export function interpolate(points: readonly Point[], hz: number): Interpolated | null {
  const first = points[0]
  const last = points[points.length - 1]
  if (!first || !last) return null
  if (hz <= first.hz) return hz === first.hz || holdsAt(first.hz, hz) ? { value: first.value, differs: 0 } : null
  if (hz >= last.hz) return hz === last.hz || holdsAt(last.hz, hz) ? { value: last.value, differs: 0 } : null
  const above = points.findIndex((point) => point.hz >= hz)
  const low = points[above - 1] ?? first
  const high = points[above] ?? last
  if (high.hz === hz) return { value: high.value, differs: 0 }
  const value = low.value + ((high.value - low.value) * (hz - low.hz)) / (high.hz - low.hz)
  return { value, differs: Math.abs(powerLaw(low, high, hz) - value) }
}

/**
 * The same straight lines at many frequencies; at the ends the first and the last value.
 * @param points by rising frequency, at least one
 * @param hz Hz, rising, between the first and the last point
 */
export function interpolateOver(points: readonly Point[], hz: Float64Array): Float64Array {
  const values = new Float64Array(hz.length).fill(Number.NaN)
  let above = 0
  for (let i = 0; i < hz.length; i++) {
    const f = hz[i] as number
    while (above < points.length - 1 && (points[above] as Point).hz < f) above++
    const high = points[above] as Point
    const low = points[above - 1]
    const flat = low === undefined || f >= high.hz
    values[i] = flat ? high.value : low.value + ((high.value - low.value) * (f - low.hz)) / (high.hz - low.hz)
  }
  return values
}

/** value ∝ f^n through both points: exact for pure √f and pure f, so it shows what a straight line between far points may miss. */
function powerLaw(low: Point, high: Point, hz: number): number {
  if (low.value <= 0 || high.value <= 0)
    return low.value + ((high.value - low.value) * (hz - low.hz)) / (high.hz - low.hz)
  const exponent = Math.log(high.value / low.value) / Math.log(high.hz / low.hz)
  return low.value * (hz / low.hz) ** exponent
}
