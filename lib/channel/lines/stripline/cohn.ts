import { ETA0 } from '../../materials/constants'

/** Ω, η0/4, over the ratio of two complete elliptic integrals: K(p)/K(p′) = AGM(1, p)/AGM(1, p′) with p² + p′² = 1. */
function byModulus(modulus: number, complement: number): number {
  return ((ETA0 / 4) * mean(1, modulus)) / mean(1, complement)
}

/** Arithmetic-geometric mean (Gauss): doubles its digits in each step. */
function mean(a: number, b: number): number {
  let [high, low] = [a, b]
  for (let step = 0; step < 40 && Math.abs(high - low) > 1e-15 * high; step++) {
    ;[high, low] = [(high + low) / 2, Math.sqrt(high * low)]
  }
  return high
}

/**
 * Exact impedance of a centred stripline of no thickness in air: (η0/4)·K(k)/K(k′), k = sech(πw/2b), k′ = tanh(πw/2b) (Cohn,
 * IRE Trans. MTT 2(2), 1954; from memory).
 * @param width m
 * @param spacing m, plane to plane
 * @returns Ω
 */
export function thinStripline(width: number, spacing: number): number {
  const x = (Math.PI * width) / (2 * spacing)
  return byModulus(1 / Math.cosh(x), Math.tanh(x))
}

/**
 * The same for each conductor of an edge-coupled pair (Cohn, IRE Trans. MTT 3(5), 1955; from memory): k = tanh(πw/2b) times
 * tanh, in the odd mode coth, of π(w + s)/2b; Z = (η0/4)·K(k′)/K(k).
 * @returns Ω of one conductor: twice the odd one is the differential impedance, half the even one the common one
 */
export function thinCoupledStripline(width: number, gap: number, spacing: number, mode: 'odd' | 'even'): number {
  const x = (Math.PI * width) / (2 * spacing)
  const y = (Math.PI * (width + gap)) / (2 * spacing)
  const k = mode === 'even' ? Math.tanh(x) * Math.tanh(y) : Math.tanh(x) / Math.tanh(y)
  // 1 − k² without the cancellation that a wide strip would bring.
  const partner = mode === 'even' ? 1 / Math.cosh(y) : 1 / Math.sinh(y)
  const less = (Math.tanh(x) * partner) ** 2
  const rest = 1 / Math.cosh(x) ** 2 + (mode === 'even' ? less : -less)
  return byModulus(Math.sqrt(rest), k)
}
