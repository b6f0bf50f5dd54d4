import { lineTwoPort } from '../lines/lineTwoPort'
import { cascade } from '../networks/cascade'
import { shuntCapacitance } from '../pads'
import { type BarrelPair, barrelLine, barrelPairImpedance } from './barrel'
import { padExcess } from './pads'
import { stubTwoPort } from './stub'

/** A pair of vias: m, and the effective permittivity and loss tangent around the barrels. */
export type Via = BarrelPair & {
  readonly pad: number
  /** Depth of the barrel that the signal runs through. */
  readonly usedDepth: number
  /** What of the barrel hangs on below it. */
  readonly stub: number
  readonly dk: number
  readonly df: number
}

/**
 * A pair of vias: half of the pads' capacitance, the barrel as a line over the used depth, the stub across it at the exit, the other
 * half of the pads. The barrel's conductor loss is left out (millimetres of barrel lose hundredths of a decibel), and so is what the signal loses between the
 * planes where no ground via stands near. An estimate: only a field solver or a measurement tells a via within a tenth.
 * @param count vias alike in a row, one directly behind the other without line between
 * @param reference Ω, differential
 * @returns S11, S12, S21, S22, real and imaginary part side by side, 8 numbers a frequency
 */
export function viaTwoPort(via: Via, count: number, hz: Float64Array, reference: number): Float64Array {
  const { barrel, pad, antipad, usedDepth, stub, dk, df } = via
  const impedance = barrelPairImpedance(via, dk)
  const half = shuntCapacitance(padExcess(usedDepth, barrel, pad, antipad, dk) / 2, hz, reference)
  const line = lineTwoPort(barrelLine(impedance, dk, df, hz), usedDepth, reference)
  const hanging = stubTwoPort({ length: stub, impedance, dk, df }, hz, reference)
  const one = [half, line, hanging, half]
  return cascade(Array.from({ length: count }, () => one).flat(), hz.length)
}
