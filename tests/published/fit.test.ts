import { describe, expect, it } from 'vitest'
import { type FitForm, fittedLoss, weightedDeviation } from '../../lib/channel/fitting'

const grid = (count: number, step: number) => Float64Array.from({ length: count }, (_, i) => (i + 1) * step)
const powers = (hz: number, [a0, a1, a2, a4]: readonly number[]) => {
  const f = hz / 1e9
  return (a0 ?? 0) + (a1 ?? 0) * Math.sqrt(f) + (a2 ?? 0) * f + (a4 ?? 0) * f * f
}
function fitOf(hz: Float64Array, loss: Float64Array, form: FitForm) {
  const fitted = fittedLoss(hz, loss, { form })
  if ('reason' in fitted) throw new Error(fitted.reason)
  return fitted
}

describe('fitted insertion loss', () => {
  it('of the coefficients 2.91, 0.39, 0.027 is 19.96 dB at 12.89 GHz (a published ballot comment of IEEE 802.3)', () => {
    const hz = grid(300, 50e6)
    const fitted = fitOf(
      hz,
      hz.map((f) => powers(f, [0, 2.91, 0.39, 0.027])),
      'three-term',
    )
    expect(fitted.at(12.89e9)).toBeCloseTo(19.96, 2)
    expect(fitted.coefficients[1]).toBeCloseTo(2.91, 10)
    expect(fitted.coefficients[2]).toBeCloseTo(0.39, 10)
    expect(fitted.coefficients[3]).toBeCloseTo(0.027, 10)
  })

  // The limit of 802.3ba at 5.15625 GHz, 17.04 dB, and that all three coefficients at their limits would give 20.91 dB.
  it('of the three limits of 802.3ba together is 20.91 dB at 5.15625 GHz', () => {
    const hz = grid(150, 50e6)
    const fitted = fitOf(
      hz,
      hz.map((f) => powers(f, [0, 6, 1, 0.08])),
      'three-term',
    )
    expect(fitted.at(5.15625e9)).toBeCloseTo(20.91, 2)
  })

  const hz = grid(515, 50e6)
  const clean = [0.2, 1.1, 0.35, 0.006]
  it.each(['weighted', 'four-term'] as const)(
    'of a smooth loss gives its coefficients back (%s; forms from memory of IEEE 802.3)',
    (form) => {
      const { coefficients, rmsDb } = fitOf(
        hz,
        hz.map((f) => powers(f, clean)),
        form,
      )
      for (const [k, expected] of clean.entries()) expect(coefficients[k]).toBeCloseTo(expected, 10)
      expect(rmsDb).toBeLessThan(1e-11)
    },
  )

  describe('of a loss with 0.3 dB of ripple every 2 GHz', () => {
    const rippled = hz.map((f) => powers(f, clean) + 0.3 * Math.cos((Math.PI * f) / 1e9))

    // numpy.linalg.lstsq (2.4) on the same rows.
    it.each([
      ['weighted', [0.34972684546, 0.8802597891355, 0.41893931749475, 0.00459292580139]],
      ['four-term', [0.28616031225, 0.9933371501902, 0.38078547827704, 0.0054376980398]],
      ['three-term', [0, 1.2853620811372, 0.30686693307911, 0.00655235092694]],
    ] as const)('agrees with numpy (%s; forms from memory of IEEE 802.3)', (form, expected) => {
      const { coefficients } = fitOf(hz, rippled, form)
      for (const [k, value] of expected.entries()) expect(coefficients[k]).toBeCloseTo(value, 9)
    })

    it('has these figures of deviation (numpy; form, weights and filters of FOM_ILD from memory of Annex 93A)', () => {
      const { at, deviation, rmsDb, maxDb, rippleDb } = fitOf(hz, rippled, 'weighted')
      expect(at(12.890625e9)).toBeCloseTo(9.67376, 5)
      expect(rmsDb).toBeCloseTo(0.212795, 6)
      expect(maxDb).toBeCloseTo(0.382707, 6)
      expect(rippleDb).toBeCloseTo(0.698882, 6)
      const filters = { symbolRate: 25.78125e9, riseTime: 9.6e-12, receiverCorner: 19.3359375e9 }
      expect(weightedDeviation(hz, deviation, filters)).toBeCloseTo(0.137996, 6)
    })
  })
})
