import type { CrossSection, Dimensions } from '../crossSection'
import { crowding } from '../crowding'
import { centredCoupledStripline } from './coupledStripline'
import { centredStripline, offCentre } from './thickStripline'

/** Ω in air. */
export function striplineInAir(dimensions: Dimensions): number {
  const { width, thickness } = dimensions
  return offCentre((spacing) => centredStripline(width, spacing, thickness), dimensions)
}

/** Ω in air, of one conductor in the odd mode. */
export function coupledStriplineInAir(dimensions: Dimensions): number {
  const { width, gap, thickness } = dimensions
  return offCentre((spacing) => centredCoupledStripline(width, gap, spacing, thickness), dimensions)
}

/** A strip between two planes in one dielectric. */
export function striplineSection(dimensions: Dimensions): CrossSection {
  return section(striplineInAir, { ...dimensions, gap: 0 }, 1)
}

/** An edge-coupled pair between two planes in one dielectric, in its odd mode. */
export function coupledStriplineSection(dimensions: Dimensions): CrossSection {
  return section(coupledStriplineInAir, dimensions, 2)
}

function section(inAir: (dimensions: Dimensions) => number, dimensions: Dimensions, conductors: 1 | 2): CrossSection {
  return {
    airImpedance: inAir(dimensions),
    fill: 1,
    crowding: crowding(inAir, dimensions),
    area: dimensions.width * dimensions.thickness,
    conductors,
    dispersion: null,
  }
}
