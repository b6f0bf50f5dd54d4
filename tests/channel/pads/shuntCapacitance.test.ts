import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { insertionLoss, returnLoss } from '../../../lib/channel/networks'
import { padCorner, shuntCapacitance } from '../../../lib/channel/pads'

describe('a pad', () => {
  it('is |2/(2 + jωC·R/2)| and loses no power, for any capacitance and reference (random, formula by complex numbers)', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-18, max: 1e-9, noNaN: true }),
        fc.double({ min: 10, max: 200, noNaN: true }),
        fc.double({ min: 1e6, max: 3e11, noNaN: true }),
        (capacitance, reference, hz) => {
          const imaginary = 2 * Math.PI * hz * capacitance * (reference / 2)
          const s = shuntCapacitance(capacitance, Float64Array.of(hz), reference)
          expect(insertionLoss(s)[0]).toBeCloseTo(-20 * Math.log10(2 / Math.hypot(2, imaginary)), 9)
          const [r11 = 0, i11 = 0, , , r21 = 0, i21 = 0] = s
          expect(r11 ** 2 + i11 ** 2 + r21 ** 2 + i21 ** 2).toBeCloseTo(1, 12)
          // S11 = S21 − 1 of a shunt element.
          expect([r11, i11]).toEqual([expect.closeTo(r21 - 1, 12), expect.closeTo(i21, 12)])
        },
      ),
      { seed: 5 },
    )
  })

  it('is the ideal through without capacitance, and at 0 Hz', () => {
    for (const [capacitance, hz] of [
      [0, 10e9],
      [1e-12, 0],
    ] as const) {
      const s = shuntCapacitance(capacitance, Float64Array.of(hz), 100)
      expect(Array.from(s, (x) => x + 0)).toEqual([0, 0, 1, 0, 1, 0, 0, 0])
    }
    expect(padCorner(0, 100)).toBe(Number.POSITIVE_INFINITY)
  })

  it('has lost half of the power at its corner: both ends in parallel, 1/(2π·R/4·C) (by hand)', () => {
    const corner = padCorner(100e-15, 100)
    expect(corner).toBeCloseTo(1 / (2 * Math.PI * 25 * 100e-15), 0)
    const s = shuntCapacitance(100e-15, Float64Array.of(corner), 100)
    expect(insertionLoss(s)[0]).toBeCloseTo(10 * Math.log10(2), 12)
    expect(returnLoss(s, 1)[0]).toBeCloseTo(10 * Math.log10(2), 12)
  })
})
