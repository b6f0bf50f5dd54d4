import { COPPER_STATED_AT, copperConductivity, copperTemperature } from '../channel/materials/copper'
import { type Conditions, holdsIn } from './corner'
import { DRY_REFERENCE, type Surroundings } from './models/piece'
import type { Line, LossClass } from './schema'

/** Models that tell the conductors' part of their loss from the dielectric's. */
function knowsParts(line: Line): boolean {
  if (line.model === 'geometry') return true
  return (line.model === 'per-length' || line.model === 'cable') && line.rootTerm !== null
}

/**
 * Whether a line's own model follows the corner's temperature: copper by its resistivity, with the roughness recomputed, and
 * the dielectric by its typed coefficient. Where the corner types only one growth for the whole loss, that one is taken instead.
 */
export function recomputesTemperature(line: Line, corner: Conditions): boolean {
  return knowsParts(line) && (corner.dielectricPerKelvin !== null || corner.perKelvin === null)
}

/** Whether a line's own model follows the corner's moisture, by what the corner types for Dk and Df. */
export function recomputesMoisture(line: Line, corner: Conditions): boolean {
  return line.model === 'geometry' && (corner.wetDf !== null || corner.wetDk !== null)
}

/**
 * What a computed model is asked in. A cross-section is computed at the temperature itself; terms that were fitted hold where
 * they were fitted, so they are asked at the temperature whose copper is as much more resistive than at 20 °C as the corner's is
 * than that of their own conditions.
 * @param reference °C of the reference corner
 */
export function surroundingsOf(
  line: Line,
  lossClass: LossClass | null,
  corner: Conditions | null,
  reference: number | null,
): Surroundings {
  if (!knowsParts(line)) return DRY_REFERENCE
  const holds = holdsIn(line, lossClass)
  const own = holds.temperature ?? reference ?? COPPER_STATED_AT
  const absolute = line.model === 'geometry'
  if (corner === null) return absolute ? { ...DRY_REFERENCE, temperature: own } : DRY_REFERENCE
  const warm = recomputesTemperature(line, corner) ? (corner.temperature ?? own) : own
  const moist = corner.wet && holds.humidity !== 'wet' && recomputesMoisture(line, corner)
  return {
    temperature: absolute ? warm : sameRatio(own, warm),
    dfFactor: 1 + (corner.dielectricPerKelvin ?? 0) * (warm - own),
    dfAdded: moist ? (corner.wetDf ?? 0) : 0,
    dkAdded: moist ? (corner.wetDk ?? 0) : 0,
  }
}

/** °C at which copper is as much more resistive than at 20 °C as it is at `to` than at `from`. */
function sameRatio(from: number, to: number): number {
  const conducts = copperConductivity(COPPER_STATED_AT) * (copperConductivity(to) / copperConductivity(from))
  return copperTemperature(conducts)
}
