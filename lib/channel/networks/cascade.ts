import { TWO_PORT } from './network'

/** |d|² and the summed squares of transmissions below which a join counts as closed and as passing nothing. */
const CLOSED = 1e-300
const NOTHING = 1e-14

/**
 * Two-ports in a row, by Redheffer's star product in S (R. Redheffer, J. Math. Phys. 41, 1962): chains of T or ABCD matrices lose
 * all digits of what comes back through a very lossy chain, and have a pole where a stub is an exact quarter wave.
 * Neighbours must have the same reference at their join. Rounding stays near 1e-15 of each transmission.
 * @param chain S11, S12, S21, S22 of each two-port, real and imaginary part side by side, at the same `count` frequencies
 * @returns the same of the whole; of an empty chain, the ideal through. NaN where the chain has no steady state
 *   (see {@link joinInto}) and where an input is NaN
 * @throws RangeError for samples of fewer frequencies
 */
export function cascade(chain: readonly Float64Array[], count: number): Float64Array {
  const whole = new Float64Array(TWO_PORT * count)
  for (const samples of chain)
    if (samples.length < whole.length)
      throw new RangeError(`A two-port of ${samples.length / TWO_PORT} frequencies in a chain of ${count}.`)
  const [first, ...rest] = chain
  if (first) whole.set(first.subarray(0, whole.length))
  else for (let k = 0; k < whole.length; k += TWO_PORT) whole[k + 2] = whole[k + 4] = 1
  for (const next of rest) joinInto(whole, next, count)
  return whole
}

/**
 * Puts two-port b behind a, in a's own array. Where 1 − S22a·S11b is 0 the join reflects everything from both sides in phase: of
 * passive two-ports neither then lets anything through (|S21|² ≤ 1 − |S22|²), and so the whole is S11a and S22b with no
 * transmission; if either does let something through, it is active, has no steady state, and all eight numbers are NaN.
 * @param a 8 numbers a frequency, overwritten
 * @param b 8 numbers a frequency
 */
function joinInto(a: Float64Array, b: Float64Array, count: number): void {
  const end = TWO_PORT * count
  for (let k = 0; k < end; k += TWO_PORT) {
    const a12r = a[k + 2] as number
    const a12i = a[k + 3] as number
    const a21r = a[k + 4] as number
    const a21i = a[k + 5] as number
    const a22r = a[k + 6] as number
    const a22i = a[k + 7] as number
    const b11r = b[k] as number
    const b11i = b[k + 1] as number
    const b12r = b[k + 2] as number
    const b12i = b[k + 3] as number
    const b21r = b[k + 4] as number
    const b21i = b[k + 5] as number

    const dr = 1 - (a22r * b11r - a22i * b11i)
    const di = -(a22r * b11i + a22i * b11r)
    const square = dr * dr + di * di
    if (square < CLOSED) {
      closedJoin(a, b, k)
      continue
    }
    const inverse = 1 / square
    const er = dr * inverse
    const ei = -di * inverse
    // What runs forward behind the join for a wave into port 1, and back before it for a wave into port 2.
    const fr = a21r * er - a21i * ei
    const fi = a21r * ei + a21i * er
    const gr = b12r * er - b12i * ei
    const gi = b12r * ei + b12i * er
    const hr = b11r * fr - b11i * fi
    const hi = b11r * fi + b11i * fr
    const ir = a22r * gr - a22i * gi
    const ii = a22r * gi + a22i * gr

    a[k] = (a[k] as number) + (a12r * hr - a12i * hi)
    a[k + 1] = (a[k + 1] as number) + (a12r * hi + a12i * hr)
    a[k + 2] = a12r * gr - a12i * gi
    a[k + 3] = a12r * gi + a12i * gr
    a[k + 4] = b21r * fr - b21i * fi
    a[k + 5] = b21r * fi + b21i * fr
    a[k + 6] = (b[k + 6] as number) + (b21r * ir - b21i * ii)
    a[k + 7] = (b[k + 7] as number) + (b21r * ii + b21i * ir)
  }
}

function closedJoin(a: Float64Array, b: Float64Array, k: number): void {
  let through = 0
  for (let part = 2; part < 6; part++) through += (a[k + part] as number) ** 2 + (b[k + part] as number) ** 2
  if (through > NOTHING) {
    a.fill(Number.NaN, k, k + TWO_PORT)
    return
  }
  a.fill(0, k + 2, k + 6)
  a[k + 6] = b[k + 6] as number
  a[k + 7] = b[k + 7] as number
}
