import { describe, expect, it } from 'vitest'
import {
  type Builds,
  fractionWords,
  grouped,
  insideWords,
  noBuildsWords,
  sourceWords,
  trialsWords,
  worstLaneWords,
} from '../../../app/budgets/[id]/client/builds/buildsWords'
import { layoutSpread, SPREAD } from '../../../app/budgets/[id]/client/builds/layoutSpread'
import { percentileRows } from '../../../app/budgets/[id]/client/builds/percentileRows'
import { perUnitWords, toleranceWords } from '../../../app/budgets/[id]/client/builds/rankedWords'
import { tamarack, upstream } from '../diagram/links'

const builds: Builds = {
  trials: 100_000,
  seed: 7,
  lanes: 16,
  meanDb: 27.3,
  percentiles: {
    p50: { db: 27.28, error: 0.001 },
    p90: { db: 27.7, error: 0.01 },
    p95: { db: 27.82, error: 0.01 },
    p99: { db: 28.05, error: 0.02 },
    p99_7: null,
  },
  fractionInside: { value: 0.9863, low: 0.98556, high: 0.98701 },
  worstLane: { lane: 11, fractionInside: { value: 0.989, low: 0.9883, high: 0.9896 } },
  common: ['bp', 'line-card'],
  independent: [],
  unknown: 0,
}

describe('random builds in words', () => {
  it('a build is all its lanes', () => {
    expect(insideWords(builds, 28)).toBe(
      'Of one build, all 16 lanes stay within 28 dB in 98.63 % of builds (95 % interval 98.56 to 98.70 %).',
    )
    expect(insideWords({ ...builds, lanes: 1 }, 28)).toMatch(/^A build stays within 28 dB in 98\.63 %/)
    expect(insideWords({ ...builds, fractionInside: null }, null)).toContain('no limit')
  })
  it('one lane alone is told apart', () => {
    expect(worstLaneWords(builds)).toMatch(/^Lane 11 alone, .*: 98\.90 % of builds/)
    expect(worstLaneWords({ ...builds, lanes: 1 })).toBe('')
  })
  it('nearly all is not all, and something is not nothing', () => {
    expect(fractionWords({ value: 0.99998, low: 0.9999, high: 1 })).toBe(
      'over 99.99 % of builds (95 % interval 99.99 to 100.00 %)',
    )
    expect(fractionWords({ value: 0.00002, low: 0, high: 0.0001 })).toBe(
      'under 0.01 % of builds (95 % interval 0.00 to 0.01 %)',
    )
  })
  it('trials and seed; builds without a number are not hidden', () => {
    expect(trialsWords(builds)).toContain('100\u00a0000 builds drawn at random, seed 7')
    expect(trialsWords({ ...builds, unknown: 1200 })).toContain(
      '1\u00a0200 of them gave no number and count as not inside',
    )
    expect([5, 1000, 1234567].map(grouped)).toEqual(['5', '1\u00a0000', '1\u00a0234\u00a0567'])
  })
  it('percentiles carry their sampling error; what is not known is said', () => {
    expect(percentileRows(builds).map(({ words }) => words)).toEqual([
      '27.28 ± under 0.01',
      '27.70 ± 0.01',
      '27.82 ± 0.01',
      '28.05 ± 0.02',
      'unknown',
    ])
  })
  it('what is drawn has the name of its assembly or line', () => {
    const [assembly] = Object.keys(tamarack.budget.assemblies)
    const [line] = Object.keys(tamarack.budget.lines)
    if (!assembly || !line) throw new Error('tamarack has both')
    const name = tamarack.budget.assemblies[assembly]?.name
    expect(sourceWords(tamarack.budget, assembly)).toBe(name)
    expect(sourceWords(tamarack.budget, `${assembly}: width`)).toBe(`trace width of ${name}`)
    expect(sourceWords(tamarack.budget, `${line}: stub`)).toBe(`stub of ${tamarack.budget.lines[line]?.name}`)
    expect(sourceWords(tamarack.budget, 'lot: early')).toBe("group 'lot: early'")
  })
  it('none: why', () => {
    const [open] = upstream.evaluation.allowances
    if (!open) throw new Error('it has an allowance')
    expect(noBuildsWords(open)).toBe('No builds: 3 lines have no number yet, and a build needs all of them.')
    expect(noBuildsWords({ ...open, undecidedLines: [], atHz: null })).toContain('frequency')
  })
})

describe('the ways to look at the spread, drawn', () => {
  const facts = { nominalDb: 27.2, rssDb: 1.09, worstDb: 29.78, limitDb: 28, builds }
  it('a deeper level lies lower, on one scale, with everything in the drawing', () => {
    const spread = layoutSpread(facts)
    if (!spread) throw new Error('there is a nominal loss')
    const [nominal, rss, worst, random] = spread.columns.map(({ bars }) => bars.at(-1)?.y ?? Number.NaN)
    if (nominal === undefined || rss === undefined || worst === undefined || spread.groundY === null)
      throw new Error('all of them')
    expect((rss - nominal) / (worst - nominal)).toBeCloseTo(1.09 / (29.78 - 27.2), 9)
    expect((spread.groundY - nominal) / (worst - nominal)).toBeCloseTo(0.8 / (29.78 - 27.2), 9)
    expect(random).toBeGreaterThan(spread.groundY)
    for (const y of [nominal, rss, worst, random, spread.groundY]) {
      expect(y).toBeGreaterThan(SPREAD.top)
      expect(y).toBeLessThan(SPREAD.foot)
    }
  })
  it('what is not known has no column; without a nominal loss there is no drawing', () => {
    const keys = layoutSpread({ ...facts, rssDb: null, builds: null })?.columns.map(({ key }) => key)
    expect(keys).toEqual(['nominal', 'worst'])
    expect(layoutSpread({ ...facts, nominalDb: null })).toBeNull()
  })
  it('without any tolerance all lie on one height', () => {
    const spread = layoutSpread({ nominalDb: 5, rssDb: 0, worstDb: 5, limitDb: null, builds: null })
    expect(new Set(spread?.columns.map(({ bars }) => bars[0]?.y)).size).toBe(1)
    expect(spread?.groundY).toBeNull()
  })
})

describe('what a tolerance does', () => {
  it('of a parameter also by the unit that it is typed in', () => {
    // 1 mm is 0.001 m: 550 dB a metre are 0.55 dB for each mm.
    const one = { line: 'x', input: 'stub', perUnit: 550, toleranceDb: 0.055 }
    expect(toleranceWords(one)).toBe('+0.06 dB')
    expect(perUnitWords(one)).toBe('+0.55 dB for each mm more')
    expect(perUnitWords({ ...one, input: 'dk', perUnit: -0.5 })).toBe('−0.5 dB for each 1 more')
  })
  it('of a loss itself there is nothing more to say', () => {
    expect(perUnitWords({ line: 'x', input: 'tolerancePlus', perUnit: 1, toleranceDb: 0.2 })).toBe('')
  })
})
