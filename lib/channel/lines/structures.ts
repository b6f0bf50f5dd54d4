import { DEBYE_FROM, DEBYE_TO } from '../materials/widebandDebye'
import type { CrossSection, Dimensions } from './crossSection'
import { COUPLED_DISPERSION_LIMIT } from './microstrip/coupledDispersion'
import { KIRSCHNING_JANSEN_LIMIT } from './microstrip/dispersion'
import { coupledMicrostripSection, microstripSection } from './microstrip/section'
import { coupledStriplineSection, striplineSection } from './stripline/section'

export type Structure = 'microstrip' | 'stripline' | 'coupled-microstrip' | 'coupled-stripline'

/** The cross-section of a structure; the dielectric's relative permittivity decides the share of the field in it. */
export function crossSection(structure: Structure, dimensions: Dimensions, dielectric: number): CrossSection {
  if (structure === 'stripline') return striplineSection(dimensions)
  if (structure === 'coupled-stripline') return coupledStriplineSection(dimensions)
  if (structure === 'microstrip') return microstripSection(dimensions, dielectric)
  return coupledMicrostripSection(dimensions, dielectric)
}

/** Hz that the formulas and the laminate's model hold between: the latter's range, and for open lines the dispersion's. */
export function structureRange(structure: Structure, { below }: Dimensions): readonly [number, number] {
  if (structure === 'stripline' || structure === 'coupled-stripline') return [DEBYE_FROM, DEBYE_TO]
  const limit = structure === 'microstrip' ? KIRSCHNING_JANSEN_LIMIT : COUPLED_DISPERSION_LIMIT
  return [DEBYE_FROM, Math.min(DEBYE_TO, limit / below)]
}
