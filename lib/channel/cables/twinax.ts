import { copperConductivity } from '../materials/copper'
import { surfaceResistance } from '../materials/skinEffect'

const DB_PER_NEPER = 20 / Math.LN10
/** Copper is stated at this temperature, °C. */
const STATED_AT = 20

/**
 * Diameter of a solid wire by its gauge number: 0.127 mm × 92^((36 − n)/39) (ASTM B258).
 * @param gauge AWG number, −3 (0000) to 44
 * @returns m
 */
export function wireDiameter(gauge: number): number {
  return 0.127e-3 * 92 ** ((36 - gauge) / 39)
}

/**
 * Attenuation that no pair with inner conductors of this diameter stays under: smooth solid copper at 20 °C, current spread evenly
 * over the surface, nothing lost in the shield, the dielectric, plating or strands. α = 2Rs/(πd) / (2·Z) Np/m. Real cable loses 1.3 to
 * 1.7 times this (from memory; no data sheet read). Holds where the diameter is many skin depths.
 * @param diameter m, of one conductor
 * @param impedance Ω, differential
 * @param hz Hz
 * @returns dB/m
 */
export function twinaxFloor(diameter: number, impedance: number, hz: number): number {
  return (DB_PER_NEPER * surfaceResistance(copperConductivity(STATED_AT), hz)) / (Math.PI * diameter * impedance)
}
