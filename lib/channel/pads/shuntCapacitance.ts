/**
 * −20 log10|Sdd21| of a capacitance from each conductor of a pair to ground. In the odd mode each conductor sees half of
 * the differential reference, so S21 = 2/(2 + jωC·R/2) and the loss is 10 log10(1 + (ωC·R/4)²).
 * @param capacitance F, each conductor to ground
 * @param reference Ω, differential
 * @param hz Hz
 * @returns dB
 */
export function shuntCapacitanceLoss(capacitance: number, reference: number, hz: number): number {
  const x = (2 * Math.PI * hz * capacitance * reference) / 4
  return (10 / Math.LN10) * Math.log1p(x * x)
}
