import { describe, expect, it } from 'vitest'
import {
  kneeFrequency,
  levelPower,
  spectrumOf,
  trapezoidCorners,
  trapezoidHarmonics,
} from '../../lib/channel/signalling'

describe('spectra of text books', () => {
  it('D2: of random symbols 0.77370 of the power lies below half the symbol rate, 0.88883, 0.90282, 0.94994 below 0.75, 1 and 2 of it', () => {
    // sinc² whatever the number of levels (lait.fe.uni-lj.si, slide 102); shares by Simpson's rule with 20,000 steps.
    const hz = Float64Array.of(0.5, 0.75, 1, 2)
    const { density, below } = spectrumOf({ symbolRate: 1, edge: 0 }, hz)
    for (const [k, share] of [0.7737, 0.88883, 0.90282, 0.94994].entries())
      expect(Math.abs((below[k] as number) - share)).toBeLessThan(1e-5)
    expect(10 * Math.log10(density[0] as number)).toBeCloseTo(-3.9224, 4)
  })

  it('a trapezoid of 1 V, 1 ns, 0.5 ns and 50 ps: 0.63400, 0.20444, 0.11463, 0.07370 V; corners 0.6366 and 6.366 GHz (Paul, from memory)', () => {
    const shape = { amplitude: 1, period: 1e-9, width: 0.5e-9, edge: 50e-12 }
    const harmonics = trapezoidHarmonics(shape, 7)
    for (const [n, volts] of [
      [1, 0.634],
      [3, 0.20444],
      [5, 0.11463],
      [7, 0.0737],
    ] as const)
      expect(Math.abs((harmonics[n - 1] as number) - volts)).toBeLessThan(1e-5)
    expect(trapezoidCorners(shape).map((hz) => hz / 1e9)).toEqual([expect.closeTo(0.6366, 4), expect.closeTo(6.366, 3)])
  })

  it('knees of 50 ps: 0.35 and 0.22 over the rise time, and 10 GHz by the rule of 0.5 (newbedev.com, why f_knee)', () => {
    expect(kneeFrequency(50e-12, '10-90') * 50e-12).toBeCloseTo(0.3497, 4)
    expect(kneeFrequency(50e-12, '20-80') * 50e-12).toBeCloseTo(0.22064, 5)
    expect(kneeFrequency(50e-12, 'rule')).toBeCloseTo(10e9, 0)
  })

  it('mean power of 2, 3, 4, 8 levels: 1, 0.6667, 0.5556, 0.4286 (from memory)', () => {
    expect([2, 3, 4, 8].map(levelPower)).toEqual([1, 0.6667, 0.5556, 0.4286].map((x) => expect.closeTo(x, 4)))
  })
})
