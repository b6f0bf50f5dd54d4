import type { Network } from '../networks/network'

const SWEEPS = 40
/** Columns count as orthogonal from here on; their norms are then right to about the square of it. */
const ORTHOGONAL = 1e-12

/**
 * Largest singular value of S at each frequency: the largest ratio of the waves that come out to those that go in, at most 1
 * for a passive network. One-sided Jacobi rotations (Hestenes, J. SIAM 6(1), 1958), which need no start vector and do not
 * slow down where singular values lie close, as power iteration does.
 * @returns one number a frequency
 */
export function largestSingularValues({ ports, hz, s }: Network): Float64Array {
  const result = new Float64Array(hz.length)
  const size = 2 * ports * ports
  const work = new Float64Array(size)
  for (let f = 0; f < hz.length; f++) {
    for (let i = 0; i < size; i++) work[i] = s[f * size + i] as number
    orthogonalise(work, ports)
    let largest = 0
    for (let column = 0; column < ports; column++) largest = Math.max(largest, squaredNorm(work, ports, column))
    result[f] = Math.sqrt(largest)
  }
  return result
}

/** Rotates pairs of columns of a complex square matrix, in place, until all are orthogonal. */
function orthogonalise(matrix: Float64Array, size: number): void {
  for (let sweep = 0; sweep < SWEEPS; sweep++) {
    let turned = false
    for (let p = 0; p < size - 1; p++) for (let q = p + 1; q < size; q++) if (rotate(matrix, size, p, q)) turned = true
    if (!turned) return
  }
}

function rotate(matrix: Float64Array, size: number, p: number, q: number): boolean {
  let pp = 0
  let qq = 0
  let re = 0
  let im = 0
  for (let row = 0; row < size; row++) {
    const at = 2 * (row * size + p)
    const bt = 2 * (row * size + q)
    const ar = matrix[at] as number
    const ai = matrix[at + 1] as number
    const br = matrix[bt] as number
    const bi = matrix[bt + 1] as number
    pp += ar * ar + ai * ai
    qq += br * br + bi * bi
    re += ar * br + ai * bi
    im += ar * bi - ai * br
  }
  const overlap = Math.hypot(re, im)
  if (overlap <= ORTHOGONAL * Math.sqrt(pp * qq)) return false
  // The phase of the inner product first, then the rotation of two real columns.
  const ur = re / overlap
  const ui = im / overlap
  const tau = (qq - pp) / (2 * overlap)
  const tangent = (tau < 0 ? -1 : 1) / (Math.abs(tau) + Math.sqrt(1 + tau * tau))
  const cosine = 1 / Math.sqrt(1 + tangent * tangent)
  const sine = cosine * tangent
  for (let row = 0; row < size; row++) {
    const at = 2 * (row * size + p)
    const bt = 2 * (row * size + q)
    const ar = matrix[at] as number
    const ai = matrix[at + 1] as number
    const br = (matrix[bt] as number) * ur + (matrix[bt + 1] as number) * ui
    const bi = (matrix[bt + 1] as number) * ur - (matrix[bt] as number) * ui
    matrix[at] = cosine * ar - sine * br
    matrix[at + 1] = cosine * ai - sine * bi
    matrix[bt] = sine * ar + cosine * br
    matrix[bt + 1] = sine * ai + cosine * bi
  }
  return true
}

function squaredNorm(matrix: Float64Array, size: number, column: number): number {
  let sum = 0
  for (let row = 0; row < size; row++) {
    const at = 2 * (row * size + column)
    sum += (matrix[at] as number) ** 2 + (matrix[at + 1] as number) ** 2
  }
  return sum
}
