import { describe, expect, it } from 'vitest'
import { evaluate } from '../../lib/budget/evaluate'
import type { AllowanceEvaluation } from '../../lib/budget/evaluation'
import type { BudgetFile } from '../../lib/budget/schema'
import { STRIPLINE } from './crossSections'
import { line, link } from './links'

type LineFile = NonNullable<BudgetFile['lines']>[string]

/** One allowance, with so many random builds. */
function judge(
  lines: Readonly<Record<string, LineFile>>,
  limit: string,
  parts: Partial<BudgetFile> = {},
  builds = 50_000,
): AllowanceEvaluation & { readonly codes: readonly string[] } {
  const allowances = { limit: { ...link({}).allowances.limit, order: 'a0', limit } }
  const evaluation = evaluate(link({ lines, allowances, ...parts }), new Map(), { sweep: false, builds })
  const [allowance] = evaluation.allowances
  if (!allowance) throw new Error('no allowance')
  return { ...allowance, codes: evaluation.flags.map(({ code, id }) => `${code} ${id}`) }
}

/** Normal distribution by Simpson's rule, 4,000 steps from −8 (plain, no source needed). */
function normal(z: number): number {
  const density = (x: number) => Math.exp((-x * x) / 2) / Math.sqrt(2 * Math.PI)
  const n = 4000
  const width = (z + 8) / n
  let sum = density(-8) + density(z)
  for (let k = 1; k < n; k++) sum += density(-8 + k * width) * (k % 2 === 0 ? 2 : 4)
  return (sum * width) / 3
}

/** Four standard errors of a share of so many builds. */
const fourErrors = (share: number, trials: number) => 4 * Math.sqrt((share * (1 - share)) / trials)

/** Loss is its length times 0.5 dB/in at 10 GHz, so that everything is linear. */
const LINEAR = {
  order: 'a1',
  kind: 'trace',
  model: 'per-length',
  basis: 'simulated',
  length: '10 in',
  rootTerm: '0 dB/in',
  linearTerm: '0.05 dB/in',
  validFrom: '0.05 GHz',
  validTo: '20 GHz',
} as const satisfies LineFile

describe('the tolerance of a computed line', () => {
  it('is ±15 % of a cross-section’s loss, until it is scaled by a coupon or a tolerance is typed', () => {
    const plain = judge({ l: STRIPLINE }, '100 dB')
    const db = plain.nominalDb ?? Number.NaN
    expect([plain.worstDb, plain.rssDb]).toEqual([expect.closeTo(1.15 * db, 10), expect.closeTo(0.15 * db, 10)])
    const scaled = judge({ l: { ...STRIPLINE, scale: '1.1' } }, '100 dB')
    expect(scaled.nominalDb).toBeCloseTo(1.1 * db, 10)
    expect([scaled.worstDb, scaled.rssDb]).toEqual([scaled.nominalDb, 0])
    const typed = judge({ l: { ...STRIPLINE, tolerancePlus: '0.2 dB' } }, '100 dB')
    expect([typed.worstDb, typed.rssDb]).toEqual([expect.closeTo(db + 0.2, 10), expect.closeTo(0.2, 10)])
    const zero = judge({ l: { ...STRIPLINE, tolerancePlus: '0 dB' } }, '100 dB')
    expect(zero.worstDb).toBeCloseTo(db, 12)
  })

  it('in a corner is of the grown loss', () => {
    const corners = { hot: { order: 'a0', name: 'Hot', temperature: '65 °C', lossPerKelvin: '0.1 %/K' } }
    const limit = { ...link({}).allowances.limit, order: 'a0', limit: '100 dB', judgedCorner: 'hot' }
    const cold = judge({ l: STRIPLINE }, '100 dB').nominalDb ?? Number.NaN
    const hot = judge({ l: STRIPLINE }, '100 dB', { corners, allowances: { limit } })
    expect(hot.nominalDb).toBeCloseTo(1.04 * cold, 10)
    expect(hot.rssDb).toBeCloseTo(0.15 * 1.04 * cold, 10)
  })
})

describe('what varies inside a model (a line linear in its length, by hand)', () => {
  const VARYING = { ...LINEAR, varies: 'length 10 %', toleranceMinus: '0.2 dB', tolerancePlus: '0.2 dB' }

  it('adds to a typed tolerance in the worst case, and by the root of the sum of squares in RSS', () => {
    const found = judge({ l: VARYING }, '100 dB')
    expect(found.nominalDb).toBeCloseTo(5, 10)
    expect(found.worstDb).toBeCloseTo(5 + 0.5 + 0.2, 8)
    expect(found.rssDb).toBeCloseTo(Math.hypot(0.5, 0.2), 8)
    expect(found.lines[0]).toMatchObject({ lowDb: expect.closeTo(4.3, 8), highDb: expect.closeTo(5.7, 8) })
  })

  it('in builds: the share inside is that of a normal distribution of hypot(0.5, 0.2)/3', () => {
    const sigma = Math.hypot(0.5, 0.2) / 3
    for (const limit of [4.9, 5.1, 5.3]) {
      const share = normal((limit - 5) / sigma)
      const { builds } = judge({ l: VARYING }, `${limit} dB`)
      expect(Math.abs((builds?.fractionInside?.value ?? 0) - share)).toBeLessThan(fourErrors(share, 50_000))
    }
    const { builds } = judge({ l: VARYING }, '100 dB')
    expect(builds?.percentiles.p99?.db).toBeCloseTo(5 + 2.3263 * sigma, 1)
    expect(builds?.meanDb).toBeCloseTo(5, 2)
  })

  it('grows with a corner’s factor, and a lane of its own length varies by its own share', () => {
    const corners = { hot: { order: 'a0', name: 'Hot', temperature: '65 °C', lossPerKelvin: '0.1 %/K' } }
    const limit = { ...link({}).allowances.limit, order: 'a0', limit: '100 dB', judgedCorner: 'hot' }
    const parts = { corners, allowances: { limit }, laneValues: { 'l/2/length': '20 in' } }
    const found = judge({ l: { ...VARYING, toleranceMinus: '0 dB', tolerancePlus: '0 dB' } }, '100 dB', parts)
    expect(found.judged.lane).toBe(2)
    expect(found.nominalDb).toBeCloseTo(10.4, 10)
    expect(found.rssDb).toBeCloseTo(1.04, 8)
    expect(found.builds?.percentiles.p50?.db).toBeCloseTo(10.4, 1)
    const spread = (found.builds?.percentiles.p99?.db ?? 0) - 10.4
    expect(Math.abs(spread / ((2.3263 * 1.04) / 3) - 1)).toBeLessThan(0.06)
  })

  it('that names nothing of the number, or a line that is not computed, is said', () => {
    expect(judge({ l: { ...VARYING, varies: 'colour 3 %' } }, '9 dB')).toMatchObject({
      verdict: 'undecided',
      codes: expect.arrayContaining(['unreadable-value l']),
    })
    const stated = judge({ l: line('a1', '5 dB', { varies: 'length 10 %' }) }, '9 dB')
    expect([stated.rssDb, stated.codes.includes('varies-not-used l')]).toEqual([0, true])
  })
})

describe('random builds of a link', () => {
  const parts = { head: { ...link({}).head, laneCount: 4 } }

  it('all lanes of one build: what a group shares fails together, what lanes have alone fails apart', () => {
    const share = normal(1)
    // σ 0.1 dB, limit one σ above nominal.
    const grouped = { l: line('a1', '5 dB', { tolerancePlus: '0.3 dB', group: 'lot' }) }
    const together = judge(grouped, '5.1 dB', parts).builds
    expect(Math.abs((together?.fractionInside?.value ?? 0) - share)).toBeLessThan(fourErrors(share, 50_000))
    const single = { l: line('a1', '5 dB', { tolerancePlus: '0.3 dB', group: 'none', groupNote: 'Own part.' }) }
    const apart = judge(single, '5.1 dB', parts).builds
    expect(Math.abs((apart?.fractionInside?.value ?? 0) - share ** 4)).toBeLessThan(fourErrors(share ** 4, 50_000))
    expect(Math.abs((apart?.worstLane?.fractionInside.value ?? 0) - share)).toBeLessThan(
      fourErrors(share, 50_000) + 0.003,
    )
  })

  it('two lines of one group add linearly, apart by the root of the sum of squares, in all three methods', () => {
    const two = (a: string, b: string) => ({
      a: line('a1', '2 dB', { tolerancePlus: '0.3 dB', group: a }),
      b: line('a2', '3 dB', { tolerancePlus: '0.4 dB', group: b }),
    })
    for (const [groups, threeSigma] of [
      [['x', 'x'], 0.7],
      [['x', 'y'], 0.5],
    ] as const) {
      const share = normal(0.2 / (threeSigma / 3))
      const found = judge(two(groups[0], groups[1]), '5.2 dB')
      expect(found.worstDb).toBeCloseTo(5.7, 10)
      expect(found.rssDb).toBeCloseTo(threeSigma, 10)
      expect(Math.abs((found.builds?.fractionInside?.value ?? 0) - share)).toBeLessThan(fourErrors(share, 50_000))
    }
  })

  it('are the same with the same seed, and others with another', () => {
    const lines = { l: line('a1', '5 dB', { tolerancePlus: '0.3 dB' }) }
    const seeded = (seed: number | null) => judge(lines, '5.1 dB', { head: { ...link({}).head, seed } }, 2000).builds
    expect(seeded(7)).toEqual(seeded(7))
    expect(seeded(8)?.meanDb).not.toBe(seeded(7)?.meanDb)
    expect(seeded(null)).toEqual(seeded(1))
    expect(seeded(null)?.seed).toBe(1)
  })

  it('an overlap varies towards less taken away; a line without a number leaves them unknown', () => {
    const lines = {
      a: line('a1', '5 dB'),
      b: line('a2', '3 dB'),
      o: { ...line('a3', '1 dB', { kind: 'overlap', tolerancePlus: '0.6 dB' }), overlapA: 'a', overlapB: 'b' },
    }
    const share = normal(0.1 / 0.2)
    const found = judge(lines, '7.1 dB')
    expect(Math.abs((found.builds?.fractionInside?.value ?? 0) - share)).toBeLessThan(fourErrors(share, 50_000))
    expect(judge({ ...lines, c: line('a4', null) }, '7.1 dB').builds).toBeNull()
  })
})
