import { COPPER_STATED_AT, copperConductivity } from '../materials/copper'
import { surfaceResistance } from '../materials/skinEffect'

const DB_PER_NEPER = 20 / Math.LN10
/** m. No signal layer is thicker than 2 oz/ft² of copper. */
const THICKEST = 70e-6
/** What a strip of about three skin depths carries better than the surface law says: at best 8 %. */
const THIN_STRIP = 0.9

/**
 * Attenuation that no trace pair of this width stays under: smooth copper at 20 °C, its current spread evenly over the whole
 * perimeter, which is the least resistance that skin depth allows (the mean of J² is at least the square of the mean); neither
 * the current's return nor the dielectric nor roughness costs anything. α = Rs / (perimeter · Z) Np/m with Rs = √(π f µ0 / σ)
 * and the perimeter 2 (w + t) of one trace. A slab of π skin depths with current on both sides has 0.917 of that resistance
 * (Re of its surface impedance, (sinh x + sin x)/(cosh x − cos x)); 0.9 covers it. The return, left out, costs more than
 * copper gains down to −40 °C (13 %). A common rule of thumb, (36/(w·Z0)) √f dB/in with w in mil and f in GHz (from memory; 35.8
 * recomputed), lets one surface of a single trace carry everything: that is an estimate, and about twice this floor.
 * @param width m, of one trace
 * @param impedance Ω, differential, of the line itself; a higher one gives a lower floor
 * @param hz Hz
 * @param thickness m of copper; where it is not known, the thickest of signal layers
 * @returns dB/m
 */
export function copperFloor(width: number, impedance: number, hz: number, thickness = THICKEST): number {
  const surface = surfaceResistance(copperConductivity(COPPER_STATED_AT), hz)
  return (THIN_STRIP * DB_PER_NEPER * surface) / (2 * (width + thickness) * impedance)
}

/** The floor where the attenuation claimed lies under it, else null. Arguments as for copperFloor; dB/m. */
export function belowCopperFloor(
  dbPerMetre: number,
  width: number,
  impedance: number,
  hz: number,
  thickness?: number,
): number | null {
  const floor = copperFloor(width, impedance, hz, thickness)
  return dbPerMetre < floor ? floor : null
}
