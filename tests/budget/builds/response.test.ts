import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { drawBuilds, type Response, responseOf, type Varied } from '../../../lib/budget/builds'
import type { Computed } from '../../../lib/budget/models/piece'
import { shuntCapacitance } from '../../../lib/channel/pads'
import { normalCdf } from '../../../lib/channel/statistics/normal'
import { buildLine, formula } from './lines'

const TRIALS = 100_000
const SEED = 5
/** Percentile of the normal distribution, SciPy 1.17, norm.ppf. */
const AT_99 = 2.3263478740408408

const varies = (field: string, nominal: number, tolerance: number, bounds: Partial<Varied> = {}): Varied => ({
  field,
  nominal,
  tolerance,
  min: 0,
  max: Number.POSITIVE_INFINITY,
  ...bounds,
})

function response(computed: Computed, varied: readonly Varied[], hz = 1e10): Response {
  const found = responseOf(computed, varied, hz, 100)
  if (!found) throw new Error('no number at nominal')
  return found
}

const still = { minusDb: 0, plusDb: 0 } as const
const varying = (id: string, of: Response, rest: Parameters<typeof buildLine>[1] = {}) =>
  buildLine(id, { ...still, response: { of, times: 1 }, ...rest })
const draw = (lines: ReturnType<typeof buildLine>[], limitDb: number | null = null, lanes = 1) =>
  drawBuilds({ lines, lanes, limitDb, trials: TRIALS, seed: SEED })

/** 0.2 m at 10 dB/m: the loss is proportional to the length. */
const trace = formula({ length: 0.2, slope: 10 }, ({ length = Number.NaN, slope = Number.NaN }) => length * slope)

describe('the response of a loss to its parameters', () => {
  it('of a function of second order is that function, corners and mixed terms included (random, seed 31)', () => {
    const factor = fc.double({ min: -1, max: 1, noNaN: true })
    fc.assert(
      fc.property(
        fc.array(factor, { minLength: 9, maxLength: 9 }),
        fc.array(factor, { minLength: 3, maxLength: 3 }),
        (c, at) => {
          const of = ([x = 0, y = 0, z = 0]: readonly number[]) => {
            const terms = [x, y, z, x * x, y * y, z * z, x * y, x * z, y * z]
            return terms.reduce((sum, term, n) => sum + term * (c[n] ?? 0), 20)
          }
          const names = ['width', 'gap', 'dk']
          const nominal = [2, 1, 3]
          const model = formula({ width: 2, gap: 1, dk: 3 }, (v) => of(names.map((name) => v[name] ?? Number.NaN)))
          const found = response(
            model,
            names.map((name, n) => varies(name, nominal[n] ?? 0, 0.5)),
          )
          expect(found.degree).toBe(2)
          const moved = of(nominal.map((value, n) => value + 0.5 * (at[n] ?? 0)))
          expect(found.change(Float64Array.from(at))).toBeCloseTo(moved - of(nominal), 9)
        },
      ),
      { seed: 31 },
    )
  })

  it('of a discrete is −20 log10|S21| in the reference: a shunt capacitance (closed form)', () => {
    const pad: Computed = {
      values: { capacitance: 1e-13 },
      build: ({ capacitance = Number.NaN }) => ({
        from: 0,
        to: 1e11,
        reflects: true,
        attenuation: null,
        uncertainty: 0,
        twoPort: (hz, reference) => shuntCapacitance(capacitance, hz, reference),
      }),
    }
    // Two capacitances to ground in series across the pair, between matched lines of 100 Ω: S21 = 1/(1 + jωCZ/4).
    const loss = (capacitance: number) => 10 * Math.log10(1 + ((2 * Math.PI * 1e10 * capacitance * 100) / 4) ** 2)
    const found = response(pad, [varies('capacitance', 1e-13, 2e-14)])
    for (const share of [-1, -0.4, 0.7, 1]) {
      const exact = loss(1e-13 + share * 2e-14) - loss(1e-13)
      expect(found.change(Float64Array.of(share))).toBeCloseTo(exact, 4)
    }
  })

  it('is a polynomial of higher degree where a quadratic is off by more than 0.01 dB and 1 %', () => {
    const steep = formula({ stub: 1, dk: 2 }, ({ stub = Number.NaN, dk = Number.NaN }) => Math.exp(2 * stub) / 10 + dk)
    const exact = (stub: number, dk: number) => (Math.exp(2 * stub) - Math.exp(2)) / 10 + dk - 2
    const found = response(steep, [varies('stub', 1, 0.6), varies('dk', 2, 0.1)])
    expect(found.degree).toBeGreaterThan(2)
    for (const [x, y] of [
      [-1, 1],
      [0.3, 0.5],
      [1.4, -0.2],
    ] as const) {
      const db = exact(1 + 0.6 * x, 2 + 0.1 * y)
      expect(Math.abs(found.change(Float64Array.of(x, y)) - db)).toBeLessThan(Math.max(0.01, 0.01 * (db + 2.7)))
    }
    // Past 1.5 tolerances no polynomial is asked.
    expect(found.change(Float64Array.of(1.6, 0))).toBeCloseTo(exact(1.96, 2), 12)
  })

  it('is the model itself where no polynomial follows it', () => {
    const kinked = formula({ stub: 1 }, ({ stub = Number.NaN }) => 1 + 5 * Math.abs(stub - 1.1))
    const found = response(kinked, [varies('stub', 1, 0.9)])
    expect(found.degree).toBeNull()
    expect(found.change(Float64Array.of(0.5))).toBeCloseTo(5 * 0.35 - 0.5, 12)
  })

  it('takes its differences on one side where nominal is at the end of what can be', () => {
    const square = formula({ stub: 0 }, ({ stub = Number.NaN }) => (stub < 0 ? Number.NaN : 1 + 2 * stub + stub * stub))
    const found = response(square, [varies('stub', 0, 0.3)])
    expect(found.degree).toBe(2)
    expect(found.change(Float64Array.of(0.5))).toBeCloseTo(2 * 0.15 + 0.15 ** 2, 12)
  })

  it('is unknown where the model gives no number at nominal', () => {
    const none = formula({ dk: 3 }, () => Number.NaN)
    expect(responseOf(none, [varies('dk', 3, 0.1)], 1e10, 100)).toBeNull()
  })
})

describe(`builds with varied parameters, seed ${SEED}`, () => {
  const at99 = (builds: ReturnType<typeof draw>) => builds.percentiles.p99 ?? { db: Number.NaN, error: 0 }
  const expect99 = (builds: ReturnType<typeof draw>, db: number) =>
    expect(Math.abs(at99(builds).db - db)).toBeLessThan(4 * at99(builds).error)
  const slope = () => response(trace, [varies('slope', 10, 0.9)])

  it('a limit is three standard deviations: 9 % of 2 dB is σ = 0.06 dB', () => {
    expect99(draw([varying('a', slope())]), 2 + AT_99 * 0.06)
  })

  it('the same parameter of one group moves together, another or that of another group apart', () => {
    const other = response(trace, [varies('length', 0.2, 0.018)])
    expect99(draw([varying('a', slope(), { group: 'lot' }), varying('b', slope(), { group: 'lot' })]), 4 + AT_99 * 0.12)
    expect99(
      draw([varying('a', slope(), { group: 'lot' }), varying('b', slope(), { group: 'x' })]),
      4 + AT_99 * Math.hypot(0.06, 0.06),
    )
    expect99(
      draw([varying('a', slope(), { group: 'lot' }), varying('b', other, { group: 'lot' })]),
      4 + AT_99 * Math.hypot(0.06, 0.06),
    )
  })

  it('a stub is drawn for every lane, a laminate once for all of a build', () => {
    const via = formula({ stub: 1, dk: 4 }, ({ stub = Number.NaN, dk = Number.NaN }) => (stub * dk) / 2)
    const drill = varying('a', response(via, [varies('stub', 1, 0.15)]), { group: 'lot' })
    const laminate = varying('a', response(via, [varies('dk', 4, 0.6)]), { group: 'lot' })
    const one = normalCdf(1.5)
    const share = (line: typeof drill) => draw([line], 2.15, 8).fractionInside?.value ?? Number.NaN
    const deviation = Math.sqrt((one * (1 - one)) / TRIALS)
    expect(Math.abs(share(laminate) - one)).toBeLessThan(4 * deviation)
    expect(Math.abs(share(drill) - one ** 8)).toBeLessThan(4 * Math.sqrt((one ** 8 * (1 - one ** 8)) / TRIALS))
    expect(draw([drill, laminate], null, 2)).toMatchObject({ common: ['lot: dk'], independent: ['a: stub'] })
  })

  it('a lane twice as long moves twice as much', () => {
    const of = slope()
    const lanes = new Map([[2, { ...buildLine('a', still), nominalDb: 4, response: { of, times: 2 } }]])
    expect99(draw([varying('a', of, { group: 'lot', lanes })], null, 2), 4 + AT_99 * 0.12)
  })

  it('a steep one goes through its polynomial, a kinked one through the model: percentiles are those of the parameter', () => {
    const steep = formula({ stub: 1 }, ({ stub = Number.NaN }) => Math.exp(2 * stub))
    const of = response(steep, [varies('stub', 1, 0.9)])
    expect(of.degree).toBeGreaterThan(2)
    expect99(draw([varying('a', of)]), 2 + Math.exp(2 * (1 + 0.3 * AT_99)) - Math.exp(2))
    const kinked = formula({ stub: 1 }, ({ stub = Number.NaN }) => (stub < 1 ? 1 : 1 + 5 * (stub - 1)))
    const model = response(kinked, [varies('stub', 1, 0.9)])
    expect(model.degree).toBeNull()
    expect99(draw([varying('a', model)]), 2 + 5 * 0.3 * AT_99)
  })

  it('a stub is never shorter than nothing: as many builds have none as the distribution has below', () => {
    const via = formula({ stub: 0.1 }, ({ stub = Number.NaN }) => 10 * stub)
    const of = response(via, [varies('stub', 0.1, 0.3)])
    const builds = draw([varying('a', of, { nominalDb: 1 })], 1e-9)
    const below = normalCdf(-1)
    expect(Math.abs((builds.fractionInside?.value ?? 0) - below)).toBeLessThan(
      4 * Math.sqrt((below * (1 - below)) / TRIALS),
    )
  })

  it('builds that the model gives no number for are counted, are not inside, and take the mean with them', () => {
    const broken = formula({ stub: 1 }, ({ stub = Number.NaN }) => (stub > 1.2 ? Number.NaN : stub))
    const builds = draw([varying('a', response(broken, [varies('stub', 1, 0.6)]))], 9)
    const beyond = 1 - normalCdf(1)
    expect(Math.abs(builds.unknown / TRIALS - beyond)).toBeLessThan(4 * Math.sqrt((beyond * (1 - beyond)) / TRIALS))
    expect(builds).toMatchObject({ meanDb: null, fractionInside: { value: 1 - builds.unknown / TRIALS } })
    expect(builds.percentiles.p50).not.toBeNull()
    expect(builds.percentiles.p99).toBeNull()
  })
})
