import { describe, expect, it } from 'vitest'
import type { Varied } from '../../lib/budget/builds'
import type { Computed } from '../../lib/budget/models/piece'
import { type SensitiveLine, sensitivities } from '../../lib/budget/sensitivity'
import { shuntCapacitance } from '../../lib/channel/pads'
import { formula } from './builds/lines'

const HZ = 13e9
const nan = Number.NaN
const varies = (field: string, nominal: number, tolerance: number): Varied => ({
  field,
  nominal,
  tolerance,
  min: 0,
  max: 1e6,
})
const computed = (id: string, model: Computed, ...varied: Varied[]): SensitiveLine => ({
  id,
  sign: 1,
  tolerance: null,
  computed: { model, varied },
})
const only = (line: SensitiveLine) => {
  const [first, ...more] = sensitivities([line], HZ, 100)
  if (!first || more.length > 0) throw new Error('not one')
  return first
}

describe('slopes against derivatives by hand', () => {
  it('what an overlap does not hang on moves it by 0, not by −0, which JSON does not know', () => {
    const model = formula({ length: 0.2, gap: 1 }, ({ length = nan }) => 40 * length)
    const { perUnit, toleranceDb } = only({ ...computed('a', model, varies('gap', 1, 0.1)), sign: -1 })
    expect([Object.is(perUnit, 0), Object.is(toleranceDb, 0)]).toEqual([true, true])
  })

  it('attenuation is proportional to length', () => {
    const model = formula({ length: 0.2 }, ({ length = nan }) => 40 * length)
    expect(only(computed('a', model, varies('length', 0.2, 0.01)))).toEqual({
      line: 'a',
      input: 'length',
      perUnit: expect.closeTo(40, 9),
      toleranceDb: expect.closeTo(0.4, 11),
    })
  })

  it('√f and f terms: each its own share of f', () => {
    const model = formula(
      { rootTerm: 3, linearTerm: 1 },
      ({ rootTerm = nan, linearTerm = nan }, hz) => 0.2 * (rootTerm * Math.sqrt(hz / 1e9) + linearTerm * (hz / 1e9)),
    )
    const found = sensitivities(
      [computed('a', model, varies('rootTerm', 3, 0.3), varies('linearTerm', 1, 0.3))],
      HZ,
      100,
    )
    expect(found.map(({ input }) => input)).toEqual(['linearTerm', 'rootTerm'])
    expect(found.map(({ perUnit }) => perUnit)).toEqual([
      expect.closeTo(2.6, 9),
      expect.closeTo(0.2 * Math.sqrt(13), 9),
    ])
  })

  it('a conductor’s loss over its width, k/w: −k/w²', () => {
    const model = formula({ width: 1e-4 }, ({ width = nan }) => 2e-4 / width)
    const { perUnit, toleranceDb } = only(computed('a', model, varies('width', 1e-4, 1e-5)))
    expect(perUnit / -2e4).toBeCloseTo(1, 6)
    expect(toleranceDb).toBeCloseTo(-0.2, 6)
  })

  it('a shunt capacitance, 10 log10(1 + x²) with x = ωCZ/4: (20/ln 10)·x²/((1 + x²)·C)', () => {
    const model: Computed = {
      values: { capacitance: 1e-13 },
      build: ({ capacitance = nan }) => ({
        from: 0,
        to: 1e11,
        reflects: true,
        attenuation: null,
        uncertainty: 0,
        twoPort: (hz, reference) => shuntCapacitance(capacitance, hz, reference),
      }),
    }
    const x = (2 * Math.PI * HZ * 1e-13 * 100) / 4
    const exact = ((20 / Math.LN10) * x * x) / ((1 + x * x) * 1e-13)
    for (const tolerance of [3e-14, 1e-14, 1e-17]) {
      expect(only(computed('a', model, varies('capacitance', 1e-13, tolerance))).perUnit / exact).toBeCloseTo(1, 7)
    }
  })

  it('at the end of what can be, from one side: 1 + 2s + 3s² at no stub', () => {
    const model = formula({ stub: 0 }, ({ stub = nan }) => (stub < 0 ? nan : 1 + 2 * stub + 3 * stub * stub))
    expect(only(computed('a', model, varies('stub', 0, 0.1))).perUnit).toBeCloseTo(2, 9)
    const full = { field: 'stub', nominal: 1, tolerance: 0.1, min: 0, max: 1 }
    expect(only(computed('a', model, full)).perUnit).toBeCloseTo(8, 9)
  })
})

describe('the list', () => {
  it('holds the larger side of every tolerance and every parameter, the most decibels first; an overlap counts backwards', () => {
    const model = formula({ length: 0.2, dk: 3 }, ({ length = nan }) => 40 * length)
    const lines: SensitiveLine[] = [
      { id: 'via', sign: 1, tolerance: { minusDb: 0.1, plusDb: 0.15 }, computed: null },
      { id: 'none', sign: 1, tolerance: { minusDb: 0, plusDb: 0 }, computed: null },
      { id: 'fixture', sign: -1, tolerance: { minusDb: 0.3, plusDb: 0.2 }, computed: null },
      {
        ...computed('trace', model, varies('length', 0.2, 0.005), varies('dk', 3, 0.1)),
        tolerance: { minusDb: 0.05, plusDb: 0.05 },
      },
    ]
    const found = sensitivities(lines, HZ, 100)
    expect(found.map(({ line, input }) => `${line} ${input}`)).toEqual([
      'fixture toleranceMinus',
      'trace length',
      'via tolerancePlus',
      'trace tolerancePlus',
      'trace dk',
    ])
    expect(found.map(({ toleranceDb }) => toleranceDb)).toEqual([-0.3, expect.closeTo(0.2, 12), 0.15, 0.05, 0])
    expect(found[0]?.perUnit).toBe(-1)
  })

  it('leaves out what the model gives no number for', () => {
    const model = formula({ dk: 3 }, ({ dk = nan }) => (dk > 3 ? nan : 1))
    expect(sensitivities([computed('a', model, varies('dk', 3, 0.1))], HZ, 100)).toEqual([])
  })
})
