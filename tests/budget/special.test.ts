import { describe, expect, it } from 'vitest'
import { evaluate } from '../../lib/budget/evaluate'
import type { BudgetFile } from '../../lib/budget/schema'
import { line, link } from './links'

const run = (parts: Partial<BudgetFile>) => {
  const evaluation = evaluate(link(parts), new Map())
  const [allowance] = evaluation.allowances
  if (!allowance) throw new Error('no allowance')
  return { allowance, evaluation, codes: evaluation.flags.map(({ code, id }) => `${code} ${id}`) }
}
const overlap = (order: string, loss: string | null, a: string | null, b: string | null) =>
  line(order, loss, { kind: 'overlap', overlapA: a, overlapB: b })

describe('an overlap', () => {
  const lines = { a: line('a1', '7 dB'), o: overlap('a2', '2 dB', 'a', 'b'), b: line('a3', '5 dB') }

  it('is typed positive and subtracts', () => {
    const { allowance, codes } = run({ lines })
    expect(allowance.lossDb).toBe(10)
    expect(allowance.lines[1]).toEqual({ id: 'o', countedDb: -2, lowDb: -2, highDb: -2 })
    expect(allowance.byBasis.measured).toBe(10)
    expect(codes).toEqual([])
  })

  it('makes the worst case worse by its own tolerance downwards', () => {
    const o = { ...lines.o, toleranceMinus: '0.1 dB', tolerancePlus: '0.4 dB' }
    const { allowance } = run({ lines: { ...lines, o } })
    expect(allowance.worstDb).toBeCloseTo(10.1, 12)
    expect(allowance.lines[1]).toMatchObject({ countedDb: -2, lowDb: -2.4, highDb: -1.9 })
  })

  it.each([
    [null, 'b'],
    ['a', null],
    ['a', 'a'],
    ['a', 'nothing'],
    ['a', 'constructor'],
    ['a', 'o'],
  ])('that names %s and %s is undecided', (a, b) => {
    const { allowance, codes } = run({ lines: { ...lines, o: overlap('a2', '2 dB', a, b) } })
    expect(allowance.undecidedLines).toEqual(['o'])
    expect(allowance.verdict).toBe('undecided')
    expect(codes).toEqual(['overlap-unnamed o'])
  })

  it('without a number keeps a sum that exceeds the limit undecided, because it may subtract', () => {
    const { allowance } = run({ lines: { ...lines, a: line('a1', '8 dB'), o: overlap('a2', null, 'a', 'b') } })
    expect(allowance.words).toBe('undecided: 13.00 of 12.00 dB used before an overlap without a number')
    expect(allowance.leftDb).toBe(-1)
  })

  it('between planes that leave one of its lines out subtracts nothing there', () => {
    const planes = { tx: { order: 'a0', code: 'tx-ball' }, rx: { order: 'a2v', code: 'board-edge' } } as const
    const { allowance, codes } = run({ lines, planes })
    expect(allowance.lossDb).toBe(7)
    expect(allowance.lines[1]).toMatchObject({ id: 'o', countedDb: 0 })
    expect(codes).toEqual(['overlap-outside-planes o'])
  })

  it('larger than a line that contains it is flagged', () => {
    expect(run({ lines: { ...lines, o: overlap('a2', '6 dB', 'a', 'b') } }).codes).toEqual(['overlap-too-large o'])
  })
})

describe('a reserve', () => {
  const reserve = (purpose: 'temperature' | 'process' | 'growth') =>
    line('a2', '1 dB', { kind: 'reserve', at: null, purpose })
  const base = link({}).allowances.limit
  const corners = { hot: { order: 'a0', name: 'Hot', temperature: '65 °C', lossPerKelvin: '0.1 %/K' } }

  it('adds, and clashes with a corner or a tolerance for the same thing', () => {
    const lines = { a: line('a1', '4 dB'), r: reserve('temperature') }
    expect(run({ lines })).toMatchObject({ allowance: { lossDb: 5 }, codes: [] })
    const hot = { limit: { ...base, order: 'a0', judgedCorner: 'hot' } }
    expect(run({ lines, corners, allowances: hot }).codes).toEqual(['reserve-and-corner r', 'corner-does-not-move a'])
    const rss = { limit: { ...base, order: 'a0', judgedStatistic: 'rss' } } as const
    expect(run({ lines: { ...lines, r: reserve('process') }, allowances: rss }).codes).toEqual(['reserve-and-corner r'])
    expect(run({ lines: { ...lines, r: reserve('growth') }, allowances: rss, corners }).codes).toEqual([])
  })
})

describe('shares', () => {
  const assemblies = {
    card: { order: 'a0', name: 'Card', owner: 'layout' },
    bp: { order: 'a1', name: 'Backplane' },
  } as const
  const lines = {
    a: line('a1', '3 dB', { assembly: 'card' }),
    b: line('a2', '2 dB', { assembly: 'card', owner: 'interconnect' }),
    c: line('a3', null, { assembly: 'bp' }),
  }
  const share = (order: string, loss: string | null, to: object) => ({ order, allowance: 'limit', loss, ...to })

  it('are given to an assembly, a line or a discipline, and say what is used, free and undecided', () => {
    const { allowance, codes } = run({
      assemblies,
      lines,
      shares: {
        s1: share('a0', '4.5 dB', { assembly: 'card' }),
        s2: share('a1', '2.5 dB', { line: 'b' }),
        s3: share('a2', '3 dB', { discipline: 'layout' }),
        s4: share('a3', '5 dB', { assembly: 'bp' }),
      },
    })
    expect(allowance.shares).toEqual([
      { id: 's1', of: { kind: 'assembly', ref: 'card' }, shareDb: 4.5, usedDb: 5, freeDb: -0.5, undecidedLines: [] },
      { id: 's2', of: { kind: 'line', ref: 'b' }, shareDb: 2.5, usedDb: 2, freeDb: 0.5, undecidedLines: [] },
      { id: 's3', of: { kind: 'discipline', ref: 'layout' }, shareDb: 3, usedDb: 3, freeDb: 0, undecidedLines: [] },
      { id: 's4', of: { kind: 'assembly', ref: 'bp' }, shareDb: 5, usedDb: 0, freeDb: 5, undecidedLines: ['c'] },
    ])
    expect(codes).toEqual(['field-missing c', 'share-exceeded s1'])
  })

  it('with the required margin over the limit warn; a line’s share is part of its assembly’s', () => {
    const shares = (bp: string) => ({
      s1: share('a0', '5 dB', { assembly: 'card' }),
      s2: share('a1', '2 dB', { line: 'b' }),
      s3: share('a2', bp, { assembly: 'bp' }),
    })
    expect(run({ assemblies, lines, shares: shares('6 dB') }).codes).toEqual(['field-missing c'])
    expect(run({ assemblies, lines, shares: shares('6.1 dB') }).codes).toEqual([
      'field-missing c',
      'shares-exceed-allowance limit',
    ])
  })

  it('that do not say what they are do not count, and say so', () => {
    const shares = {
      s1: share('a0', '5 dB', {}),
      s2: share('a1', '5 dB', { line: 'b', assembly: 'card' }),
      s3: share('a2', null, { line: 'b' }),
      s4: { ...share('a3', '5 dB', { line: 'b' }), allowance: null },
    }
    const { allowance, codes } = run({ assemblies, lines, shares })
    expect(allowance.shares).toEqual([])
    expect(codes.slice(1)).toEqual(['s1', 's2', 's3', 's4'].map((id) => `share-unclear ${id}`))
  })
})
