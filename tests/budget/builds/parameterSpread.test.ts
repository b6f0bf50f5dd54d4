import { describe, expect, it } from 'vitest'
import { parameterSpread, type Varied } from '../../../lib/budget/builds'
import type { Computed } from '../../../lib/budget/models/piece'
import { formula } from './lines'

const varies = (field: string, nominal: number, tolerance: number): Varied => ({
  field,
  nominal,
  tolerance,
  min: 0,
  max: 100,
})
const spread = (computed: Computed, ...varied: Varied[]) => parameterSpread(computed, varied, 1e10, 100)
const near = (...[lowExtreme, highExtreme, lowThreeSigma, highThreeSigma]: number[]) => ({
  lowExtreme: expect.closeTo(lowExtreme ?? 0, 12),
  highExtreme: expect.closeTo(highExtreme ?? 0, 12),
  lowThreeSigma: expect.closeTo(lowThreeSigma ?? 0, 12),
  highThreeSigma: expect.closeTo(highThreeSigma ?? 0, 12),
})

describe('how far parameters move a loss (by hand)', () => {
  const nan = Number.NaN

  it('worst: every one at its worse end, through the model and not by slopes; sigma: root of the sum of squares', () => {
    const trace = formula({ length: 10, width: 2 }, ({ length = nan, width = nan }) => length / width)
    // 5 dB; 11/1.6 and 9/2.4 at the corners; one by one 11/2, 9/2, 10/1.6, 10/2.4.
    expect(spread(trace, varies('length', 10, 1), varies('width', 2, 0.4))).toEqual(
      near(5 - 9 / 2.4, 11 / 1.6 - 5, Math.hypot(0.5, 5 - 10 / 2.4), Math.hypot(0.5, 1.25)),
    )
  })

  it('of a loss that has its least at nominal goes up only', () => {
    const bowl = formula({ impedance: 50 }, ({ impedance = nan }) => 1 + (impedance - 50) ** 2)
    expect(spread(bowl, varies('impedance', 50, 2))).toEqual(near(0, 4, 0, 4))
  })

  it('finds the worse end that hangs on another parameter', () => {
    const twisted = formula(
      { width: 1, gap: 1 },
      ({ width = nan, gap = nan }) => 9 + (gap - 1) + 3 * (width - 1) * (1 - gap) + 0.2 * (width - 1),
    )
    // Corners: 9 + g + 0.2w − 3wg with |w| = |g| = 1: most at w −, g +: 9 + 1 − 0.2 + 3; least at w +, g +: 9 + 1 + 0.2 − 3 or w −, g −: 9 − 1 − 0.2 − 3.
    expect(spread(twisted, varies('width', 1, 1), varies('gap', 1, 1))).toEqual(
      near(4.2, 3.8, Math.hypot(1, 0.2), Math.hypot(1, 0.2)),
    )
  })

  it('ends where a parameter ends', () => {
    const via = formula({ stub: 0.1 }, ({ stub = nan }) => 10 * stub)
    expect(spread(via, varies('stub', 0.1, 0.3))).toEqual(near(1, 3, 1, 3))
  })

  it('of nothing that varies is nothing; without a number at an end it is unknown', () => {
    const broken = formula({ stub: 1 }, ({ stub = nan }) => (stub > 1 ? nan : stub))
    expect(spread(broken)).toEqual({ lowExtreme: 0, highExtreme: 0, lowThreeSigma: 0, highThreeSigma: 0 })
    expect(spread(broken, varies('stub', 1, 0.1))).toBeNull()
  })
})
