import type { Dimensions } from '../../channel/lines/crossSection'
import { lineTwoPort } from '../../channel/lines/lineTwoPort'
import { propagate } from '../../channel/lines/propagate'
import type { Propagation } from '../../channel/lines/propagation'
import { crossSection, type Structure, structureRange } from '../../channel/lines/structures'
import { copperConductivity } from '../../channel/materials/copper'
import {
  cannonball,
  hammerstad,
  huray,
  type Nodules,
  type Roughness,
  rqOfRz,
  SMOOTH,
} from '../../channel/materials/roughness'
import { widebandDebye } from '../../channel/materials/widebandDebye'
import type { Piece, Surroundings, Values } from './piece'

/** What of a trace does not vary from build to build. */
export type Trace = {
  readonly structure: Structure
  /** Hz that Dk and Df hold at. */
  readonly anchor: number
  readonly roughness:
    | 'smooth'
    | 'hammerstad'
    | 'cannonball'
    | { readonly base: number; readonly nodules: readonly Nodules[] }
  readonly surroundings: Surroundings
}

/** The published formulas and what they are given; read as a limit, until a coupon's factor says better. */
const UNCERTAINTY = 0.15
const DB_PER_NEPER = 20 / Math.LN10

const of = (values: Values, field: string) => values[field] ?? 0

/** The trapezoid as a rectangle of its mean width: the width at the foot less half of what the top lost; the pitch stays. */
export function dimensionsOf(values: Values): Dimensions {
  const lost = of(values, 'etch') / 2
  return {
    width: of(values, 'width') - lost,
    gap: of(values, 'gap') + lost,
    thickness: of(values, 'thickness'),
    below: of(values, 'heightBelow'),
    above: of(values, 'heightAbove'),
  }
}

/** A build whose trace or gap has vanished has no number: formulas would go on, to losses below zero. */
function possible(structure: Structure, dimensions: Dimensions): Dimensions {
  const { width, gap, thickness, below, above } = dimensions
  const needed = [width, thickness, below]
  if (structure.startsWith('coupled')) needed.push(gap)
  if (structure.endsWith('stripline')) needed.push(above)
  return needed.every((size) => size > 0) ? dimensions : { ...dimensions, width: Number.NaN }
}

/**
 * The pair with these values. Of a 'microstrip' or 'stripline' it is two lines that do not couple: twice the impedance, the
 * same attenuation. A coupon's factor multiplies the attenuation, of the two-port too.
 */
export function tracePiece(trace: Trace, values: Values): Piece {
  const { structure, surroundings } = trace
  const dimensions = possible(structure, dimensionsOf(values))
  const dk = of(values, 'dk') + surroundings.dkAdded
  const df = of(values, 'df') * surroundings.dfFactor + surroundings.dfAdded
  const laminate = widebandDebye(dk, df, trace.anchor)
  const section = { ...crossSection(structure, dimensions, dk), conductors: 2 as const }
  const metal = {
    conductivity: copperConductivity(surroundings.temperature),
    roughness: roughnessOf(trace.roughness, (of(values, 'roughnessTop') + of(values, 'roughnessBottom')) / 2),
  }
  const scale = values.scale ?? 1
  const length = of(values, 'length')
  const over = (hz: Float64Array) => scaled(propagate(section, laminate, metal, hz), scale)
  const [from, to] = structureRange(structure, dimensions)
  return {
    from,
    to,
    reflects: true,
    twoPort: (hz, reference) => lineTwoPort(over(hz), length, reference),
    attenuation: (hz) => over(hz).alpha.map((neper) => neper * length * DB_PER_NEPER),
    uncertainty: values.scale === undefined ? UNCERTAINTY : 0,
  }
}

function scaled(line: Propagation, scale: number): Propagation {
  return scale === 1 ? line : { ...line, alpha: line.alpha.map((neper) => neper * scale) }
}

/** @param rz m, mean of both sides: the current of a strip flows on both */
function roughnessOf(kind: Trace['roughness'], rz: number): Roughness {
  if (typeof kind === 'object') return huray(kind.base, kind.nodules)
  if (kind === 'cannonball') return cannonball(rz)
  return kind === 'hammerstad' ? hammerstad(rqOfRz(rz)) : SMOOTH
}
