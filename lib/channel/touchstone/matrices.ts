import type { Format } from './file'
import type { MatrixFormat, TwoPortOrder } from './header'

const RADIANS = Math.PI / 180

/** Makes real and imaginary parts of the pairs, in place. Angles are in degrees, decibels are 20 log10. */
export function toRealAndImaginary(pairs: Float64Array, format: Format): void {
  if (format === 'RI') return
  for (let k = 0; k < pairs.length; k += 2) {
    const size = format === 'DB' ? 10 ** ((pairs[k] as number) / 20) : (pairs[k] as number)
    const angle = (pairs[k + 1] as number) * RADIANS
    pairs[k] = size * Math.cos(angle)
    pairs[k + 1] = size * Math.sin(angle)
  }
}

/** Complex numbers that a file has of a matrix. */
export function elementsOf(ports: number, matrix: MatrixFormat): number {
  return matrix === 'full' ? ports * ports : (ports * (ports + 1)) / 2
}

/**
 * Full matrices row by row, of what a file has of them; a triangle is mirrored.
 * @param pairs may be changed and returned
 */
export function fullMatrices(
  pairs: Float64Array,
  ports: number,
  matrix: MatrixFormat,
  order: TwoPortOrder | null,
): Float64Array {
  if (matrix === 'full') {
    if (ports === 2 && order === '21_12') swapMiddle(pairs)
    return pairs
  }
  const inFile = 2 * elementsOf(ports, matrix)
  const size = 2 * ports * ports
  const points = pairs.length / inFile
  const out = new Float64Array(points * size)
  for (let point = 0; point < points; point++) {
    let from = point * inFile
    for (let row = 0; row < ports; row++) {
      const first = matrix === 'lower' ? 0 : row
      const last = matrix === 'lower' ? row : ports - 1
      for (let column = first; column <= last; column++, from += 2) {
        for (const to of [row * ports + column, column * ports + row]) {
          out[point * size + 2 * to] = pairs[from] as number
          out[point * size + 2 * to + 1] = pairs[from + 1] as number
        }
      }
    }
  }
  return out
}

/** S11 S21 S12 S22 becomes S11 S12 S21 S22. */
function swapMiddle(pairs: Float64Array): void {
  for (let k = 2; k < pairs.length; k += 8)
    for (let part = k; part < k + 2; part++) {
      const kept = pairs[part] as number
      pairs[part] = pairs[part + 2] as number
      pairs[part + 2] = kept
    }
}
