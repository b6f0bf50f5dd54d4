import { TWO_PORT } from '../networks/network'

/**
 * A capacitance from each conductor of a pair to ground. In the odd mode each conductor sees half of the differential reference:
 * with x = ωC·R/4, S21 = 1/(1 + jx) and S11 = −jx/(1 + jx), so that the loss is 10 log10(1 + x²) (D. Pozar, Microwave
 * Engineering, table of two-port elements). Exact for the element; how small a pad must be to be one: {@link padCorner}.
 * @param capacitance F, each conductor to ground; 0 gives the ideal through
 * @param reference Ω, differential
 * @returns S11, S12, S21, S22, real and imaginary part side by side, 8 numbers a frequency
 */
export function shuntCapacitance(capacitance: number, hz: Float64Array, reference: number): Float64Array {
  const s = new Float64Array(TWO_PORT * hz.length)
  for (let i = 0; i < hz.length; i++) {
    const x = ((hz[i] as number) * Math.PI * capacitance * reference) / 2
    const size = 1 + x * x
    const at = TWO_PORT * i
    s[at] = s[at + 6] = (-x * x) / size
    s[at + 1] = s[at + 7] = -x / size
    s[at + 2] = s[at + 4] = 1 / size
    s[at + 3] = s[at + 5] = -x / size
  }
  return s
}

/**
 * Where the capacitance has taken half of the power, x = 1. Beyond it a pad's own length matters, and one capacitance is no longer
 * its picture (common practice, no source).
 * @returns Hz; Infinity without capacitance
 */
export function padCorner(capacitance: number, reference: number): number {
  return 2 / (Math.PI * capacitance * reference)
}
