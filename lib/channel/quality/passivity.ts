import type { Network } from '../networks/network'
import { graded, type Metric, percentLeft, SIZE_THRESHOLDS } from './grade'
import { largestSingularValues } from './largestSingularValue'

/** Above 1 by less than this is rounding in the file. */
const LIMIT = 1.00001

export type Passivity = Metric & {
  /** The largest singular value of S, and where. */
  readonly largest: { readonly value: number; readonly hz: number }
}

/**
 * Does the network give out more than it takes in? IEEE Std 370-2020, initial quality check: each frequency takes off
 * (largest singular value − 1.00001)/0.1 where that is above zero. What it cannot see: gain that is hidden under loss, such as a
 * calibration that makes a lossy part look 1 dB better.
 */
export function passivity(network: Network): Passivity {
  const values = largestSingularValues(network)
  let excess = 0
  let worst = 0
  for (let f = 0; f < values.length; f++) {
    const value = values[f] as number
    if (value > LIMIT) excess += value - LIMIT
    if (value > (values[worst] as number)) worst = f
  }
  return {
    ...graded(percentLeft(values.length, excess), SIZE_THRESHOLDS),
    largest: { value: values[worst] as number, hz: network.hz[worst] as number },
  }
}
