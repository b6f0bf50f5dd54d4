import { describe, expect, it } from 'vitest'
import { type FitOptions, fittedLoss } from '../../../lib/channel/fitting'

const GRID = Float64Array.from({ length: 200 }, (_, i) => (i + 1) * 0.1e9)
const smooth = (hz: number) => 0.3 + 0.9 * Math.sqrt(hz / 1e9) + (0.4 + 0.004 * (hz / 1e9)) * (hz / 1e9)
const LOSS = GRID.map(smooth)

function fitOf(hz: Float64Array, loss: Float64Array, options: FitOptions = { form: 'weighted' }) {
  const fitted = fittedLoss(hz, loss, options)
  if ('reason' in fitted) throw new Error(fitted.reason)
  return fitted
}
const reason = (...given: Parameters<typeof fittedLoss>) => {
  const fitted = fittedLoss(...given)
  return 'reason' in fitted ? fitted.reason : 'none'
}

describe('a fitted loss', () => {
  it('is known inside the band that was fitted and nowhere else', () => {
    const fitted = fitOf(GRID, LOSS, { form: 'weighted', from: 1e9, to: 10e9 })
    expect([fitted.hz[0], fitted.hz.at(-1), fitted.deviation.length]).toEqual([1e9, 10e9, 91])
    expect(fitted.at(5.05e9)).toBeCloseTo(smooth(5.05e9), 10)
    expect([fitted.at(0.99e9), fitted.at(10.1e9)]).toEqual([null, null])
    expect(fitted.at(1e9)).toBeCloseTo(smooth(1e9), 10)
    expect(fitted.at(10e9)).toBeCloseTo(smooth(10e9), 10)
  })

  it('tells how far the loss strays: ±0.1 dB in turn, by hand', () => {
    const stray = LOSS.map((loss, i) => loss + (i % 2 ? 0.1 : -0.1))
    const fitted = fitOf(GRID, stray)
    expect(fitted.rmsDb).toBeCloseTo(0.1, 3)
    expect(fitted.rippleDb).toBeGreaterThan(0.2)
    expect(fitted.rippleDb).toBeLessThan(0.23)
    expect(fitted.maxDb).toBeGreaterThan(0.1)
  })

  it('strays as far where the loss dips as where it peaks: the unweighted fit is linear in the loss', () => {
    const strays = (by: number) => {
      const loss = LOSS.slice()
      loss[120] = (loss[120] as number) + by
      return fitOf(GRID, loss, { form: 'four-term' })
    }
    const [peak, dip] = [strays(1), strays(-1)]
    expect(peak.maxDb).toBeGreaterThan(0.9)
    expect(dip.maxDb).toBeCloseTo(peak.maxDb, 10)
    expect(dip.rippleDb).toBeCloseTo(peak.rippleDb, 10)
  })

  it('takes two points for each term', () => {
    expect(fitOf(GRID, LOSS, { form: 'weighted', to: 0.8e9 }).hz.length).toBe(8)
    expect(fitOf(GRID, LOSS, { form: 'three-term', from: 19.5e9 }).hz.length).toBe(6)
  })

  it('weighs a row by 10^(−IL/20): an outlier 60 dB down moves nothing (by hand, 4e-3 of the unweighted pull)', () => {
    const spoilt = LOSS.slice()
    spoilt[150] = 60
    const moved = (form: FitOptions['form']) =>
      Math.abs((fitOf(GRID, spoilt, { form }).at(15.1e9) ?? 0) - smooth(15.1e9))
    expect(moved('weighted')).toBeLessThan(1e-3)
    expect(moved('four-term')).toBeGreaterThan(0.3)
  })

  it('takes 0 Hz, where only the constant counts', () => {
    const hz = Float64Array.of(0, ...GRID)
    expect(fitOf(hz, hz.map(smooth)).at(0)).toBeCloseTo(0.3, 9)
  })

  it('leaves what it was given as it was', () => {
    const copy = LOSS.slice()
    fitOf(GRID, LOSS)
    expect(LOSS).toEqual(copy)
  })

  it('is refused in a sentence', () => {
    expect(reason(GRID, LOSS, { form: 'weighted', to: 0.7e9 })).toBe(
      'A fit of 4 terms needs at least 8 points; the band has 7.',
    )
    expect(reason(GRID, LOSS, { form: 'three-term', from: 19.6e9 })).toBe(
      'A fit of 3 terms needs at least 6 points; the band has 5.',
    )
    const holed = LOSS.slice()
    holed[9] = Number.POSITIVE_INFINITY
    expect(reason(GRID, holed, { form: 'weighted' })).toBe(
      'The loss at 1.00000 GHz is not a finite number of decibels.',
    )
    const narrow = Float64Array.from({ length: 20 }, (_, i) => 10e9 + i)
    expect(reason(narrow, narrow.map(smooth), { form: 'weighted' })).toBe(
      'The band is too narrow to tell the terms of the fit apart.',
    )
    expect(reason(new Float64Array(0), new Float64Array(0), { form: 'weighted' })).toContain('the band has 0')
  })
})
