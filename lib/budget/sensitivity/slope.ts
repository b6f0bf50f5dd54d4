import { reachOf, type Surface, type Varied } from '../builds/varied'

/** Step as a share of the tolerance: the range that matters, and far above the rounding of the model. */
const STEP = 1 / 16
/** Least step as a share of the value, for tolerances that are very small. */
const LEAST = 1e-5

/**
 * Slope of a surface along one parameter at nominal, in dB per tolerance: the central difference of fourth order, or the
 * one-sided difference of second order where the parameter is at an end of what it can be. NaN where the model gives no number.
 */
export function slopeAt(surface: Surface, varied: readonly Varied[], k: number): number {
  const parameter = varied[k]
  if (!parameter) return Number.NaN
  const step = Math.max(STEP, (LEAST * Math.abs(parameter.nominal)) / parameter.tolerance)
  const shares = new Float64Array(varied.length)
  const at = (steps: number) => {
    shares[k] = steps * step
    return surface(shares)
  }
  const { down, up } = reachOf(parameter, 2 * step)
  if (down >= 2 * step && up >= 2 * step) return (8 * (at(1) - at(-1)) - (at(2) - at(-2))) / (12 * step)
  const side = up >= down ? 1 : -1
  return (side * (-3 * at(0) + 4 * at(side) - at(2 * side))) / (2 * step)
}
