import { cascade } from '../networks/cascade'
import { shuntCapacitance } from '../pads'
import { type SeriesCapacitor, seriesCapacitor } from './seriesCapacitor'

/**
 * A capacitor in each conductor, between the pads that it is soldered to: pad to ground, series branch, pad to ground.
 * @param padCapacitance F, of each pad to ground
 * @param reference Ω, differential
 * @returns 8 numbers a frequency, as of seriesCapacitor
 */
export function mountedCapacitor(
  part: SeriesCapacitor,
  padCapacitance: number,
  hz: Float64Array,
  reference: number,
): Float64Array {
  const pads = shuntCapacitance(padCapacitance, hz, reference)
  return cascade([pads, seriesCapacitor(part, hz, reference), pads], hz.length)
}
