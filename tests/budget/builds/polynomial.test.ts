import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { polynomialThrough, termCount } from '../../../lib/budget/builds/polynomial'

const SEED = 77
const BOX = [
  { low: -1.5, high: 1.5 },
  { low: 0, high: 1.2 },
  { low: -0.4, high: 1.5 },
]

describe('a polynomial through samples', () => {
  it(`of a polynomial of its own degree is that polynomial, each parameter in its own place (random, seed ${SEED})`, () => {
    const factor = fc.double({ min: -1, max: 1, noNaN: true })
    const list = (n: number) => fc.array(factor, { minLength: n, maxLength: n })
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 3 }),
        fc.integer({ min: 2, max: 5 }),
        list(4),
        list(3),
        (n, degree, c, at) => {
          // Powers of a weighted sum, and one product: every mixed term up to the degree.
          const of = (x: ArrayLike<number>) => {
            let sum = c[0] ?? 0
            for (let k = 0; k < n; k++) sum += (c[k + 1] ?? 0) * (x[k] ?? 0)
            return sum ** degree + (x[0] ?? 0) * (x[n - 1] ?? 0)
          }
          const box = BOX.slice(0, n)
          const shares = box.map(({ low, high }, k) => low + ((1 + (at[k] ?? 0)) / 2) * (high - low))
          const found = polynomialThrough(of, box, degree)
          expect(found?.(shares)).toBeCloseTo(of(shares), 7)
        },
      ),
      { seed: SEED, numRuns: 60 },
    )
  })

  it('has (n + d)! / (n! d!) terms (combinations with repetition)', () => {
    expect([termCount(1, 8), termCount(4, 5), termCount(9, 2)]).toEqual([9, 126, 55])
  })

  it('is none where the surface has no number', () => {
    expect(polynomialThrough((x) => ((x[0] ?? 0) > 1 ? Number.NaN : 1), BOX.slice(0, 1), 3)).toBeNull()
  })
})
