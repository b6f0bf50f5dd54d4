import { describe, expect, it } from 'vitest'
import { knownLineTwoPort } from '../../lib/channel/lines/knownAttenuation'
import { cascade, insertionLoss, returnLoss } from '../../lib/channel/networks'
import { shuntCapacitance } from '../../lib/channel/pads'

describe('discontinuities of text books', () => {
  it.each([
    [100e-15, 12.890625e9, 0.17451, 0.19846],
    [250e-15, 10e9, 0.62286, 0.36552],
  ])('D13, W10: %f F in 50 Ω at %f Hz: %f dB, |S11| %f', (capacitance, hz, db, reflected) => {
    const s = shuntCapacitance(capacitance, Float64Array.of(hz), 100)
    expect(insertionLoss(s)[0]).toBeCloseTo(db, 5)
    expect(10 ** (-(returnLoss(s, 1)[0] as number) / 20)).toBeCloseTo(reflected, 5)
  })

  it.each([
    [85, 0.11421],
    [90, 0.04812],
    [110, 0.03939],
  ])('D13: a quarter wave of %f Ω in 100 Ω costs 20 log10((Z/R + R/Z)/2) = %f dB', (impedance, db) => {
    const hz = Float64Array.of(10e9)
    const s = knownLineTwoPort({ impedance, delay: 6e-9, length: 1 / (4 * 10e9 * 6e-9) }, Float64Array.of(0), hz, 100)
    expect(insertionLoss(s)[0]).toBeCloseTo(db, 5)
  })

  it('D13: two reflections of 0.1 without loss between them ripple by 0.17372 dB, with 3 dB between by half the product', () => {
    const hz = Float64Array.of(10e9)
    // |S11| = x/√(1 + x²) = 0.1 with x = ωC·R/4.
    const capacitance = 0.1 / Math.sqrt(0.99) / (2 * Math.PI * 10e9 * 25)
    const reflector = shuntCapacitance(capacitance, hz, 100)
    const ripple = (between: number) => {
      const losses = Array.from({ length: 720 }, (_, k) => {
        const line = { impedance: 100, delay: 6e-9, length: k / 720 / (2 * 10e9 * 6e-9) }
        const middle = knownLineTwoPort(line, Float64Array.of(between), hz, 100)
        return insertionLoss(cascade([reflector, middle, reflector], 1))[0] as number
      })
      return Math.max(...losses) - Math.min(...losses)
    }
    expect(ripple(0)).toBeCloseTo(0.17372, 5)
    const product = 0.01 * 10 ** -0.3
    expect(ripple(3)).toBeCloseTo(20 * Math.log10((1 + product) / (1 - product)), 5)
  })
})
