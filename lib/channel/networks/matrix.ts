/**
 * Square complex matrices of a few ports: row by row, real and imaginary part side by side, in arrays that the caller keeps, so
 * that a loop over frequencies allocates nothing.
 */

/** out = a·b for n×n a and n×columns b; out must be neither. */
export function multiply(a: Float64Array, b: Float64Array, out: Float64Array, n: number, columns: number): void {
  for (let row = 0; row < n; row++)
    for (let column = 0; column < columns; column++) {
      let re = 0
      let im = 0
      for (let k = 0; k < n; k++) {
        const i = 2 * (row * n + k)
        const j = 2 * (k * columns + column)
        const ar = a[i] as number
        const ai = a[i + 1] as number
        const br = b[j] as number
        const bi = b[j + 1] as number
        re += ar * br - ai * bi
        im += ar * bi + ai * br
      }
      const at = 2 * (row * columns + column)
      out[at] = re
      out[at + 1] = im
    }
}

/**
 * Solves a·x = b by Gauss's elimination with partial pivoting (LU; Golub and Van Loan, Matrix Computations, 3.4).
 * @param a n×n, destroyed
 * @param b n×columns, becomes x; meaningless where a is singular
 * @returns false where a is singular: a pivot of no more than 8·n·ε of the largest element, behind which no digit is right, or NaN
 */
export function solve(a: Float64Array, b: Float64Array, n: number, columns: number): boolean {
  let largest = 0
  for (let k = 0; k < 2 * n * n; k += 2) largest = Math.max(largest, magnitude2(a, k))
  const least = (8 * n * Number.EPSILON) ** 2 * largest
  for (let step = 0; step < n; step++) {
    let best = step
    for (let row = step + 1; row < n; row++)
      if (magnitude2(a, 2 * (row * n + step)) > magnitude2(a, 2 * (best * n + step))) best = row
    const pivot = 2 * (step * n + step)
    if (best !== step) {
      swapRows(a, step, best, n)
      swapRows(b, step, best, columns)
    }
    const square = magnitude2(a, pivot)
    if (!(square > least)) return false
    const invR = (a[pivot] as number) / square
    const invI = -(a[pivot + 1] as number) / square
    for (let row = step + 1; row < n; row++) {
      const at = 2 * (row * n + step)
      const re = (a[at] as number) * invR - (a[at + 1] as number) * invI
      const im = (a[at] as number) * invI + (a[at + 1] as number) * invR
      subtractRow(a, row, step, n, step + 1, re, im)
      subtractRow(b, row, step, columns, 0, re, im)
    }
  }
  for (let step = n - 1; step >= 0; step--) {
    for (let k = step + 1; k < n; k++) {
      const at = 2 * (step * n + k)
      subtractRow(b, step, k, columns, 0, a[at] as number, a[at + 1] as number)
    }
    const pivot = 2 * (step * n + step)
    const square = magnitude2(a, pivot)
    const invR = (a[pivot] as number) / square
    const invI = -(a[pivot + 1] as number) / square
    for (let k = 2 * step * columns; k < 2 * (step + 1) * columns; k += 2) {
      const re = b[k] as number
      const im = b[k + 1] as number
      b[k] = re * invR - im * invI
      b[k + 1] = re * invI + im * invR
    }
  }
  return true
}

/** target −= factor·source, from column `from` on. */
function subtractRow(
  matrix: Float64Array,
  target: number,
  source: number,
  width: number,
  from: number,
  re: number,
  im: number,
): void {
  let to = 2 * (target * width + from)
  const end = 2 * (source + 1) * width
  for (let k = 2 * (source * width + from); k < end; k += 2, to += 2) {
    const sr = matrix[k] as number
    const si = matrix[k + 1] as number
    matrix[to] = (matrix[to] as number) - (re * sr - im * si)
    matrix[to + 1] = (matrix[to + 1] as number) - (re * si + im * sr)
  }
}

function swapRows(matrix: Float64Array, one: number, other: number, width: number): void {
  for (let k = 0; k < 2 * width; k++) {
    const kept = matrix[2 * one * width + k] as number
    matrix[2 * one * width + k] = matrix[2 * other * width + k] as number
    matrix[2 * other * width + k] = kept
  }
}

function magnitude2(matrix: Float64Array, at: number): number {
  return (matrix[at] as number) ** 2 + (matrix[at + 1] as number) ** 2
}
