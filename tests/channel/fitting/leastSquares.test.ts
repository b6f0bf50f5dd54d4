import { describe, expect, it } from 'vitest'
import { leastSquares } from '../../../lib/channel/fitting/leastSquares'

const solved = (columns: readonly number[], b: readonly number[]) => {
  const x = leastSquares(Float64Array.from(columns), Float64Array.from(b))
  return x && [...x]
}

describe('least squares (by hand)', () => {
  it('keep their digits for columns along an axis, in either direction: the reflection goes the longer way', () => {
    expect(solved([1, 0, 0, 0, -1, 0], [2, 3, 4])).toEqual([2, -3])
    expect(solved([-2, 0, 0, 0, 4, 0], [2, 3, 4])).toEqual([-1, 0.75])
  })

  it('meet in the mean what cannot be met, and take columns that begin with 0', () => {
    expect(solved([1, 1, 1, 1], [1, 2, 3, 6])).toEqual([expect.closeTo(3, 14)])
    // A line through (−1, 0), (0, 3), (1, 0) is level at 1.
    expect(solved([-1, 0, 1, 1, 1, 1], [0, 3, 0])).toEqual([expect.closeTo(0, 14), expect.closeTo(1, 14)])
    expect(solved([0, 1, 2, 2, 1, 0], [4, 4, 4])).toEqual([expect.closeTo(2, 14), expect.closeTo(2, 14)])
  })

  it('have none for a column of zeros, one that is not a number, or one that another makes up', () => {
    expect(solved([1, 2, 3, 0, 0, 0], [1, 2, 3])).toBeNull()
    expect(solved([1, 2, 3, 1, Number.NaN, 2], [1, 2, 3])).toBeNull()
    expect(solved([1, 2, 3, -2, -4, -6], [1, 2, 3])).toBeNull()
  })
})
