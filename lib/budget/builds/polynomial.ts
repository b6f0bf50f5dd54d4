import { nextUnit, streamOf } from '../../channel/statistics'
import type { Surface } from './varied'

/** Ranges of the shares, one for each parameter. */
export type Box = readonly { readonly low: number; readonly high: number }[]

/** Samples for each coefficient: enough for the fit to be smooth between them. */
const SAMPLES_PER_TERM = 3

/**
 * A polynomial of total degree d over a box, by least squares through samples that lie closer towards the sides of the box,
 * always the same.
 * @param box at least one side
 * @returns its value at shares within the box; null where the surface has no number at a sample
 */
export function polynomialThrough(surface: Surface, box: Box, degree: number): Surface | null {
  const terms = termsOf(box.length, degree)
  const stream = streamOf(1, 'samples')
  const normal = Array.from(terms, () => new Float64Array(terms.length))
  const right = new Float64Array(terms.length)
  for (let n = 0; n < SAMPLES_PER_TERM * terms.length; n++) {
    const places = Float64Array.from(box, () => Math.cos(Math.PI * nextUnit(stream)))
    const value = surface(
      Float64Array.from(box, ({ low, high }, k) => (low + high + (places[k] ?? 0) * (high - low)) / 2),
    )
    if (!Number.isFinite(value)) return null
    const row = terms.map((exponents) => exponents.reduce((product, e, k) => product * (places[k] ?? 0) ** e, 1))
    normal.forEach((line, i) => {
      const factor = row[i] as number
      for (let j = 0; j < line.length; j++) line[j] = (line[j] as number) + factor * (row[j] as number)
      right[i] = (right[i] as number) + factor * value
    })
  }
  return hornerOver(box, solve(normal, right), degree)
}

/**
 * Horner's rule in the last parameter, which leaves one number for each term of the others, then in the one before it, and so
 * on; coefficients lie in the order in which they are met.
 */
function hornerOver(box: Box, coefficients: Float64Array, degree: number): Surface {
  const steps = box.map(({ low, high }, k) => {
    const lengths = Uint8Array.from(termsOf(k, degree), (row) => degree + 1 - row.reduce((sum, e) => sum + e, 0))
    return {
      scale: 2 / (high - low),
      shift: -(low + high) / (high - low),
      lengths,
      left: new Float64Array(lengths.length),
    }
  })
  return (shares) => {
    let from = coefficients
    for (let k = steps.length - 1; k >= 0; k--) {
      const { scale, shift, lengths, left } = steps[k] as (typeof steps)[number]
      const x = (shares[k] as number) * scale + shift
      let next = 0
      for (let n = 0; n < lengths.length; n++) {
        let sum = 0
        for (let e = lengths[n] as number; e > 0; e--) sum = sum * x + (from[next++] as number)
        left[n] = sum
      }
      from = left
    }
    return from[0] as number
  }
}

/** How many coefficients a polynomial of n parameters and total degree d has. */
export function termCount(parameters: number, degree: number): number {
  let count = 1
  for (let k = 1; k <= degree; k++) count = (count * (parameters + k)) / k
  return count
}

/** The exponents of every term, a row of one exponent for each parameter; the highest of the first parameter first. */
function termsOf(parameters: number, degree: number): number[][] {
  if (parameters === 0) return [[]]
  const rows: number[][] = []
  for (let own = degree; own >= 0; own--) {
    for (const rest of termsOf(parameters - 1, degree - own)) rows.push([own, ...rest])
  }
  return rows
}

/** Solves a symmetric, positive definite system in place (Cholesky). */
function solve(matrix: readonly Float64Array[], right: Float64Array): Float64Array {
  const n = right.length
  const at = (i: number, j: number) => (matrix[i] as Float64Array)[j] as number
  for (let i = 0; i < n; i++) {
    for (let j = 0; j <= i; j++) {
      let sum = at(i, j)
      for (let k = 0; k < j; k++) sum -= at(i, k) * at(j, k)
      ;(matrix[i] as Float64Array)[j] = i === j ? Math.sqrt(sum) : sum / at(j, j)
    }
  }
  for (let i = 0; i < n; i++) {
    for (let k = 0; k < i; k++) right[i] = (right[i] as number) - at(i, k) * (right[k] as number)
    right[i] = (right[i] as number) / at(i, i)
  }
  for (let i = n - 1; i >= 0; i--) {
    for (let k = i + 1; k < n; k++) right[i] = (right[i] as number) - at(k, i) * (right[k] as number)
    right[i] = (right[i] as number) / at(i, i)
  }
  return right
}
