import type { Structure } from '../../channel/lines/structures'
import { BOUNDS } from '../../channel/lines/validity'
import { DEBYE_FROM, DEBYE_TO } from '../../channel/materials/widebandDebye'
import { dimensionsOf } from './geometryPiece'
import type { Values } from './piece'
import type { Bound } from './validity'

const FIELDS = {
  width: 'width',
  gap: 'gap',
  thickness: 'thickness',
  below: 'heightBelow',
  above: 'heightAbove',
  dielectric: 'dk',
} as const

/** A steeper trapezoid is no rectangle of its mean width any more: common practice, no source. */
const ETCH: Bound = {
  field: 'etch',
  what: 'width lost at the top over width at the foot',
  figure: ({ etch = 0, width = 0 }) => etch / width,
  least: 0,
  most: 0.5,
}

const ANCHOR: Bound = {
  field: 'anchor',
  what: 'frequency of Dk and Df in GHz',
  figure: ({ anchor = 0 }) => anchor / 1e9,
  least: DEBYE_FROM / 1e9,
  most: DEBYE_TO / 1e9,
}

/** Every bound of every structure, those of its formulas first. */
export const GEOMETRY_BOUNDS: Readonly<Record<Structure, readonly Bound[]>> = {
  microstrip: boundsOf('microstrip'),
  stripline: boundsOf('stripline'),
  'coupled-microstrip': boundsOf('coupled-microstrip'),
  'coupled-stripline': boundsOf('coupled-stripline'),
}

function boundsOf(structure: Structure): readonly Bound[] {
  const formulas = BOUNDS[structure].map(({ name, of, least, most, look }) => ({
    field: FIELDS[look],
    what: name,
    figure: (values: Values) => of(dimensionsOf(values), values.dk ?? 0),
    least,
    most,
  }))
  return [...formulas, ETCH, ANCHOR]
}
