import { insertionLoss, renormalise, resample } from '../../../channel/networks'
import { type Network, TWO_PORT } from '../../../channel/networks/network'

/** The two-port between the data's points in another reference; NaN outside of the data, where nobody asks for it. */
export function sampled(own: Network, hz: Float64Array, reference: number): Float64Array {
  const between = resample(own, hz)
  return 'reason' in between
    ? new Float64Array(TWO_PORT * hz.length).fill(Number.NaN)
    : renormalise(between, reference).s
}

/** Insertion loss at one frequency in the file's own reference, dB. */
export function insertionAt(own: Network, hz: number): number {
  const between = resample(own, Float64Array.of(hz))
  return 'reason' in between ? Number.NaN : (insertionLoss(between.s)[0] ?? Number.NaN)
}

/** Insertion loss over all points of the file in another reference, dB. */
export function insertionOver(own: Network, reference: number): Float64Array {
  return insertionLoss(renormalise(own, reference).s)
}
