import type { Computed } from '../models/piece'
import type { Spread } from '../tolerance'
import { reachOf, type Surface, surfaceOf, type Varied } from './varied'

/** Times that every parameter is tried at its other places, when what is worse for one hangs on the others. */
const ROUNDS = 4

/**
 * How far the varied parameters move a computed line's loss, in dB to each side. Extremes: every parameter at its worse end,
 * found by the model itself, one after the other until no change makes it worse. Three sigma: the root of the sum of squares of what each parameter does at the
 * limits of its own tolerance, which are three standard deviations.
 * @param reference Ω, differential
 * @returns null where the model gives no number at nominal or at a limit
 */
export function parameterSpread(
  computed: Computed,
  varied: readonly Varied[],
  hz: number,
  reference: number,
): Spread | null {
  const surface = surfaceOf(computed, varied, hz, reference)
  const nominal = surface(new Float64Array(varied.length))
  let [upSquares, downSquares] = [0, 0]
  varied.forEach((parameter, k) => {
    const ends = placesOf(parameter).map((place) => {
      const shares = new Float64Array(varied.length)
      shares[k] = place
      return surface(shares) - nominal
    })
    // Math.max hands a NaN on.
    upSquares += Math.max(...ends) ** 2
    downSquares += Math.min(...ends) ** 2
  })
  const spread = {
    lowExtreme: nominal - extreme(surface, varied, -1),
    highExtreme: extreme(surface, varied, 1) - nominal,
    lowThreeSigma: Math.sqrt(downSquares),
    highThreeSigma: Math.sqrt(upSquares),
  }
  return Object.values(spread).every(Number.isFinite) ? spread : null
}

/** The lower end, nominal, the upper end. */
function placesOf(parameter: Varied): readonly number[] {
  const { down, up } = reachOf(parameter, 1)
  return [-down, 0, up]
}

/** The largest (1) or least (−1) loss within the tolerances; NaN as soon as one place has no number. */
function extreme(surface: Surface, varied: readonly Varied[], towards: 1 | -1): number {
  const shares = new Float64Array(varied.length)
  let best = surface(shares)
  for (let round = 0; round < ROUNDS; round++) {
    const before = best
    varied.forEach((parameter, k) => {
      let chosen = shares[k] as number
      for (const place of placesOf(parameter)) {
        shares[k] = place
        const db = surface(shares)
        if (!((db - best) * towards <= 0)) {
          best = db
          chosen = place
        }
      }
      shares[k] = chosen
    })
    if (best === before) break
  }
  return best
}
