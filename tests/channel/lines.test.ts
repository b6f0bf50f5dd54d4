import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { discreteLoss, moveUniformLoss, skewLoss, twoTermAttenuation } from '../../lib/channel/lines'

describe('a loss moved in frequency', () => {
  it('holds within ±2 % of its frequency as it stands, for lines and discretes', () => {
    for (const hz of [9.8e9, 10e9, 10.2e9]) {
      expect(moveUniformLoss(4, 10e9, hz)).toEqual({ db: 4, spreadDb: 0, by: 'stated' })
      expect(discreteLoss(4, 10e9, hz)).toEqual({ db: 4, spreadDb: 0, by: 'stated' })
    }
    expect(discreteLoss(4, 10e9, 10.21e9)).toBeNull()
    expect(discreteLoss(4, 10e9, 9.79e9)).toBeNull()
  })

  it('moves a line silently from 0.9 to 1.1, between the two laws (by hand)', () => {
    const moved = moveUniformLoss(4, 10e9, 11e9)
    expect(moved?.db).toBeCloseTo((4 * 1.1 + 4 * Math.sqrt(1.1)) / 2, 12)
    expect(moved?.spreadDb).toBe(0)
    expect(moveUniformLoss(4, 10e9, 9e9)?.spreadDb).toBe(0)
    expect(moveUniformLoss(4, 10e9, 11.01e9)?.spreadDb).toBeGreaterThan(0.1)
    expect(moveUniformLoss(4, 10e9, 8.99e9)?.spreadDb).toBeGreaterThan(0.09)
  })

  it('moves it from 0.67 to 1.5 with the spread, and no further (by hand)', () => {
    const moved = moveUniformLoss(4, 10e9, 15e9)
    expect(moved?.db).toBeCloseTo((6 + 4 * Math.sqrt(1.5)) / 2, 12)
    expect(moved?.spreadDb).toBeCloseTo((6 - 4 * Math.sqrt(1.5)) / 2, 12)
    expect(moveUniformLoss(4, 10e9, 6.7e9)?.spreadDb).toBeCloseTo((4 * Math.sqrt(0.67) - 4 * 0.67) / 2, 12)
    expect(moveUniformLoss(4, 10e9, 15.01e9)).toBeNull()
    expect(moveUniformLoss(4, 10e9, 6.69e9)).toBeNull()
  })

  it('contains the loss of any line of √f and f terms within its spread (random)', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 5, noNaN: true }),
        fc.double({ min: 0, max: 5, noNaN: true }),
        fc.double({ min: 0.67, max: 1.5, noNaN: true }),
        (root, linear, ratio) => {
          const moved = moveUniformLoss(twoTermAttenuation(root, linear, 10e9), 10e9, ratio * 10e9)
          if (moved === null || moved.spreadDb === 0) return true
          return Math.abs(twoTermAttenuation(root, linear, ratio * 10e9) - moved.db) <= moved.spreadDb + 1e-12
        },
      ),
    )
  })
})

describe('two terms', () => {
  it('2.91 √f + 0.39 f at 12.89 GHz (a ballot comment’s fit without its f² term; 15.475 by hand)', () => {
    expect(twoTermAttenuation(2.91, 0.39, 12.89e9)).toBeCloseTo(2.91 * 3.590265 + 0.39 * 12.89, 4)
  })
})

describe('skew inside the pair', () => {
  it('2 ps at 26.5625 GHz cost 0.122 dB (−20 log10 cos(π f Δt), by hand)', () => {
    expect(skewLoss(2e-12, 26.5625e9)).toBeCloseTo(0.1215, 3)
    expect(skewLoss(-2e-12, 26.5625e9)).toBe(skewLoss(2e-12, 26.5625e9))
  })

  it('a third of a period halves the signal: 6.02 dB', () => {
    expect(skewLoss(1 / 3e9, 1e9)).toBeCloseTo(20 * Math.log10(2), 9)
  })

  it('is nothing without skew and unknown from half a period on', () => {
    expect(skewLoss(0, 10e9)).toBe(0)
    expect(skewLoss(50e-12, 10e9)).toBeNull()
  })
})
