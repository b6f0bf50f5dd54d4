import { ETA0 } from '../../materials/constants'
import type { CrossSection, Dimensions } from '../crossSection'
import { crowding } from '../crowding'
import { coupledDispersion } from './coupledDispersion'
import { coupledPermittivity, thinCoupledMicrostrip } from './coupledMicrostrip'
import { impedanceDispersion, kirschningJansen } from './dispersion'
import { effectivePermittivity, thinMicrostrip, widening } from './hammerstadJensen'

/** Share of the dielectric that a wave of this effective permittivity feels; a dielectric like air leaves the limit. */
function fillOf(effective: (dielectric: number) => number, dielectric: number): number {
  const above = Math.max(dielectric, 1 + 1e-6)
  return (effective(above) - 1) / (above - 1)
}

/** Ω in air: the widening of the side walls included (Hammerstad and Jensen 1980). */
export function microstripInAir({ width, thickness, below }: Dimensions): number {
  const u = width / below
  return thinMicrostrip(u + widening(u, thickness / below, 1))
}

/** Static effective permittivity, thickness included (Hammerstad and Jensen 1980). */
export function microstripPermittivity(dimensions: Dimensions, dielectric: number): number {
  const { width, thickness, below } = dimensions
  const u = width / below
  const ur = u + widening(u, thickness / below, dielectric)
  return effectivePermittivity(ur, dielectric) * (microstripInAir(dimensions) / thinMicrostrip(ur)) ** 2
}

/**
 * A microstrip: Hammerstad and Jensen with thickness, dispersion of Kirschning and Jansen, bare of solder mask.
 * @param dielectric relative permittivity that the share of the field is taken at; it hardly depends on it
 */
export function microstripSection(dimensions: Dimensions, dielectric: number): CrossSection {
  const { width, thickness, below } = dimensions
  return {
    airImpedance: microstripInAir(dimensions),
    fill: fillOf((er) => microstripPermittivity(dimensions, er), dielectric),
    crowding: crowding(microstripInAir, { ...dimensions, gap: 0, above: 0 }),
    area: width * thickness,
    conductors: 1,
    dispersion: { permittivity: kirschningJansen(width / below, below, dielectric), impedance: impedanceDispersion },
  }
}

/**
 * Capacitance of one conductor of a pair over ε0 in the odd mode. Thickness is put in as for the stripline: wide apart, both
 * side walls widen the strip as they do on a single line; close together, the outer wall widens it by half of that and the
 * facing walls are plates (air between them) of 2t/s. Both leave some capacitance out, so the larger is taken. The widening
 * is another one above a dielectric than in air, and counts as in Hammerstad and Jensen's single line. Against boundary
 * elements for u 0.5 to 2, g 0.3 to 8, t/h up to 0.6 and t up to s: impedance 0 to +2.7 %, in air −0.3 to +3.5 %, effective
 * permittivity −0.2 to +2.2 %.
 */
function oddCapacitance({ width, gap, thickness, below }: Dimensions, dielectric: number): number {
  const [u, g] = [width / below, gap / below]
  const strip = (share: number) => {
    const inAir = thinCoupledMicrostrip(u + share * widening(u, thickness / below, 1), g, 'odd')
    const ur = u + share * widening(u, thickness / below, dielectric)
    const above = thinCoupledMicrostrip(ur, g, 'odd')
    return (ETA0 * coupledPermittivity(ur, g, dielectric, 'odd') * inAir) / (above * above)
  }
  return Math.max(strip(1), strip(0.5) + (2 * thickness) / gap)
}

/** Ω in air, of one conductor in the odd mode. */
export function coupledMicrostripInAir(dimensions: Dimensions): number {
  return ETA0 / oddCapacitance(dimensions, 1)
}

/** Static effective permittivity of the odd mode. */
export function coupledMicrostripPermittivity(dimensions: Dimensions, dielectric: number): number {
  return oddCapacitance(dimensions, dielectric) / oddCapacitance(dimensions, 1)
}

/**
 * An edge-coupled pair of microstrips in its odd mode, bare of solder mask: Kirschning and Jansen 1984. Its impedance moves with
 * its effective permittivity as that of a single line does, so that a wide gap leaves two single lines.
 */
export function coupledMicrostripSection(dimensions: Dimensions, dielectric: number): CrossSection {
  const { width, gap, thickness, below } = dimensions
  return {
    airImpedance: coupledMicrostripInAir(dimensions),
    fill: fillOf((er) => coupledMicrostripPermittivity(dimensions, er), dielectric),
    crowding: crowding(coupledMicrostripInAir, { ...dimensions, above: 0 }),
    area: width * thickness,
    conductors: 2,
    dispersion: {
      permittivity: coupledDispersion(width / below, gap / below, below, dielectric),
      impedance: impedanceDispersion,
    },
  }
}
