import { describe, expect, it } from 'vitest'
import { median, robustSigma } from '../../../lib/channel/statistics'

describe('the median and the standard deviation by the median absolute deviation', () => {
  it('of an even and an odd number of values (by hand)', () => {
    expect(median([3, 1, 2])).toBe(2)
    expect(median([4, 1, 3, 2])).toBe(2.5)
    expect(median([])).toBeNaN()
  })

  it('the published example 1, 1, 2, 2, 4, 6, 9: median 2, absolute deviations 1, 1, 0, 0, 2, 4, 7, their median 1 (common textbook example)', () => {
    expect(median([1, 1, 2, 2, 4, 6, 9])).toBe(2)
    expect(robustSigma([1, 1, 2, 2, 4, 6, 9], 2)).toBeCloseTo(1.4826, 4)
  })

  it('is σ of a normal distribution: its quartiles lie 0.6745 σ from the middle (any table of the normal distribution)', () => {
    // Φ⁻¹(0.5 ± 0.25) = ±0.67449; three values at the quartiles and the middle.
    expect(robustSigma([-0.67449, 0.67449, -0.67449, 0.67449, 0], 0)).toBeCloseTo(1, 5)
  })

  it('is not moved by wild values, up to half of them', () => {
    expect(robustSigma([9, 10, 11, 10, 9, 11, 1e6], 10)).toBeCloseTo(1.4826, 4)
  })
})
