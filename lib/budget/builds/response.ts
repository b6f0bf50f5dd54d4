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
const CORNERS = 64

/**
 * The response of a computed line: a quadratic through the model (gradient and second derivatives by finite differences over
 * the tolerance), held against the model itself in corners of the tolerances drawn at random, always the same; where it is
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
  const holds = holdsInCorners(quadratic, surface, nominal, varied)
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

function holdsInCorners(quadratic: Quadratic, surface: Surface, nominal: number, varied: readonly Varied[]): boolean {
  const stream = streamOf(1, 'corners')
  const reaches = varied.map((parameter) => reachOf(parameter, 1))
  const shares = new Float64Array(varied.length)
  for (let corner = 0; corner < CORNERS; corner++) {
    reaches.forEach(({ down, up }, k) => {
      shares[k] = nextUnit(stream) < 0.5 ? -down : up
    })
    const exact = surface(shares)
    const off = Math.abs(nominal + quadraticAt(quadratic, shares) - exact)
    if (!(off <= Math.max(OFF_DB, OFF_SHARE * Math.abs(exact)))) return false
  }
  return true
}
