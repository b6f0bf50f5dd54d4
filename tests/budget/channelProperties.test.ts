import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { forgetSamples } from '../../lib/budget/cascade/samples'
import { evaluate, WHOLE } from '../../lib/budget/evaluate'
import type { Evaluation, EvidenceData } from '../../lib/budget/evaluation'
import { forgetLosses } from '../../lib/budget/lossMemory'
import type { Budget, BudgetFile } from '../../lib/budget/schema'
import { ANY_EVIDENCE, anyChannel } from './anyBudget'
import { line, link } from './links'
import { evidenceOf, fileLine, fileOf, type Section, steps } from './sections'

type LineFile = NonNullable<BudgetFile['lines']>[string]

const FULL = { ...WHOLE, builds: 40 }
function fresh(budget: Budget, read: EvidenceData): Evaluation {
  forgetLosses()
  forgetSamples()
  return evaluate(budget, read, FULL)
}

/** Where a value is not what JSON can say: not finite, −0, or undefined. */
function unsayable(value: unknown, path: string): string[] {
  if (typeof value === 'number') return Number.isFinite(value) && !Object.is(value, -0) ? [] : [`${path}: ${value}`]
  if (value === undefined) return [`${path}: undefined`]
  if (typeof value !== 'object' || value === null) return []
  return Object.entries(value).flatMap(([key, inner]) => unsayable(inner, `${path}.${key}`))
}

describe('any budget, with computed lines, files, curves, floors, corners and builds', () => {
  it('is evaluated in full to numbers that JSON can say, and the same from what is remembered', () => {
    fc.assert(
      fc.property(anyChannel, (budget) => {
        const evaluation = fresh(budget, ANY_EVIDENCE)
        expect(unsayable(evaluation, 'evaluation')).toEqual([])
        expect(JSON.stringify(evaluate(structuredClone(budget), ANY_EVIDENCE, FULL))).toBe(JSON.stringify(evaluation))
        const short = evaluate(budget, ANY_EVIDENCE)
        const verdicts = ({ allowances }: Evaluation) => allowances.map(({ verdict, words }) => [verdict, words])
        expect(verdicts(short)).toEqual(verdicts(evaluation))
      }),
      { numRuns: 60 },
    )
  })

  it('are swept and judged by their curves often enough to say something (seed 1)', () => {
    let [swept, judged] = [0, 0]
    for (const budget of fc.sample(anyChannel, { numRuns: 100, seed: 1 })) {
      for (const { channel } of fresh(budget, ANY_EVIDENCE).allowances) {
        if (channel) swept++
        if (channel?.curve) judged++
      }
    }
    expect([swept > 10, judged > 3]).toEqual([true, true])
  })

  it('budgets evaluated in any order give what each gives alone', () => {
    fc.assert(
      fc.property(fc.array(anyChannel, { minLength: 2, maxLength: 4 }), (budgets) => {
        const alone = budgets.map((budget) => JSON.stringify(fresh(budget, ANY_EVIDENCE)))
        const forth = budgets.map((budget) => JSON.stringify(evaluate(budget, ANY_EVIDENCE, FULL)))
        const back = [...budgets].reverse().map((budget) => JSON.stringify(evaluate(budget, ANY_EVIDENCE, FULL)))
        expect(forth).toEqual(alone)
        expect(back.reverse()).toEqual(alone)
      }),
      { numRuns: 8 },
    )
  })

  it('a line more changes no other line', () => {
    fc.assert(
      fc.property(anyChannel, anyChannel, (budget, other) => {
        const [added] = Object.values(other.lines)
        const before = evaluate(budget, ANY_EVIDENCE)
        const after = evaluate({ ...budget, lines: { ...budget.lines, extra: added } } as Budget, ANY_EVIDENCE)
        for (const id of Object.keys(before.lines)) expect(after.lines[id]).toEqual(before.lines[id])
      }),
      { numRuns: 20 },
    )
  })
})

describe('a length cut in two', () => {
  const common = { order: 'a1', kind: 'trace', basis: 'simulated' } as const
  const terms = { rootTerm: '0.2 dB/in', linearTerm: '0.03 dB/in', validFrom: '0.05 GHz', validTo: '20 GHz' } as const
  const size = { width: '5 mil', thickness: '0.6 mil', heightBelow: '5 mil', heightAbove: '6 mil' } as const
  const laminate = { dk: '3.6', df: '0.006', anchor: '10 GHz', roughness: 'smooth' } as const
  const MODELS: Readonly<Record<string, LineFile>> = {
    terms: { ...common, model: 'per-length', ...terms },
    number: { ...common, model: 'per-length', lossPerLength: '0.8 dB/in', at: '10 GHz' },
    cable: { ...common, kind: 'cable', covers: 'bulk', model: 'cable', ...terms },
    geometry: { ...common, model: 'geometry', structure: 'stripline', ...size, ...laminate },
  }

  it.each(Object.keys(MODELS))('adds up to the whole, in a corner too: %s', (name) => {
    const model = MODELS[name] as LineFile
    const corners = { hot: { order: 'a0', name: 'Hot', temperature: '65 °C', lossPerKelvin: '0.1 %/K' } }
    const millimetres = fc.integer({ min: 1, max: 400 })
    fc.assert(
      fc.property(millimetres, millimetres, fc.constantFrom('hot', null), (a, b, judgedCorner) => {
        const limit = { ...link({}).allowances.limit, order: 'a0', judgedCorner }
        const sum = (lengths: Readonly<Record<string, number>>) => {
          const entries = Object.entries(lengths).map(([id, mm]) => [id, { ...model, length: `${mm} mm` }])
          const lines = Object.fromEntries(entries) as Record<string, LineFile>
          return (
            evaluate(link({ lines, corners, allowances: { limit } }), new Map()).allowances[0]?.lossDb ?? Number.NaN
          )
        }
        const whole = sum({ l: a + b })
        expect(Math.abs(sum({ l: a, m: b }) - whole)).toBeLessThan(1e-9 * whole)
      }),
      { numRuns: 25 },
    )
  })
})

describe('what is remembered', () => {
  const HZ = steps(0.05e9, 500)
  const section: Section = { ohm: 88, delay: 150e-12, db: (hz) => 0.3 * Math.sqrt(hz / 1e9) }
  const base = evidenceOf({ a: fileOf([section], HZ), b: fileOf([{ ...section, ohm: 105 }], HZ) })
  const stack = (order: string, role: 'plane' | 'core' | 'signal', rest: object) => ({
    order,
    role,
    assembly: 'board',
    ...rest,
  })
  const laminate = { dk: '3.6', df: '0.006', anchor: '10 GHz', method: 'Resonator' } as const
  const file = (): BudgetFile => ({
    ...(link({}) as unknown as BudgetFile),
    head: { ...link({}).head, laneCount: 2, seed: 3 },
    evidence: structuredClone(base.evidence),
    assemblies: { board: { order: 'a0', name: 'Board', kind: 'board' } },
    layers: {
      p1: stack('a0', 'plane', { thickness: '35 µm' }),
      d1: stack('a1', 'core', { thickness: '120 µm', ...laminate }),
      s: stack('a2', 'signal', { name: 'L2', thickness: '15 µm' }),
      d2: stack('a3', 'core', { thickness: '120 µm', ...laminate }),
      p2: stack('a4', 'plane', { thickness: '35 µm' }),
    },
    lines: {
      n: fileLine('a1', 'a', { kind: 'connector' }),
      g: {
        order: 'a2',
        kind: 'trace',
        model: 'geometry',
        basis: 'estimate',
        assembly: 'board',
        structure: 'stripline',
        layer: 'L2',
        length: '5 in',
        width: '120 µm',
        roughness: 'smooth',
        varies: 'width 10 %',
      },
      // An own tolerance too, which the corner's extreme takes.
      t: fileLine('a3', 'b', { kind: 'trace', tolerancePlus: '0.2 dB', toleranceMinus: '0.1 dB' }),
    },
    laneValues: { 'g/2/length': '6 in', 't/2/skew': '4 ps' },
    corners: {
      hot: { order: 'a0', name: 'Hot', temperature: '65 °C', lossPerKelvin: '0.1 %/K', dielectricPerKelvin: '0.2 %/K' },
    },
    allowances: {
      limit: {
        ...link({}).allowances.limit,
        order: 'a0',
        judgedCorner: 'hot',
        curve: '0.05..20 GHz: 30',
        returnLossFloor: '3 dB',
      },
    },
  })

  type Change = (file: BudgetFile) => unknown
  const set =
    (section: keyof BudgetFile, id: string, change: object): Change =>
    (budget) =>
      Object.assign((budget[section] as Record<string, object>)[id] ?? {}, change)
  const head =
    (change: object): Change =>
    (budget) =>
      Object.assign(budget.head, change)
  const corner = (change: object) => set('corners', 'hot', change)

  const CHANGES: Readonly<Record<string, Change>> = {
    'the modes of a file': set('evidence', 'a', { modes: 'single-ended' }),
    'the reference of a file': set('evidence', 'a', { reference: '92 Ω' }),
    'a file taken out': set('evidence', 'a', { removed: true }),
    'another file': set('evidence', 'a', { sha256: base.evidence.b?.sha256 ?? '' }),
    'the thickness of a layer': set('layers', 'd1', { thickness: '100 µm' }),
    'the loss tangent of a layer': set('layers', 'd2', { df: '0.009' }),
    'a layer taken out': set('layers', 'p2', { removed: true }),
    'the seed': head({ seed: 4 }),
    'the reference impedance': head({ reference: '92 Ω' }),
    'the reference temperature': head({ referenceTemperature: '20 °C' }),
    'the rate': head({ bitRate: '18 Gb/s' }),
    'the temperature of the corner': corner({ temperature: '70 °C' }),
    'the growth per kelvin': corner({ lossPerKelvin: '0.15 %/K' }),
    'the growth of the loss tangent': corner({ dielectricPerKelvin: '0.3 %/K' }),
    'the humidity of the corner': corner({ humidity: 'wet', wetDf: '0.002', lossWet: '3 %' }),
    'an extreme of fabrication': corner({ fabrication: 'high-loss' }),
    'a width': set('lines', 'g', { width: '110 µm' }),
    'what varies': set('lines', 'g', { varies: 'width 20 %' }),
    'a skew': set('lines', 'n', { skew: '5 ps' }),
    'the skew of a lane': (budget) => Object.assign(budget.laneValues ?? {}, { 't/2/skew': '7 ps' }),
    'the length of a lane': (budget) => Object.assign(budget.laneValues ?? {}, { 'g/2/length': '8 in' }),
    'the corner that is judged': set('allowances', 'limit', { judgedCorner: null }),
    'the lane that is judged': set('allowances', 'limit', { judgedLane: 1 }),
    'a curve that reaches further': set('allowances', 'limit', { curve: '0.05..24 GHz: 30' }),
  }
  const parsed = (change: Change = () => {}): Budget => {
    const budget = file()
    change(budget)
    return link(budget)
  }

  it.each(Object.keys(CHANGES))('%s changes the result as a fresh evaluation says, and back', (name) => {
    const changed = parsed(CHANGES[name])
    const wanted = JSON.stringify(fresh(changed, base.read))
    const before = JSON.stringify(fresh(parsed(), base.read))
    expect(wanted).not.toBe(before)
    expect(JSON.stringify(evaluate(changed, base.read, FULL))).toBe(wanted)
    expect(JSON.stringify(evaluate(parsed(), base.read, FULL))).toBe(before)
    expect(JSON.stringify(evaluate(changed, base.read, FULL))).toBe(wanted)
  })

  it('the budget of these changes is one in which everything is computed', () => {
    const [allowance] = fresh(parsed(), base.read).allowances
    expect(allowance?.verdict).toBe('inside')
    expect(allowance?.channel?.returnLoss?.whole).toBe(true)
    expect(allowance?.builds).not.toBeNull()
    expect(allowance?.judged.lane).toBe(2)
  })

  it('what is read of the same file anew counts anew', () => {
    const sha256 = base.evidence.a?.sha256 ?? ''
    const other = new Map(base.read).set(sha256, fileOf([{ ...section, ohm: 70 }], HZ))
    const missing = new Map(base.read)
    missing.delete(sha256)
    const [first, second, third] = [base.read, other, missing].map((read) => JSON.stringify(fresh(parsed(), read)))
    expect(new Set([first, second, third]).size).toBe(3)
    expect(JSON.stringify(evaluate(parsed(), base.read, FULL))).toBe(first)
    expect(JSON.stringify(evaluate(parsed(), other, FULL))).toBe(second)
    expect(JSON.stringify(evaluate(parsed(), missing, FULL))).toBe(third)
  })

  it.each([
    { temperature: '65 °C', fabrication: 'high-loss' },
    { temperature: '65 °C', dielectricPerKelvin: '0.2 %/K' },
  ] as const)(
    'allowances at other frequencies, and one whose corner %j cannot be judged, do not lend each other their cascades',
    (conditions) => {
      const corners = { other: { order: 'a1', name: 'Other', ...conditions } }
      const allowance = { ...link({}).allowances.limit, judgedCorner: 'other' }
      const planes = { ...link({}).planes, mid: { order: 'a35', code: 'board-edge', name: 'Edge' } } as const
      const several = (budget: BudgetFile) =>
        Object.assign(budget, {
          corners,
          planes,
          // A stated trace cannot be judged there without a growth per kelvin; a connector's tolerance in dB is another share of its loss at 5 GHz.
          lines: {
            ...budget.lines,
            t: fileLine('a3', 'b', { kind: 'connector', tolerancePlus: '0.2 dB' }),
            x: line('a4', '1 dB', { kind: 'trace' }),
          },
          allowances: {
            far: { ...allowance, order: 'a0' },
            near: { ...allowance, order: 'a1', to: 'mid' },
            low: { ...allowance, order: 'a2', to: 'mid', at: '5 GHz' },
          },
        } satisfies Partial<BudgetFile>)
      const only = (id: string) => (budget: BudgetFile) => {
        several(budget)
        budget.allowances = Object.fromEntries(Object.entries(budget.allowances ?? {}).filter(([own]) => own === id))
      }
      const together = fresh(parsed(several), base.read).allowances
      for (const id of ['far', 'near', 'low']) {
        const alone = fresh(parsed(only(id)), base.read).allowances[0]
        expect(together.find((one) => one.id === id)?.channel).toEqual(alone?.channel)
        expect(alone?.channel).not.toBeNull()
      }
      expect(together.map(({ lossDb }) => lossDb === null)).toEqual([true, false, false])
    },
  )
})
