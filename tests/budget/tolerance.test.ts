import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { evaluate } from '../../lib/budget/evaluate'
import { type Budget, type BudgetFile, budgetSchema } from '../../lib/budget/schema'
import { line, link } from './links'

const only = (budget: Budget) => {
  const [allowance] = evaluate(budget, new Map()).allowances
  if (!allowance) throw new Error('no allowance')
  return allowance
}
const ends = (rest: Parameters<typeof line>[2]) => {
  const [counted] = only(link({ lines: { a: line('a1', '4 dB', rest) } })).lines
  return [counted?.lowDb, counted?.highDb]
}
const near = (...values: number[]) => values.map((value) => expect.closeTo(value, 9))

describe('how far one line may lie away (σ by design rule 4.6, by hand)', () => {
  it.each([
    [{ toleranceMinus: '0.2 dB', tolerancePlus: '0.3 dB' }, 3.8, 4.3],
    [{ tolerancePlus: '5 %' }, 3.8, 4.2],
    [{ toleranceMinus: '0.1 dB' }, 3.9, 4.1],
    [{ tolerancePlus: '0.3 dB', toleranceMeaning: '3-sigma' }, 3.7, 4.3],
    [{ tolerancePlus: '0.1 dB', toleranceMeaning: '1-sigma' }, 3.7, 4.3],
    [{ tolerancePlus: '0.196 dB', toleranceMeaning: '95-percent' }, 3.7, 4.3],
    [{ tolerancePlus: '0.3 dB', toleranceAnywhere: true }, 3.7, 4.3],
    [{ toleranceMinus: '0 dB', tolerancePlus: '0.3 dB' }, 4, 4.3],
    [{}, 4, 4],
  ] as const)('%j', (rest, low, high) => {
    expect(ends(rest)).toEqual(near(low, high))
  })
})

describe('the sum (by hand)', () => {
  const lot = (order: string, plus: string, group: string | null, rest: Parameters<typeof line>[2] = {}) =>
    line(order, '2 dB', { toleranceMinus: '0.1 dB', tolerancePlus: plus, group, ...rest })

  it('is linear inside a group and the root of the sum of squares between groups', () => {
    const lines = { a: lot('a1', '0.3 dB', 'x'), b: lot('a2', '0.4 dB', 'x'), c: lot('a3', '0.24 dB', 'y') }
    const found = only(link({ lines }))
    expect(found.worstDb).toBeCloseTo(6.94, 12)
    expect(found.rssDb).toBeCloseTo(Math.hypot(0.7, 0.24), 12)
    expect(found.rssDb).toBeCloseTo(0.74, 12)
  })

  it('groups by the line, else its assembly’s group, else the assembly; a line without assembly is on its own', () => {
    const assemblies = { card: { order: 'a0', name: 'Card' }, bp: { order: 'a1', name: 'Backplane', group: 'lot 7' } }
    const lines = {
      a: lot('a1', '0.1 dB', null, { assembly: 'card' }),
      b: lot('a2', '0.1 dB', 'lot 7', { assembly: 'card' }),
      c: lot('a3', '0.1 dB', null, { assembly: 'bp' }),
      d: lot('a4', '0.1 dB', null),
      e: lot('a5', '0.1 dB', 'none', { assembly: 'card', groupNote: 'Plated on another line.' }),
      f: lot('a6', '0.1 dB', 'none', { assembly: 'card' }),
    }
    const evaluation = evaluate(link({ lines, assemblies }), new Map())
    expect(Object.values(evaluation.lines).map(({ group }) => group)).toEqual([
      'card',
      'lot 7',
      'lot 7',
      'd',
      'e',
      'card',
    ])
    expect(evaluation.allowances[0]?.rssDb).toBeCloseTo(Math.hypot(0.2, 0.2, 0.1, 0.1), 12)
    expect(evaluation.flags).toEqual([
      expect.objectContaining({ code: 'group-off-without-note', id: 'f', field: 'groupNote' }),
    ])
  })

  const lines = { a: lot('a1', '0.6 dB', 'x'), b: lot('a2', '0.8 dB', 'y') }
  const statistic = (judgedStatistic: 'nominal' | 'rss' | 'worst' | null, rest = {}) => {
    const base = link({}).allowances.limit
    return only(
      link({ lines, allowances: { limit: { ...base, order: 'a0', limit: '5.2 dB', judgedStatistic, ...rest } } }),
    )
  }

  it('is judged at the statistic that the allowance asks for', () => {
    expect(statistic(null)).toMatchObject({ verdict: 'inside', judged: { statistic: 'nominal' }, lossDb: 4 })
    expect(statistic('rss')).toMatchObject({
      verdict: 'tight',
      lossDb: 5,
      marginDb: expect.closeTo(0.2, 12),
      nominalDb: 4,
    })
    expect(statistic('worst')).toMatchObject({
      verdict: 'over',
      words: 'over by 0.20 dB',
      lossDb: expect.closeTo(5.4, 12),
    })
  })

  it('holds a least loss against the low side of the same statistic', () => {
    const least = { limit: '12 dB', leastLoss: '3.9 dB' }
    expect(statistic('nominal', least).verdict).toBe('inside')
    expect(statistic('rss', least).words).toBe('tight: 0.04 dB under the least loss of 3.90 dB')
    expect(statistic('worst', least).words).toBe('tight: 0.10 dB under the least loss of 3.90 dB')
  })

  it('of lines that are known is judged while others are not', () => {
    const some = { ...lines, c: line('a3', null) }
    const base = link({}).allowances.limit
    const found = only(
      link({ lines: some, allowances: { limit: { ...base, order: 'a0', limit: '5.2 dB', judgedStatistic: 'worst' } } }),
    )
    expect(found.words).toBe('over by 0.20 dB although 1 line is undecided')
    expect(found).toMatchObject({ worstDb: null, rssDb: null, nominalDb: null, undecidedLines: ['c'] })
  })
})

describe('Tamarack without groups (practice.md C1, computed there by hand)', () => {
  it('is ±0.87 dB where the groups make it ±1.09 dB', () => {
    const file: BudgetFile = JSON.parse(
      readFileSync(new URL('../../seed-scenarios/tamarack.json', import.meta.url), 'utf8'),
    )
    expect(only(budgetSchema.parse(file)).rssDb).toBeCloseTo(1.09, 2)
    const apart = Object.entries(file.lines ?? {}).map(([id, fields]) => [
      id,
      { ...fields, group: 'none', groupNote: 'To compare.' },
    ])
    expect(only(budgetSchema.parse({ ...file, lines: Object.fromEntries(apart) })).rssDb).toBeCloseTo(0.87, 2)
  })
})
