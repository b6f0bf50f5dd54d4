import type { Surface } from './varied'

/** A function of n shares: linear coefficients, then the upper triangle of second order, row by row. Zero at nominal. */
export type Quadratic = {
  readonly n: number
  readonly linear: Float64Array
  readonly second: Float64Array
}

/** Two places on one axis to either side of nominal, or both on one side where the other is out of reach. */
export type Nodes = { readonly a: number; readonly b: number }

/**
 * The quadratic through nominal and the nodes of each axis, with the mixed terms from the four corners of each pair: finite
 * differences over the whole tolerance, exact for a function of second order.
 */
export function quadraticThrough(surface: Surface, nodes: readonly Nodes[]): Quadratic {
  const n = nodes.length
  const shares = new Float64Array(n)
  const nominal = surface(shares)
  const at = (k: number, x: number, l = k, y = x) => {
    shares[k] = x
    shares[l] = y
    const change = surface(shares) - nominal
    shares[k] = 0
    shares[l] = 0
    return change
  }
  const linear = new Float64Array(n)
  const second = new Float64Array((n * (n + 1)) / 2)
  let next = 0
  nodes.forEach(({ a, b }, k) => {
    const slopeA = at(k, a) / a
    const slopeB = at(k, b) / b
    const curve = (slopeB - slopeA) / (b - a)
    linear[k] = slopeA - curve * a
    second[next++] = curve
    nodes.slice(k + 1).forEach((other, offset) => {
      const l = k + 1 + offset
      const corners = at(k, a, l, other.a) - at(k, a, l, other.b) - at(k, b, l, other.a) + at(k, b, l, other.b)
      second[next++] = corners / ((b - a) * (other.b - other.a))
    })
  })
  return { n, linear, second }
}

export function quadraticAt({ n, linear, second }: Quadratic, shares: ArrayLike<number>): number {
  let sum = 0
  let next = 0
  for (let k = 0; k < n; k++) {
    const share = shares[k] as number
    let row = linear[k] as number
    for (let l = k; l < n; l++) row += (second[next++] as number) * (shares[l] as number)
    sum += share * row
  }
  return sum
}
