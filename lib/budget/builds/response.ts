import { nextUnit, streamOf } from '../../channel/statistics'
import type { Computed } from '../models/piece'
import { type Box, polynomialThrough, termCount } from './polynomial'
import { type Nodes, quadraticAt, quadraticThrough } from './quadratic'
import { reachOf, type Surface, surfaceOf, type Varied } from './varied'

/** How a line's loss changes with its varied parameters, at one frequency. */
export type Response = {
  readonly varied: readonly Varied[]
  /** dB more than at nominal; shares of the tolerances, within what the parameters can be. */
  readonly change: (shares: Float64Array) => number
  /** How many tolerances each parameter may go down and up. */
  readonly down: Float64Array
  readonly up: Float64Array
  /** What answers: a polynomial of this degree; null: the model itself, in every build, which takes long. */
  readonly degree: number | null
}

/** How far a polynomial may be off within the tolerances: the larger of these, in dB and as a share of the loss. */
const OFF_DB = 0.01
const OFF_SHARE = 0.01
/** Corners of the tolerances, and places anywhere out to where polynomials end. */
const CORNERS = 32
const PLACES = 64
/** Tolerances that polynomials reach; one build in 100,000 goes beyond, and asks the model. */
const OUTERMOST = 1.5
/** A side with less room than this share of the tolerance is too close to nominal to take a difference over. */
const ROOM = 0.25
const HIGHEST_DEGREE = 8
/** Past this many coefficients a polynomial is hardly faster than a model. */
const MOST_TERMS = 130

/**
 * The response of a computed line: a quadratic through the model (gradient and second derivatives by finite differences over
 * the tolerance), held against the model itself in corners and at places drawn at random, always the same; where it is
 * further off than 0.01 dB or 1 % of the loss, whichever is larger, a polynomial of higher degree that is not; else the model.
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
  const exact: Surface = (shares) => surface(shares) - nominal
  const box = boxOf(varied, OUTERMOST)
  const { degree, change } = approximation(exact, nominal, varied, box)
  const within = (shares: Float64Array) => {
    for (let k = 0; k < box.length; k++) {
      const side = box[k]
      const share = shares[k] as number
      if (!side || share < side.low || share > side.high) return false
    }
    return true
  }
  return {
    varied,
    change: (shares) => (degree !== null && within(shares) ? change(shares) : exact(shares)),
    down: Float64Array.from(varied, (parameter) => reachOf(parameter, Number.POSITIVE_INFINITY).down),
    up: Float64Array.from(varied, (parameter) => reachOf(parameter, Number.POSITIVE_INFINITY).up),
    degree,
  }
}

function approximation(exact: Surface, nominal: number, varied: readonly Varied[], box: Box) {
  const checks = checksOf(exact, nominal, varied, box)
  const holds = (change: Surface) => checks.every(({ shares, db, allowed }) => Math.abs(change(shares) - db) <= allowed)
  const quadratic = quadraticThrough(exact, varied.map(nodesOf))
  const second: Surface = (shares) => quadraticAt(quadratic, shares)
  if (holds(second)) return { degree: 2, change: second }
  for (let degree = 3; degree <= HIGHEST_DEGREE && termCount(varied.length, degree) <= MOST_TERMS; degree++) {
    const change = polynomialThrough(exact, box, degree)
    if (change === null) break
    if (holds(change)) return { degree, change }
  }
  return { degree: null, change: exact }
}

/** One tolerance to each side; where one side is out of reach, half and a whole one on the other. */
function nodesOf(parameter: Varied): Nodes {
  const { down, up } = reachOf(parameter, 1)
  if (down >= ROOM && up >= ROOM) return { a: -down, b: up }
  return up > down ? { a: up / 2, b: up } : { a: -down / 2, b: -down }
}

function boxOf(varied: readonly Varied[], most: number): Box {
  return varied.map((parameter) => {
    const { down, up } = reachOf(parameter, most)
    return { low: -down, high: up }
  })
}

function checksOf(exact: Surface, nominal: number, varied: readonly Varied[], box: Box) {
  const stream = streamOf(1, 'places')
  const tolerances = boxOf(varied, 1)
  return Array.from({ length: CORNERS + PLACES }, (_, n) => {
    const corner = n < CORNERS
    const shares = Float64Array.from(corner ? tolerances : box, ({ low, high }) => {
      const place = nextUnit(stream)
      return low + (corner ? Math.round(place) : place) * (high - low)
    })
    const db = exact(shares)
    return { shares, db, allowed: Math.max(OFF_DB, OFF_SHARE * Math.abs(nominal + db)) }
  })
}
