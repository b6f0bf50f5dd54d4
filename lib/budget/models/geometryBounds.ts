import type { Structure } from '../../channel/lines/structures'
import { BOUNDS } from '../../channel/lines/validity'
import { DEBYE_FROM, DEBYE_TO } from '../../channel/materials/widebandDebye'
import type { Line } from '../schema'
import { dimensionsOf } from './geometryPiece'
import type { Values } from './piece'

/** What a cross-section's numbers hold between; null: no bound on that side. */
export type GeometryBound = {
  /** As messages name it. */
  readonly name: string
  readonly of: (values: Values, anchor: number) => number
  readonly from: number | null
  readonly to: number | null
  /** The line's field that a flag hangs at. */
  readonly field: keyof Line & string
}

const FIELDS = {
  width: 'width',
  gap: 'gap',
  thickness: 'thickness',
  below: 'heightBelow',
  above: 'heightAbove',
  dielectric: 'dk',
} as const

/** A steeper trapezoid is no rectangle of its mean width any more: common practice, no source. */
const ETCH: GeometryBound = {
  name: 'width lost at the top over width at the foot',
  of: ({ etch = 0, width = 0 }) => etch / width,
  from: null,
  to: 0.5,
  field: 'etch',
}

const ANCHOR: GeometryBound = {
  name: 'frequency of Dk and Df in GHz',
  of: (_, anchor) => anchor / 1e9,
  from: DEBYE_FROM / 1e9,
  to: DEBYE_TO / 1e9,
  field: 'anchor',
}

/** Every bound of every structure, those of its formulas first. */
export const GEOMETRY_BOUNDS: Readonly<Record<Structure, readonly GeometryBound[]>> = {
  microstrip: boundsOf('microstrip'),
  stripline: boundsOf('stripline'),
  'coupled-microstrip': boundsOf('coupled-microstrip'),
  'coupled-stripline': boundsOf('coupled-stripline'),
}

function boundsOf(structure: Structure): readonly GeometryBound[] {
  const formulas = BOUNDS[structure].map(({ name, of, from, to, look }) => ({
    name,
    of: (values: Values) => of(dimensionsOf(values), values.dk ?? 0),
    from,
    to,
    field: FIELDS[look],
  }))
  return [...formulas, ETCH, ANCHOR]
}
