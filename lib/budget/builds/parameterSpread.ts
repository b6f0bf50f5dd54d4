import type { Computed } from '../models/piece'
import type { Spread } from '../tolerance'
import { reachOf, type Surface, surfaceOf, type Varied } from './varied'

/** Times that every parameter is tried at its other places, as what is worse for one may hang on the others. */
const ROUNDS = 4

/**
 * How far the varied parameters move a computed line's loss, in dB to each side. Extremes: every parameter at its worse end, by
 * the model itself, the one that moves the loss most first and again until none makes it worse. Three sigma: the root of the
 * sum of squares of what each parameter does alone at the limits of its tolerance, which are three standard deviations.
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
  const places = varied.map(placesOf)
  const alone = places.map((ofOne, k) => {
    const shares = new Float64Array(varied.length)
    return ofOne.map((place) => {
      shares[k] = place
      return surface(shares) - nominal
    })
  })
  // Math.max and Math.min hand a NaN on.
  const reach = alone.map((moves) => Math.max(...moves) - Math.min(...moves))
  const strongestFirst = [...reach.keys()].sort((a, b) => (reach[b] ?? 0) - (reach[a] ?? 0))
  const spread = {
    lowExtreme: nominal - extreme(surface, places, strongestFirst, -1),
    highExtreme: extreme(surface, places, strongestFirst, 1) - nominal,
    lowThreeSigma: Math.hypot(...alone.map((moves) => Math.min(...moves))),
    highThreeSigma: Math.hypot(...alone.map((moves) => Math.max(...moves))),
  }
  return Object.values(spread).every(Number.isFinite) ? spread : null
}

/** The lower end, nominal, the upper end. */
function placesOf(parameter: Varied): readonly number[] {
  const { down, up } = reachOf(parameter, 1)
  return [-down, 0, up]
}

/** The largest (1) or least (−1) loss within the tolerances; NaN as soon as one place has no number. */
function extreme(
  surface: Surface,
  places: readonly (readonly number[])[],
  order: readonly number[],
  towards: 1 | -1,
): number {
  const shares = new Float64Array(places.length)
  let best = surface(shares)
  for (let round = 0; round < ROUNDS; round++) {
    const before = best
    for (const k of order) {
      let chosen = shares[k] ?? 0
      for (const place of places[k] ?? []) {
        if (place === chosen) continue
        shares[k] = place
        const db = surface(shares)
        if (Number.isNaN(db)) return db
        if ((db - best) * towards > 0) {
          best = db
          chosen = place
        }
      }
      shares[k] = chosen
    }
    if (best === before) break
  }
  return best
}
