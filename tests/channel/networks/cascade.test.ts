import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { cascade, chainOf, insertionLoss, network, transferOf } from '../../../lib/channel/networks'
import { clearCascade } from '../../bench/clear/cascade'
import { difference, found, GAIN_ROUNDING, largestGain, lossless, passive } from './random'

/** A matched lossless line, by its phase in rad. */
const line = (turn: number) =>
  Float64Array.of(0, 0, Math.cos(turn), -Math.sin(turn), Math.cos(turn), -Math.sin(turn), 0, 0)

/** An open stub across the line, by its length in wavelengths: z = −j·cot in the same impedance; S11 = −1/(1 + 2z), S21 = 1 + S11. */
const openStub = (waves: number) => {
  const z2 = (-2 * Math.cos(2 * Math.PI * waves)) / Math.sin(2 * Math.PI * waves)
  const [re, im] = [-1 / (1 + z2 * z2), z2 / (1 + z2 * z2)]
  const through = [(z2 * z2) / (1 + z2 * z2), im]
  return Float64Array.of(re, im, ...through, ...through, re, im)
}

const twoPort = fc.oneof(passive(2), lossless()).map(({ s }) => s)

/** Between two ends that reflect nearly everything in phase, rounding grows with the square of the echoes. */
const RESONANT = 1e-2

/** The chain, and how close any join of it comes to |1 − S22a·S11b| = 0. */
function joined(chain: readonly { readonly s: Float64Array }[]): { whole: Float64Array; closest: number } {
  let closest = 1
  const whole = chain.slice(1).reduce(
    (before, { s }) => {
      const [re, im] = [before[6] as number, before[7] as number]
      const [nextRe, nextIm] = [s[0] as number, s[1] as number]
      closest = Math.min(closest, Math.hypot(1 - re * nextRe + im * nextIm, re * nextIm + im * nextRe))
      return cascade([before, s], 1)
    },
    cascade([(chain[0] as { s: Float64Array }).s], 1),
  )
  return { whole, closest }
}

describe('a chain of two-ports', () => {
  it('is what the shortest clear version gives, to 1e-12 (random)', () => {
    fc.assert(
      fc.property(fc.array(twoPort, { minLength: 1, maxLength: 12 }), (chain) => {
        expect(difference(cascade(chain, 1), clearCascade(chain, 1))).toBeLessThan(1e-12)
      }),
    )
  })

  it('is the product of the ABCD matrices, where these have digits (network theory; random)', () => {
    fc.assert(
      fc.property(lossless(), lossless(), (a, b) => {
        const [left, right] = [found(chainOf(a)), found(chainOf(b))]
        const whole = found(chainOf(network(2, a.hz, cascade([a.s, b.s], 1), 50)))
        const element = (m: Float64Array, k: number) => [m[2 * k] ?? 0, m[2 * k + 1] ?? 0] as const
        for (const k of [0, 1, 2, 3]) {
          let [re, im] = [0, 0]
          for (const n of [0, 1]) {
            const [xr, xi] = element(left, 2 * (k >> 1) + n)
            const [yr, yi] = element(right, 2 * n + (k & 1))
            re += xr * yr - xi * yi
            im += xr * yi + xi * yr
          }
          const size = Math.hypot(...left) * Math.hypot(...right)
          expect(Math.hypot(re - element(whole, k)[0], im - element(whole, k)[1])).toBeLessThan(1e-12 * size)
        }
      }),
    )
  })

  it('does not depend on which join is made first (random)', () => {
    fc.assert(
      fc.property(twoPort, twoPort, twoPort, (a, b, c) => {
        const leftFirst = cascade([cascade([a, b], 1), c], 1)
        expect(difference(cascade([a, cascade([b, c], 1)], 1), leftFirst)).toBeLessThan(1e-12)
      }),
    )
  })

  it('of passive ones is passive, of lossless ones lossless, of reciprocal ones reciprocal (random)', () => {
    fc.assert(
      fc.property(fc.array(fc.oneof(passive(2, true), lossless(true)), { minLength: 1, maxLength: 8 }), (chain) => {
        const { whole, closest } = joined(chain)
        fc.pre(closest > RESONANT)
        expect(largestGain(whole)).toBeLessThan(1 + GAIN_ROUNDING)
        expect(difference(whole.subarray(2, 4), whole.subarray(4, 6))).toBeLessThan(1e-10)
      }),
    )
    fc.assert(
      fc.property(fc.array(lossless(), { minLength: 1, maxLength: 8 }), (chain) => {
        const { whole, closest } = joined(chain)
        fc.pre(closest > RESONANT)
        expect(whole.reduce((sum, x) => sum + x * x, 0)).toBeCloseTo(2, 8)
      }),
    )
  })

  it('of nothing is the ideal through, of one is a copy of it', () => {
    expect([...cascade([], 1)]).toEqual([0, 0, 1, 0, 1, 0, 0, 0])
    const one = line(1)
    const copy = cascade([one], 1)
    expect([...copy]).toEqual([...one])
    expect(copy).not.toBe(one)
  })

  it('takes the first frequencies of longer samples and refuses shorter ones', () => {
    const two = Float64Array.of(...line(1), ...line(2))
    expect([...cascade([two, line(3)], 1)]).toEqual([...cascade([line(1), line(3)], 1)])
    expect(() => cascade([two, line(3)], 2)).toThrow(new RangeError('A two-port of 1 frequencies in a chain of 2.'))
  })

  it('spoils only the frequency at which an input is not a number', () => {
    const two = Float64Array.of(...line(1), ...line(2))
    const spoilt = two.slice()
    spoilt[0] = Number.NaN
    const whole = cascade([two, spoilt, two], 2)
    expect(whole.subarray(0, 2).every(Number.isNaN)).toBe(true)
    expect(difference(whole.subarray(8), line(6))).toBeLessThan(1e-15)
  })
})

describe('the ripple of two reflections of 0.1 with a lossless line between', () => {
  it('is 0.17372 dB from crest to trough: 20 log10[(1 + 0.01)/(1 − 0.01)] (multiple reflections, textbook)', () => {
    const t = Math.sqrt(1 - 0.01)
    const discontinuity = Float64Array.of(0.1, 0, 0, t, 0, t, 0.1, 0)
    const losses = Array.from({ length: 721 }, (_, k) =>
      Number(insertionLoss(cascade([discontinuity, line((k * Math.PI) / 360), discontinuity], 1))[0]),
    )
    expect(Math.max(...losses) - Math.min(...losses)).toBeCloseTo(0.17372, 5)
  })
})

describe('an open stub of a quarter wave', () => {
  it('shorts the line: total reflection from its place, nothing through (line theory)', () => {
    const whole = cascade([line(0.3), openStub(0.25), line(0.7)], 1)
    const expected = Float64Array.of(-Math.cos(0.6), Math.sin(0.6), 0, 0, 0, 0, -Math.cos(1.4), Math.sin(1.4))
    expect(difference(whole, expected)).toBeLessThan(1e-15)
  })

  it('twice in one place is still a short, and behind a line too', () => {
    const short = Float64Array.of(-1, 0, 0, 0, 0, 0, -1, 0)
    expect(difference(cascade([openStub(0.25), openStub(0.25)], 1), short)).toBeLessThan(1e-15)
    expect(difference(cascade([openStub(0.25), line(Math.PI), openStub(0.25)], 1), short)).toBeLessThan(1e-15)
  })
})

describe('a join that reflects everything from both sides in phase (1 − S22a·S11b = 0)', () => {
  const short = Float64Array.of(-1, 0, 0, 0, 0, 0, -1, 0)

  it('of passive two-ports lets nothing through and leaves the outer reflections', () => {
    expect([...cascade([short, short], 1)]).toEqual([-1, 0, 0, 0, 0, 0, -1, 0])
    const outer = Float64Array.of(0.5, 0.1, 0, 0, 0, 0, 1, 0)
    const other = Float64Array.of(1, 0, 0, 0, 0, 0, 0.2, -0.3)
    expect([...cascade([outer, other], 1)]).toEqual([0.5, 0.1, 0, 0, 0, 0, 0.2, -0.3])
  })

  it('at one of several frequencies leaves the others; what passes as rounding passes nothing', () => {
    const nearly = Float64Array.of(0.5, 0.1, 1e-8, 0, 0, 1e-8, 1, 0)
    const other = Float64Array.of(1, 0, 0, 0, 0, 0, 0.2, -0.3)
    const whole = cascade([Float64Array.of(...line(1), ...nearly), Float64Array.of(...line(2), ...other)], 2)
    expect(difference(whole.subarray(0, 8), line(3))).toBeLessThan(1e-15)
    expect([...whole.subarray(8)]).toEqual([0.5, 0.1, 0, 0, 0, 0, 0.2, -0.3])
  })

  it('of active ones, one of which lets something through, has no steady state and is not a number', () => {
    const closed = Float64Array.of(0.5, 0, 0, 0, 0, 0, 1, 0)
    const open = Float64Array.of(1, 0, 0.5, 0, 0.5, 0, 1, 0)
    expect(cascade([closed, open], 1).every(Number.isNaN)).toBe(true)
    expect(cascade([open, Float64Array.of(1, 0, 0, 0, 0, 0, 0.5, 0)], 1).every(Number.isNaN)).toBe(true)
    const active = Float64Array.of(0, 0, 1, 0, 1, 0, 1, 0)
    const whole = cascade([active, Float64Array.of(1, 0, 0.5, 0, 0.5, 0, 0, 0)], 1)
    expect(whole.every(Number.isNaN)).toBe(true)
  })
})

describe('a two-port that passes nothing (S21 = 0)', () => {
  const isolator = network(2, Float64Array.of(0, 2.5e9), Float64Array.of(...line(1), 0, 0, 1, 0, 0, 0, 0, 0), 50)

  it('goes through the cascade', () => {
    const whole = cascade([isolator.s.subarray(8), line(1)], 1)
    expect([...whole.subarray(4, 6)].map(Math.abs)).toEqual([0, 0])
    expect(Math.hypot(...whole.subarray(2, 4))).toBeCloseTo(1, 15)
  })

  it('has neither a T nor an ABCD matrix, and the refusal says where', () => {
    const reason = 'At 2.5 GHz S21 is 0: such a two-port has no T and no ABCD matrix.'
    expect(transferOf(isolator)).toEqual({ reason })
    expect(chainOf(isolator)).toEqual({ reason })
  })
})
