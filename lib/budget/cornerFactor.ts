import { type Conditions, holdsIn } from './corner'
import type { Line, LossClass } from './schema'
import { recomputesMoisture, recomputesTemperature } from './surroundings'
import { isUniform } from './uniform'

/**
 * By what a line's loss grows from the conditions that its number holds in to the corner, as far as its model does not
 * recompute them: 1 + coefficient × kelvins for traces and cable, and the typed growth from dry to wet for traces. What a number
 * already contains is not added again: one that holds at the corner's temperature does not move, one that holds wet does not
 * grow. (A guaranteed maximum is never lowered: lineLoss.)
 * @returns the factor, or what lacks, as half a sentence
 */
export function cornerFactor(line: Line, lossClass: LossClass | null, corner: Conditions): number | string {
  if (!isUniform(line)) return 1
  const holds = holdsIn(line, lossClass)
  const warm = recomputesTemperature(line, corner) ? 1 : temperatureFactor(holds.temperature, corner)
  if (typeof warm === 'string') return warm
  if (!corner.wet || line.kind !== 'trace' || holds.humidity === 'wet' || recomputesMoisture(line, corner)) return warm
  if (corner.lossWet === null)
    return `the corner ${corner.name} is wet and does not say by how much the loss of traces grows`
  return warm * (1 + corner.lossWet)
}

function temperatureFactor(own: number | null, corner: Conditions): number | string {
  if (corner.temperature === null) return 1
  const from = own ?? corner.reference
  if (from === null)
    return `the temperature of the reference corner is not given, so how far it is to the corner ${corner.name} is unknown`
  if (from === corner.temperature) return 1
  if (corner.perKelvin === null) {
    return `the corner ${corner.name} does not say by how much the loss of traces and cable grows per kelvin`
  }
  const factor = 1 + corner.perKelvin * (corner.temperature - from)
  return factor > 0 ? factor : `the growth per kelvin of the corner ${corner.name} leaves no loss at all`
}
