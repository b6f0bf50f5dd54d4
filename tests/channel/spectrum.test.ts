import { describe, expect, it } from 'vitest'
import {
  kneeFrequency,
  levelPower,
  spectrumOf,
  trapezoidCorners,
  trapezoidHarmonics,
} from '../../lib/channel/signalling'

const RATE = 53.125e9
const at = (...turns: number[]) => Float64Array.from(turns, (turn) => turn * RATE)

describe('the spectrum of random symbols', () => {
  // 2∫sinc²(u)·sinc²(εu) du / (1 − ε/3) by mpmath (adaptive quadrature, 25 digits).
  it.each([
    [0, [0.773695009902816, 0.888826984981305, 0.902823333580281, 0.94993933976731, 0.985829350948256]],
    [0.25, [0.832791598132751, 0.949376005623063, 0.962690023513284, 0.995205426992479, 0.999938985048429]],
    [1, [0.94982379922027, 0.995940628013024, 0.99705534595434, 0.99955756046397, 0.999989208391192]],
  ])('with edges of %f symbols holds the shares that mpmath integrates, to 1e-12', (share, expected) => {
    const { below } = spectrumOf({ symbolRate: RATE, edge: share / RATE }, at(0.5, 0.75, 1, 2, 7.3))
    expect(Array.from(below)).toEqual(expected.map((value) => expect.closeTo(value, 12)))
  })

  it('reaches the whole power in the end: 1 − 1/(π²u) of square symbols (asymptote of the sine integral)', () => {
    const { below } = spectrumOf({ symbolRate: RATE, edge: 0 }, at(1000))
    expect(1 - (below[0] as number)).toBeCloseTo(1 / (Math.PI ** 2 * 1000), 9)
  })

  it('is 1 at 0 Hz with nothing below, and has its nulls at the multiples of the symbol rate', () => {
    const { density, below } = spectrumOf({ symbolRate: RATE, edge: 5e-12 }, at(0, 1, 2))
    expect([density[0], below[0]]).toEqual([1, 0])
    expect([density[1], density[2]]).toEqual([expect.closeTo(0, 30), expect.closeTo(0, 30)])
  })

  it('gives the same share on a coarse grid and on a fine one', () => {
    const fine = spectrumOf({ symbolRate: RATE, edge: 4e-12 }, at(...Array.from({ length: 401 }, (_, k) => k / 200)))
    const coarse = spectrumOf({ symbolRate: RATE, edge: 4e-12 }, at(2))
    expect(fine.below[400]).toBeCloseTo(coarse.below[0] as number, 13)
  })

  it('refuses edges longer than a symbol, and frequencies that fall', () => {
    expect(() => spectrumOf({ symbolRate: RATE, edge: 1.01 / RATE }, at(1))).toThrow(RangeError)
    expect(() => spectrumOf({ symbolRate: RATE, edge: -1e-12 }, at(1))).toThrow(RangeError)
    expect(() => spectrumOf({ symbolRate: RATE, edge: 0 }, at(1, 0.5))).toThrow(RangeError)
    expect(() => spectrumOf({ symbolRate: RATE, edge: 0 }, Float64Array.of(Number.NaN))).toThrow(RangeError)
  })
})

describe('a periodic trapezoid', () => {
  it('has the harmonics of its own samples (discrete Fourier sum of 16,384 samples)', () => {
    const shape = { amplitude: 0.8, period: 1e-9, width: 0.4e-9, edge: 0.1e-9 }
    const samples = 16_384
    const harmonics = trapezoidHarmonics(shape, 7)
    for (let n = 1; n <= 7; n++) {
      let [re, im] = [0, 0]
      for (let k = 0; k < samples; k++) {
        const t = (k / samples) * shape.period
        const fromMiddle = Math.abs(t - shape.period / 2)
        const height = Math.min(1, Math.max(0, (shape.width / 2 + shape.edge / 2 - fromMiddle) / shape.edge))
        re += shape.amplitude * height * Math.cos((2 * Math.PI * n * k) / samples)
        im += shape.amplitude * height * Math.sin((2 * Math.PI * n * k) / samples)
      }
      expect(harmonics[n - 1]).toBeCloseTo((2 * Math.hypot(re, im)) / samples, 6)
    }
  })

  it('with edges of no length is the square wave’s 2A/(πn) of a half duty cycle (Fourier)', () => {
    const harmonics = trapezoidHarmonics({ amplitude: 1, period: 1, width: 0.5, edge: 0 }, 3)
    expect(Array.from(harmonics)).toEqual([2 / Math.PI, 0, 2 / (3 * Math.PI)].map((x) => expect.closeTo(x, 12)))
  })

  it('has its corners at 1/(πτ) and 1/(π·tr) (from memory)', () => {
    const corners = trapezoidCorners({ amplitude: 1, period: 1e-9, width: 0.5e-9, edge: 50e-12 })
    expect(corners.map((hz) => hz / 1e9)).toEqual([expect.closeTo(2 / Math.PI, 12), expect.closeTo(20 / Math.PI, 12)])
  })
})

describe('knee and levels', () => {
  it('puts the knee of a single pole where its step response says: 10 to 90 % in ln 9 time constants', () => {
    const timeConstant = 1 / (2 * Math.PI * kneeFrequency(50e-12, '10-90'))
    const rise = (from: number, to: number) => timeConstant * Math.log((1 - from) / (1 - to))
    expect(rise(0.1, 0.9)).toBeCloseTo(50e-12, 18)
    expect(1 / (2 * Math.PI * kneeFrequency(50e-12, '20-80'))).toBeCloseTo(50e-12 / Math.log(4), 18)
  })

  it('has the mean square of equally spaced levels (by hand)', () => {
    for (const levels of [2, 3, 4, 8]) {
      const each = Array.from({ length: levels }, (_, k) => (2 * k) / (levels - 1) - 1)
      expect(levelPower(levels)).toBeCloseTo(each.reduce((sum, x) => sum + x * x, 0) / levels, 12)
    }
  })
})
