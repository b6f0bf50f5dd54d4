import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  admittanceOf,
  chainOf,
  fromAdmittance,
  fromChain,
  fromImpedance,
  fromTransfer,
  impedanceOf,
  type Network,
  network,
  renormalise,
  transferOf,
  type Waves,
} from '../../../lib/channel/networks'
import { difference, found, GAIN_ROUNDING, largestGain, lossless, passive, references } from './random'

const anyPorts = fc.constantFrom(1, 2, 3, 4, 8, 16)
const anyNetwork = anyPorts.chain((ports) => passive(ports))

describe('conversions at complex references of each port', () => {
  it('S to Z and to Y and back, 1 to 16 ports (random)', () => {
    fc.assert(
      fc.property(anyNetwork, (given) => {
        const { hz, s, reference } = given
        expect(difference(found(fromImpedance(hz, found(impedanceOf(given)), reference)).s, s)).toBeLessThan(1e-12)
        expect(difference(found(fromAdmittance(hz, found(admittanceOf(given)), reference)).s, s)).toBeLessThan(1e-12)
      }),
    )
  })

  it('S to T and to ABCD and back (random)', () => {
    fc.assert(
      fc.property(lossless(), references(2), ({ hz, s }, reference) => {
        const given = { ports: 2, hz, s, reference }
        expect(difference(found(fromTransfer(hz, found(transferOf(given)), reference)).s, s)).toBeLessThan(1e-13)
        expect(difference(found(fromChain(hz, found(chainOf(given)), reference)).s, s)).toBeLessThan(1e-12)
      }),
    )
  })

  it('one port: S11 = (Z − Z0*)/(Z + Z0) (Kurokawa 1965)', () => {
    const load = found(fromImpedance(Float64Array.of(1e9), Float64Array.of(30, 20), Float64Array.of(50, 10)))
    // (30 + 20j − 50 + 10j)/(80 + 30j) = (−20 + 30j)(80 − 30j)/7300
    expect(load.s[0]).toBeCloseTo((-1600 + 900) / 7300, 15)
    expect(load.s[1]).toBeCloseTo((600 + 2400) / 7300, 15)
    const conjugate = found(fromImpedance(Float64Array.of(1e9), Float64Array.of(50, -10), Float64Array.of(50, 10)))
    expect(difference(conjugate.s, Float64Array.of(0, 0))).toBeLessThan(1e-16)
  })

  it('an impedance in series and one across the line are these matrices (circuit theory)', () => {
    const [hz, reference] = [Float64Array.of(1e9), Float64Array.of(50, 0, 50, 0)]
    const across = found(fromChain(hz, Float64Array.of(1, 0, 0, 0, 0.01, 0.02, 1, 0), reference))
    // 1/(0.01 + 0.02j) = 20 − 40j
    const z = Float64Array.of(20, -40, 20, -40, 20, -40, 20, -40)
    expect(difference(found(impedanceOf(across)), z)).toBeLessThan(1e-11)
    const series = found(fromChain(hz, Float64Array.of(1, 0, 20, -40, 0, 0, 1, 0), reference))
    const y = Float64Array.of(0.01, 0.02, -0.01, -0.02, -0.01, -0.02, 0.01, 0.02)
    expect(difference(found(admittanceOf(series)), y)).toBeLessThan(1e-15)
    // S11 = Z/(Z + 2·R) and 1 − S11 of a series impedance.
    expect(series.s[0]).toBeCloseTo((20 * 120 + 40 * 40) / (120 ** 2 + 40 ** 2), 15)
    expect(series.s[4]).toBeCloseTo(1 - (20 * 120 + 40 * 40) / (120 ** 2 + 40 ** 2), 15)
  })

  it('an ideal through has neither of both, an active negative resistor no S', () => {
    const through = network(2, Float64Array.of(0), Float64Array.of(0, 0, 1, 0, 1, 0, 0, 0), 50)
    expect(impedanceOf(through)).toEqual({ reason: 'At 0 Hz the network has no impedance matrix.' })
    expect(admittanceOf(through)).toEqual({ reason: 'At 0 Hz the network has no admittance matrix.' })
    const [hz, reference] = [Float64Array.of(1e9), Float64Array.of(50, 0)]
    const reason = 'At 1 GHz the matrix describes no network.'
    expect(fromImpedance(hz, Float64Array.of(-50, 0), reference)).toEqual({ reason })
  })

  it('names the first frequency without one', () => {
    const [through, line] = [
      [0, 0, 1, 0, 1, 0, 0, 0],
      [0, 0, Math.cos(1), -Math.sin(1), Math.cos(1), -Math.sin(1), 0, 0],
    ]
    const reasonOf = (...points: readonly (readonly number[])[]) =>
      impedanceOf(network(2, Float64Array.of(1e9, 2e9, 3e9), Float64Array.from(points.flat()), 50))
    expect(reasonOf(line, through, through)).toEqual({ reason: 'At 2 GHz the network has no impedance matrix.' })
    expect(reasonOf(through, line, through)).toEqual({ reason: 'At 1 GHz the network has no impedance matrix.' })
    expect(reasonOf(line, line, line)).toHaveLength(24)
  })

  it('takes no other number of ports for a T matrix', () => {
    expect(() => transferOf(network(1, Float64Array.of(1), Float64Array.of(0, 0), 50))).toThrow(RangeError)
  })
})

describe('renormalisation', () => {
  const withReferences = anyPorts.chain((ports) => fc.tuple(passive(ports), references(ports)))

  it.each(['power', 'pseudo', 'travelling'] satisfies Waves[])(
    'there and back in %s waves, 1 to 16 ports (random)',
    (waves) => {
      fc.assert(
        fc.property(withReferences, ([given, reference]) => {
          const there = renormalise(given, reference, waves)
          const back = renormalise(there, given.reference, waves)
          expect(difference(back.s, given.s)).toBeLessThan(1e-12)
          expect([...back.reference]).toEqual([...given.reference])
        }),
      )
    },
  )

  it('is the same as through the impedance matrix, where there is one (network theory; random)', () => {
    fc.assert(
      fc.property(withReferences, ([given, reference]) => {
        const throughZ = found(fromImpedance(given.hz, found(impedanceOf(given)), reference))
        expect(difference(renormalise(given, reference).s, throughZ.s)).toBeLessThan(1e-11)
      }),
    )
  })

  it('keeps passive passive, lossless lossless and reciprocal reciprocal at complex references (random)', () => {
    fc.assert(
      fc.property(passive(2, true), references(2), (given, reference) => {
        const { s } = renormalise(given, reference)
        expect(largestGain(s)).toBeLessThan(1 + GAIN_ROUNDING)
        expect(difference(s.subarray(2, 4), s.subarray(4, 6))).toBeLessThan(1e-13)
      }),
    )
    fc.assert(
      fc.property(lossless(), references(2), (given, reference) => {
        expect(renormalise(given, reference).s.reduce((sum, x) => sum + x * x, 0)).toBeCloseTo(2, 11)
      }),
    )
  })

  it('at real references is the same in all three kinds of waves', () => {
    fc.assert(
      fc.property(lossless(), (given) => {
        const to = Float64Array.of(42.5, 0, 85, 0)
        const { s } = renormalise(given, to)
        expect(difference(renormalise(given, to, 'pseudo').s, s)).toBeLessThan(1e-14)
        expect(difference(renormalise(given, to, 'travelling').s, s)).toBeLessThan(1e-14)
      }),
    )
  })

  it('changes nothing where the reference is the same, and refuses one without positive real part', () => {
    const given: Network = network(1, Float64Array.of(1e9), Float64Array.of(0.5, 0), 50)
    expect(renormalise(given, 50)).toBe(given)
    const refused = new RangeError('A reference must have a positive real part.')
    expect(() => renormalise(given, 0)).toThrow(refused)
    expect(() => renormalise(given, Number.NaN)).toThrow(refused)
    for (const own of [0, -50]) {
      expect(() => renormalise(network(1, given.hz, given.s, own), 50)).toThrow(refused)
    }
    expect(() => renormalise(given, Float64Array.of(50, 0, 50, 0))).toThrow(new RangeError('2 references for 1 ports.'))
  })

  it('is not a number at a frequency where an active network has no such waves, and right at the others', () => {
    // −75 Ω: (−75 − 50)/(−75 + 50) = 5; in 75 Ω the incoming wave vanishes. 25 Ω is −1/3 in 50 Ω and −1/2 in 75 Ω.
    const given = network(1, Float64Array.of(1e9, 2e9), Float64Array.of(5, 0, -1 / 3, 0), 50)
    const { s } = renormalise(given, 75)
    expect(s[0]).toBeNaN()
    expect(s[2]).toBeCloseTo(-0.5, 15)
  })
})
