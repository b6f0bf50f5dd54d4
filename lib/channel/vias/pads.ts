import { SPEED_OF_LIGHT } from '../materials/constants'
import { barrelImpedance } from './barrel'

/** 2πε0 in F/m. The formula's printed 1.41 pF a inch is 2πε0 rounded: 1.413. */
const PER_METRE = 1.41e-12 / 0.0254

/**
 * Capacitance of a whole single via to the planes that it passes: 1.41 εr·T·D1/(D2 − D1) pF with inches (H. Johnson, M. Graham,
 * High-Speed Digital Design; read in a mail of the si-list, where εr 4.7, 63 mil, 28 and 50 mil give 0.53 pF).
 * @param depth m, T; pad and antipad are the diameters D1 and D2 in m
 * @returns F
 */
export function viaCapacitance(depth: number, pad: number, antipad: number, dk: number): number {
  return (PER_METRE * dk * depth * pad) / (antipad - pad)
}

/**
 * What of it the pads add to the barrel alone, which is a coaxial line already and would be counted twice: the whole less the
 * line's own √εr·T/(c·Z). Not below 0: of a pad hardly wider than its barrel.
 * @returns F, of one barrel
 */
export function padExcess(depth: number, barrel: number, pad: number, antipad: number, dk: number): number {
  const line = (Math.sqrt(dk) * depth) / (SPEED_OF_LIGHT * barrelImpedance(barrel, antipad, dk))
  return Math.max(0, viaCapacitance(depth, pad, antipad, dk) - line)
}
