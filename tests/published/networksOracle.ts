import { readFileSync } from 'node:fs'

/** Real and imaginary parts apart, nested as [frequency][row][column] or flatter. */
export type Parts = { readonly re: Nested; readonly im: Nested }
export type Nested = readonly (number | Nested)[]

/**
 * Reference values computed with plain numpy, some of them in extended precision, that agree with a general-purpose RF library to 4e-16
 * away from singular points. Their numbers and texts are kept as they were made; the files are called frozen so that no formatter touches them.
 */
export function oracle<T>(name: string): T {
  return JSON.parse(readFileSync(new URL(`./oracles/${name}.frozen.json`, import.meta.url), 'utf8'))
}

/** Side by side, in order. */
export function interleaved({ re, im }: Parts): Float64Array {
  const real = flat(re)
  const imaginary = flat(im)
  return Float64Array.from(
    { length: 2 * real.length },
    (_, k) => (k % 2 === 0 ? real : imaginary)[k >> 1] ?? Number.NaN,
  )
}

function flat(nested: Nested): number[] {
  return nested.flat(9) as number[]
}

/** The largest absolute difference; NaN where either has one or the lengths differ. */
export function difference(one: Float64Array, other: Float64Array): number {
  if (one.length !== other.length) return Number.NaN
  return one.reduce((worst, value, k) => Math.max(worst, Math.abs(value - (other[k] ?? Number.NaN))), 0)
}
