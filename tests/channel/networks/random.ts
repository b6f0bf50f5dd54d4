import fc from 'fast-check'
import type { Network } from '../../../lib/channel/networks'

/** A random number below 1 that fast-check can shrink and print. */
const share = fc.double({ min: 0, max: 1, maxExcluded: true, noNaN: true })
const between = (low: number, high: number) => share.map((x) => low + x * (high - low))

/** Ω of each port, real and imaginary part side by side. */
export function references(ports: number): fc.Arbitrary<Float64Array> {
  return fc
    .array(fc.tuple(between(20, 120), between(-40, 40)), { minLength: ports, maxLength: ports })
    .map((all) => Float64Array.from(all.flat()))
}

/** Any S whose rows and columns together hold less power than comes in, at one frequency, so passive. */
export function passive(ports: number, reciprocal = false): fc.Arbitrary<Network> {
  const size = 2 * ports ** 2
  const elements = fc.array(between(-1, 1), { minLength: size, maxLength: size })
  return fc.tuple(elements, between(0.1, 0.95), references(ports)).map(([drawn, norm, reference]) => {
    const symmetric = drawn.map((x, k) => {
      const [row, column] = [Math.floor(k / 2 / ports), Math.floor(k / 2) % ports]
      return reciprocal ? (drawn[2 * (Math.min(row, column) * ports + Math.max(row, column)) + (k % 2)] ?? x) : x
    })
    const whole = Math.hypot(...symmetric) || 1
    return { ports, hz: Float64Array.of(1e9), s: Float64Array.from(symmetric, (x) => (x * norm) / whole), reference }
  })
}

/** A two-port that loses nothing: S is unitary; with equal phases both ways where it is reciprocal. */
export function lossless(reciprocal = false): fc.Arbitrary<Network> {
  const angle = between(0, 2 * Math.PI)
  return fc.tuple(between(0, 0.9), angle, angle, angle).map(([r, a, b, drawn]) => {
    const c = reciprocal ? b : drawn
    const t = Math.sqrt(1 - r * r)
    const polar = (size: number, at: number) => [size * Math.cos(at), size * Math.sin(at)]
    const s = [polar(r, a), polar(t, b), polar(t, c), polar(-r, b + c - a)].flat()
    return { ports: 2, hz: Float64Array.of(1e9), s: Float64Array.from(s), reference: Float64Array.of(50, 0, 50, 0) }
  })
}

/** The closed form below loses half of its digits where both singular values are alike, as of anything nearly lossless. */
export const GAIN_ROUNDING = 1e-7

/** The largest singular value of a 2×2 complex matrix, in closed form from its norm and its determinant. */
export function largestGain(s: Float64Array): number {
  const [ar = 0, ai = 0, br = 0, bi = 0, cr = 0, ci = 0, dr = 0, di = 0] = s
  const norm2 = s.reduce((sum, x) => sum + x * x, 0)
  const determinant = Math.hypot(ar * dr - ai * di - br * cr + bi * ci, ar * di + ai * dr - br * ci - bi * cr)
  return Math.sqrt((norm2 + Math.sqrt(Math.max(norm2 * norm2 - 4 * determinant * determinant, 0))) / 2)
}

/** The largest absolute difference; NaN where either has one or the lengths differ. */
export function difference(one: Float64Array, other: Float64Array): number {
  if (one.length !== other.length) return Number.NaN
  return one.reduce((worst, value, k) => Math.max(worst, Math.abs(value - (other[k] ?? Number.NaN))), 0)
}

/** What is expected to be there. */
export function found<T extends object>(answer: T | { readonly reason: string }): T {
  if ('reason' in answer) throw new Error(answer.reason)
  return answer
}
