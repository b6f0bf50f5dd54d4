import { TWO_PORT } from '../networks/network'

/** What lies in each conductor of the pair: F, Ω and H. */
export type SeriesCapacitor = {
  readonly capacitance: number
  readonly resistance: number
  readonly inductance: number
}

/**
 * A capacitor with its series resistance and inductance in each conductor of a pair. In the odd mode each conductor sees half of the
 * differential reference R at both ends: with Z = R_s + jωL + 1/(jωC), S21 = R/(R + Z) and S11 = Z/(R + Z) (D. Pozar, Microwave
 * Engineering, table of two-port elements), both times jωC, so that 0 Hz is exact: nothing passes. The lower corner lies at
 * 1/(2πC(R + R_s)).
 * @param reference Ω, differential
 * @returns S11, S12, S21, S22, real and imaginary part side by side, 8 numbers a frequency
 */
export function seriesCapacitor(part: SeriesCapacitor, hz: Float64Array, reference: number): Float64Array {
  const { capacitance, resistance, inductance } = part
  const s = new Float64Array(TWO_PORT * hz.length)
  for (let i = 0; i < hz.length; i++) {
    const omega = 2 * Math.PI * (hz[i] as number)
    const susceptance = omega * capacitance
    // Z and R, each times jωC.
    const zRe = 1 - omega * inductance * susceptance
    const zIm = susceptance * resistance
    const rIm = susceptance * reference
    const dIm = zIm + rIm
    const size = zRe * zRe + dIm * dIm
    const at = TWO_PORT * i
    s[at] = s[at + 6] = (zRe * zRe + zIm * dIm) / size
    s[at + 1] = s[at + 7] = (zIm * zRe - zRe * dIm) / size
    s[at + 2] = s[at + 4] = (rIm * dIm) / size
    s[at + 3] = s[at + 5] = (rIm * zRe) / size
  }
  return s
}

/**
 * Where the series inductance alone would take half of the power, ωL = R; beyond it the part's own length matters (common practice, no
 * source).
 * @returns Hz; Infinity without inductance
 */
export function inductanceCorner(inductance: number, reference: number): number {
  return reference / (2 * Math.PI * inductance)
}
