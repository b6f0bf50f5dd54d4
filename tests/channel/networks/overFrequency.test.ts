import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  dissipatedLoss,
  fromChain,
  groupDelay,
  insertionLoss,
  network,
  renormalise,
  resample,
  returnLoss,
  tooCoarse,
  unwrappedPhase,
} from '../../../lib/channel/networks'
import { difference, found, lossless, passive } from './random'

/** A matched line of a delay in s and a loss in dB per √GHz. */
function line(hz: Float64Array, delay: number, loss = 0) {
  const samples = new Float64Array(8 * hz.length)
  for (const [k, f] of hz.entries()) {
    const size = 10 ** ((-loss * Math.sqrt(f / 1e9)) / 20)
    const turn = -2 * Math.PI * f * delay
    samples.set([size * Math.cos(turn), size * Math.sin(turn)], 8 * k + 2)
    samples.set([size * Math.cos(turn), size * Math.sin(turn)], 8 * k + 4)
  }
  return network(2, hz, samples, 100)
}

const grid = (from: number, step: number, count: number) =>
  Float64Array.from({ length: count }, (_, k) => from + k * step)

describe('a network at other frequencies', () => {
  it('is exact on the points, in any order, and bit by bit (random)', () => {
    fc.assert(
      fc.property(fc.array(passive(3), { minLength: 2, maxLength: 20 }), (points) => {
        const given = network(3, grid(0, 1e8, points.length), Float64Array.from(points.flatMap(({ s }) => [...s])), 50)
        expect(found(resample(given, given.hz)).s).toEqual(given.s)
        const backwards = found(resample(given, given.hz.slice().reverse()))
        expect(backwards.s.subarray(0, 18)).toEqual(given.s.subarray(given.s.length - 18))
        expect(backwards.s.subarray(-18)).toEqual(given.s.subarray(0, 18))
      }),
    )
  })

  it('keeps the magnitude and the delay of a long line between points 80° apart (by theory)', () => {
    const delay = 80 / 360 / 1e8
    const between = grid(1.37e8, 1.7e7, 500)
    const found1 = found(resample(line(grid(1e8, 1e8, 100), delay), between))
    expect(difference(found1.s, line(between, delay).s)).toBeLessThan(1e-11)
    // A straight line between the two points would lose 20 log10 cos 40° = 2.3 dB in the middle.
    expect(Math.max(...insertionLoss(found1.s))).toBeLessThan(1e-12)
  })

  it('is at most Δ²/70 dB off where the loss changes by Δ dB from point to point (by hand)', () => {
    const hz = Float64Array.of(1e9, 2e9)
    const samples = Float64Array.of(0, 0, 1, 0, 1, 0, 0, 0, 0, 0, 10 ** -0.05, 0, 10 ** -0.05, 0, 0, 0)
    const [loss = 0] = insertionLoss(found(resample(network(2, hz, samples, 50), Float64Array.of(1.5e9))).s)
    expect(0.5 - loss).toBeGreaterThan(0.9 / 70)
    expect(0.5 - loss).toBeLessThan(1.1 / 70)
  })

  it('goes straight from 0 and through a null, where the phase jumps', () => {
    const reflection = Float64Array.of(0, 0, 0.1, 0.02, 0.02, 0.004, -0.02, -0.004)
    const given = network(1, Float64Array.of(0, 1e9, 2e9, 3e9), reflection, 50)
    const { s } = found(resample(given, Float64Array.of(0.5e9, 2.5e9)))
    expect(difference(s, Float64Array.of(0.05, 0.01, 0, 0))).toBeLessThan(1e-17)
  })

  it('is nothing outside of the data', () => {
    const given = line(grid(1e7, 1e7, 10), 1e-9)
    const reason = 'The data run from 10 MHz to 100 MHz; 101 MHz lies outside.'
    expect(resample(given, Float64Array.of(2e7, 1.01e8))).toEqual({ reason })
    expect(resample(given, Float64Array.of(0))).toEqual({
      reason: 'The data run from 10 MHz to 100 MHz; 0 Hz lies outside.',
    })
    expect('reason' in resample(given, Float64Array.of(Number.NaN))).toBe(true)
    expect(resample(line(new Float64Array(0), 0), given.hz)).toEqual({ reason: 'The file has no frequencies.' })
  })
})

describe('points too far apart', () => {
  it('are those between which S21 turns by more than 90°; the widest is named', () => {
    const hz = Float64Array.of(0, 1e9, 2e9, 3.2e9, 4e9)
    expect(tooCoarse(hz, line(hz, 74 / 360 / 1e9).s)).toBeNull()
    const step = tooCoarse(hz, line(hz, 91 / 360 / 1e9).s)
    expect(step).toMatchObject({ fromHz: 2e9, toHz: 3.2e9 })
    expect(step?.turn).toBeCloseTo((1.2 * 91 * Math.PI) / 180, 12)
  })
})

describe('phase and delay of S21', () => {
  const hz = grid(1e7, 1e7, 400)

  it('turns without jumps over many periods (by theory)', () => {
    const phase = unwrappedPhase(line(hz, 3e-9, 2).s)
    for (const [k, f] of hz.entries()) expect(phase[k]).toBeCloseTo(-2 * Math.PI * f * 3e-9, 9)
  })

  it('is the delay of a line at every point, both ends too', () => {
    for (const delay of groupDelay(hz, line(hz, 3e-9, 2).s)) expect(delay * 1e9).toBeCloseTo(3, 9)
  })

  it('is the slope of a phase that bends: central differences are exact for a parabola', () => {
    const samples = new Float64Array(8 * hz.length)
    for (const [k, f] of hz.entries()) {
      const turn = -2 * Math.PI * (f * 1e-9 + (f * f * 1e-19) / 2)
      samples.set([Math.cos(turn), Math.sin(turn)], 8 * k + 4)
    }
    const delay = groupDelay(hz, samples)
    for (let k = 1; k < hz.length - 1; k++) expect((delay[k] ?? 0) * 1e9).toBeCloseTo(1 + (hz[k] ?? 0) * 1e-10, 9)
  })

  it('is unknown of one frequency alone', () => {
    expect(groupDelay(hz.subarray(0, 1), line(hz.subarray(0, 1), 1e-9).s)[0]).toBeNaN()
  })
})

describe('losses of a two-port, positive dB', () => {
  const at = (hz: number, abcd: readonly number[], reference: number) =>
    found(fromChain(Float64Array.of(hz), Float64Array.from(abcd), Float64Array.of(reference, 0, reference, 0))).s

  it.each([
    [100e-15, 12.890625e9, 0.17451, 0.19846],
    [250e-15, 10e9, 0.62286, 0.36552],
  ])('%f F across 50 Ω at %f Hz (physics.md W10, recomputed there)', (capacitance, hz, loss, reflection) => {
    const samples = at(hz, [1, 0, 0, 0, 0, 2 * Math.PI * hz * capacitance, 1, 0], 50)
    expect(insertionLoss(samples)[0]).toBeCloseTo(loss, 5)
    for (const port of [1, 2] as const)
      expect(10 ** (-(returnLoss(samples, port)[0] ?? 0) / 20)).toBeCloseTo(reflection, 5)
    expect(dissipatedLoss(samples)[0]).toBeCloseTo(0, 12)
  })

  it.each([
    [85, 0.11421],
    [90, 0.04812],
    [110, 0.03939],
  ])('a lossless quarter wave of %f Ω in 100 Ω: 20 log10[(Z/R + R/Z)/2] = %f dB, all of it reflected', (ohm, loss) => {
    const quarter = network(2, Float64Array.of(1e9), Float64Array.of(0, 0, 0, -1, 0, -1, 0, 0), ohm)
    const { s } = renormalise(quarter, 100)
    expect(insertionLoss(s)[0]).toBeCloseTo(loss, 5)
    expect(dissipatedLoss(s)[0]).toBeCloseTo(0, 12)
  })

  it('50 Ω in series in 50 Ω: 3.52 dB, of which half the power that goes in is lost inside: 3.01 dB (circuit theory)', () => {
    const samples = at(1e9, [1, 0, 50, 0, 0, 0, 1, 0], 50)
    expect(insertionLoss(samples)[0]).toBeCloseTo(20 * Math.log10(1.5), 12)
    expect(returnLoss(samples, 1)[0]).toBeCloseTo(20 * Math.log10(3), 12)
    expect(dissipatedLoss(samples)[0]).toBeCloseTo(10 * Math.log10(2), 12)
  })

  it('nothing is dissipated of a lossless two-port (random)', () => {
    fc.assert(
      fc.property(lossless(), ({ s }) => {
        expect(dissipatedLoss(s)[0]).toBeCloseTo(0, 9)
      }),
    )
  })

  it('is infinite where nothing comes back or through, and unknown where no power goes in', () => {
    const short = Float64Array.of(-1, 0, 0, 0, 0, 0, 0, 0)
    expect(insertionLoss(short)[0]).toBe(Number.POSITIVE_INFINITY)
    expect(returnLoss(short, 2)[0]).toBe(Number.POSITIVE_INFINITY)
    expect(returnLoss(short, 1)[0]).toBeCloseTo(0, 15)
    expect(dissipatedLoss(short)[0]).toBeNaN()
  })
})
