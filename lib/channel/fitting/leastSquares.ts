/** A column that keeps less than this of its length beside the others is a combination of them. */
const DEPENDENT = 1e-10

/**
 * The x that makes |A·x − b| smallest, by Householder reflections of the columns, each scaled to length 1 first (Golub and Van
 * Loan, Matrix Computations, 5.2 and 5.3): no normal equations, whose condition is the square.
 * @param columns of A, one after the other, each as long as b; used as workspace
 * @param b used as workspace
 * @returns null where the columns are linearly dependent
 */
export function leastSquares(columns: Float64Array, b: Float64Array): Float64Array | null {
  const rows = b.length
  const count = columns.length / rows
  const scale = new Float64Array(count)
  const diagonal = new Float64Array(count)
  for (let c = 0; c < count; c++) {
    const length = norm(columns, c * rows, rows)
    if (!(length > 0)) return null
    scale[c] = length
    for (let r = 0; r < rows; r++) columns[c * rows + r] = (columns[c * rows + r] as number) / length
  }
  for (let c = 0; c < count; c++) {
    const start = c * rows + c
    const length = norm(columns, start, rows - c)
    if (!(length > DEPENDENT)) return null
    const head = columns[start] as number
    const pivot = head > 0 ? -length : length
    diagonal[c] = pivot
    // The reflection's vector takes the column's place; its squared length is 2·pivot·(pivot − head).
    columns[start] = head - pivot
    const half = pivot * (pivot - head)
    for (let other = c + 1; other < count; other++) reflect(columns, start, half, columns, other * rows + c, rows - c)
    reflect(columns, start, half, b, c, rows - c)
  }
  const x = new Float64Array(count)
  for (let c = count - 1; c >= 0; c--) {
    let rest = b[c] as number
    for (let other = c + 1; other < count; other++) rest -= (columns[other * rows + c] as number) * (x[other] as number)
    x[c] = rest / (diagonal[c] as number)
  }
  for (let c = 0; c < count; c++) x[c] = (x[c] as number) / (scale[c] as number)
  return x
}

function norm(values: Float64Array, start: number, count: number): number {
  let sum = 0
  for (let i = start; i < start + count; i++) sum += (values[i] as number) ** 2
  return Math.sqrt(sum)
}

function reflect(v: Float64Array, vAt: number, half: number, y: Float64Array, yAt: number, count: number): void {
  let dot = 0
  for (let i = 0; i < count; i++) dot += (v[vAt + i] as number) * (y[yAt + i] as number)
  const factor = dot / half
  for (let i = 0; i < count; i++) y[yAt + i] = (y[yAt + i] as number) - factor * (v[vAt + i] as number)
}
