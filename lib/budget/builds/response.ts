import { nextUnit, streamOf } from '../../channel/statistics'
import type { Computed } from '../models/piece'
import { type Nodes, type Quadratic, quadraticAt, quadraticThrough } from './quadratic'
import { reachOf, type Surface, surfaceOf, type Varied } from './varied'

/** How a line's loss changes with its varied parameters, at one frequency. */
export type Response = {
  readonly varied: readonly Varied[]
  /** dB more than at nominal; shares of the tolerances, already within what the parameters can be. */
  readonly change: (shares: Float64Array) => number
  /** How many tolerances each parameter may go down and up. */
  readonly down: Float64Array
  readonly up: Float64Array
  /** False: the loss bends too much for a quadratic, and every build asks the model itself, which takes long. */
  readonly quadratic: boolean
}

/** How far the quadratic may be off in a corner of the tolerances: the larger of these, in dB and as a share of the loss. */
const OFF_DB = 0.01
const OFF_SHARE = 0.01
/** Corners of the tolerances, and places anywhere out to 1.2 tolerances, which one build in 3,000 passes. */
const CORNERS = 32
const PLACES = 32
const OUTERMOST = 1.2

/**
 * The response of a computed line: a quadratic through the model (gradient and second derivatives by finite differences over
 * the tolerance), held against the model itself in corners and at places drawn at random, always the same; where it is
 * further off than 0.01 dB or 1 % of the loss, whichever is larger, the model itself.
 * @param varied at least one
 * @param reference Ω, differential
 * @returns null where the model gives no number at nominal
 */
export function responseOf(
  computed: Computed,
  varied: readonly Varied[],
  hz: number,
  reference: number,
): Response | null {
  const surface = surfaceOf(computed, varied, hz, reference)
  const nominal = surface(new Float64Array(varied.length))
  if (!Number.isFinite(nominal)) return null
  const quadratic = quadraticThrough(surface, varied.map(nodesOf))
  const holds = isClose(quadratic, surface, nominal, varied)
  return {
    varied,
    change: holds ? (shares) => quadraticAt(quadratic, shares) : (shares) => surface(shares) - nominal,
    down: Float64Array.from(varied, (parameter) => reachOf(parameter, Number.POSITIVE_INFINITY).down),
    up: Float64Array.from(varied, (parameter) => reachOf(parameter, Number.POSITIVE_INFINITY).up),
    quadratic: holds,
  }
}

/** A side with less room than this share of the tolerance is too close to nominal to take a difference over. */
const ROOM = 0.25

/** One tolerance to each side; where one side is out of reach, half and a whole one on the other. */
function nodesOf(parameter: Varied): Nodes {
  const { down, up } = reachOf(parameter, 1)
  if (down >= ROOM && up >= ROOM) return { a: -down, b: up }
  return up > down ? { a: up / 2, b: up } : { a: -down / 2, b: -down }
}

function isClose(quadratic: Quadratic, surface: Surface, nominal: number, varied: readonly Varied[]): boolean {
  const stream = streamOf(1, 'places')
  const ends = varied.map((parameter) => reachOf(parameter, 1))
  const outermost = varied.map((parameter) => reachOf(parameter, OUTERMOST))
  const corner = (k: number) => (nextUnit(stream) < 0.5 ? -(ends[k]?.down ?? 0) : (ends[k]?.up ?? 0))
  const place = (k: number) => {
    const { down, up } = outermost[k] ?? { down: 0, up: 0 }
    return nextUnit(stream) * (down + up) - down
  }
  for (let n = 0; n < CORNERS + PLACES; n++) {
    const shares = Float64Array.from(varied, (_, k) => (n < CORNERS ? corner(k) : place(k)))
    const exact = surface(shares)
    const off = Math.abs(nominal + quadraticAt(quadratic, shares) - exact)
    if (!(off <= Math.max(OFF_DB, OFF_SHARE * Math.abs(exact)))) return false
  }
  return true
}
