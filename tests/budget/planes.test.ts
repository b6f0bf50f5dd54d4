import { describe, expect, it } from 'vitest'
import { evaluate } from '../../lib/budget/evaluate'
import type { BudgetFile } from '../../lib/budget/schema'
import { line, link } from './links'

type AllowanceFile = NonNullable<BudgetFile['allowances']>[string]

const LINES = { a: line('a1', '1 dB'), b: line('b1', '2 dB'), c: line('c1', '4 dB') }
const PLANES = {
  tx: { order: 'a0', code: 'tx-ball', name: 'TX ball' },
  edge: { order: 'b0', code: 'board-edge', name: 'Edge' },
  mate: { order: 'b2', code: 'connector-face', name: 'Face' },
  rx: { order: 'z0', code: 'rx-ball', name: 'RX ball' },
} as const

const allowance = (order: string, from: string | null, to: string | null, rest: Partial<AllowanceFile> = {}) =>
  ({ order, name: order, limit: '5 dB', at: '10 GHz', from, to, ...rest }) satisfies AllowanceFile

function judged(allowances: BudgetFile['allowances'], more: Partial<BudgetFile> = {}) {
  const evaluation = evaluate(link({ lines: LINES, planes: PLANES, allowances, ...more }), new Map())
  return {
    evaluation,
    flags: evaluation.flags.map(({ code, id, field }) => [code, id, field]),
    allowances: evaluation.allowances,
  }
}

describe('planes and channel order', () => {
  it('rows stand by fractional index, ties by id, planes among the lines', () => {
    const lines = { b: line('a1', '1 dB'), a: line('a1', '1 dB'), gone: line('a1', '1 dB', { removed: true }) }
    const rows = evaluate(link({ lines }), new Map()).rows
    expect(rows).toEqual([{ plane: 'tx' }, { line: 'a' }, { line: 'b' }, { plane: 'rx' }])
  })

  it('several allowances each sum between their own planes', () => {
    const { allowances, evaluation } = judged({
      whole: allowance('a0', 'tx', 'rx'),
      first: allowance('a1', 'tx', 'edge', { limit: '1.5 dB' }),
      middle: allowance('a2', 'edge', 'mate', { limit: '1.9 dB' }),
    })
    expect(allowances.map(({ id, knownDb, verdict }) => [id, knownDb, verdict])).toEqual([
      ['whole', 7, 'over'],
      ['first', 1, 'inside'],
      ['middle', 2, 'over'],
    ])
    expect(allowances[1]?.lines.map(({ id }) => id)).toEqual(['a'])
    expect(evaluation.verdict).toBe('over')
  })

  it('each is judged at its own frequency; the budget’s verdict is the worst', () => {
    const lines = { a: line('a1', '1 dB', { model: 'table', points: '5 GHz 1 dB; 20 GHz 4 dB' }) }
    const { allowances, flags, evaluation } = judged(
      { nyquist: allowance('a0', 'tx', 'rx'), high: allowance('a1', 'tx', 'rx', { at: '20 GHz', limit: '3.5 dB' }) },
      { lines },
    )
    expect(allowances.map(({ knownDb, atHz, words }) => [knownDb, atHz, words])).toEqual([
      [2, 10e9, 'inside'],
      [4, 20e9, 'over by 0.50 dB at 20 GHz'],
    ])
    expect(evaluation.verdict).toBe('over')
    expect(flags).toEqual([
      ['allowance-at-other-frequency', 'high', 'at'],
      ['usual-wrong-frequency', 'high', 'at'],
    ])
  })

  it('without a frequency of its own it is judged at Nyquist, flagged', () => {
    const { allowances, flags } = judged({ one: allowance('a0', 'tx', 'edge', { at: null }) })
    expect(allowances[0]).toMatchObject({ verdict: 'inside', atHz: 10e9, knownDb: 1 })
    expect(flags).toEqual([['allowance-frequency-missing', 'one', 'at']])
  })

  it.each([
    ['plane-missing', 'to', allowance('a0', 'tx', null), 'undecided: no plane is named that it ends at'],
    [
      'plane-missing',
      'from',
      allowance('a0', 'nowhere', 'rx'),
      'undecided: the plane that it starts at does not exist',
    ],
    [
      'planes-reversed',
      'to',
      allowance('a0', 'rx', 'tx'),
      'undecided: the plane that it ends at comes before the plane that it starts at',
    ],
    ['planes-reversed', 'to', allowance('a0', 'tx', 'tx'), 'undecided: it starts and ends at the same plane'],
  ] as const)('%s (%s) is undecided', (code, field, one, words) => {
    const { allowances, flags } = judged({ one })
    expect(allowances[0]).toMatchObject({
      verdict: 'undecided',
      words,
      from: null,
      to: null,
      lossDb: null,
      marginDb: null,
    })
    expect(flags).toEqual([[code, 'one', field]])
  })

  it('a plane taken out is named', () => {
    const planes = { ...PLANES, rx: { ...PLANES.rx, removed: true } }
    expect(judged({ one: allowance('a0', 'tx', 'rx') }, { planes }).allowances[0]?.words).toBe(
      "undecided: the plane 'RX ball' that it ends at was taken out",
    )
  })

  it('a limit published between other planes is not compared, but the loss is shown', () => {
    const one = allowance('a0', 'tx', 'edge', { publishedFrom: 'tx-bump', publishedTo: 'board-edge' })
    const { allowances, flags } = judged({ one })
    expect(allowances[0]).toMatchObject({
      verdict: 'undecided',
      words: "undecided: the limit was published with tx-bump where it starts, and 'TX ball' is tx-ball",
      knownDb: 1,
      lossDb: 1,
      marginDb: null,
      leftDb: null,
    })
    expect(flags).toEqual([['planes-differ', 'one', 'from']])
    const same = allowance('a0', 'tx', 'edge', { publishedFrom: 'tx-ball', publishedTo: 'board-edge' })
    expect(judged({ one: same }).allowances[0]?.verdict).toBe('inside')
  })

  it('a limit that is missing leaves it undecided, and even a large loss is not over it', () => {
    const { allowances, flags } = judged({ one: allowance('a0', 'tx', 'rx', { limit: null }) })
    expect(allowances[0]).toMatchObject({
      verdict: 'undecided',
      words: 'undecided: the allowance has no limit',
      lossDb: 7,
    })
    expect(flags).toEqual([['limit-missing', 'one', 'limit']])
  })
})

describe('what stands beside the limit', () => {
  it('a curve and a floor are unknown where lines have no data over the band, and the verdict says so', () => {
    const curve = '0.05..10 GHz: 1 + 2 sqrt(f)'
    const { allowances, flags } = judged({
      a: allowance('a0', 'tx', 'edge', { curve }),
      b: allowance('a1', 'tx', 'edge', { curve, returnLossFloor: '10 dB' }),
      c: allowance('a2', 'tx', 'rx', { limit: '7.4 dB', requiredMargin: '1 dB', returnLossFloor: '10 dB' }),
    })
    expect(allowances.map(({ words }) => words)).toEqual([
      'inside at Nyquist; limit curve unknown',
      'inside at Nyquist; limit curve and return loss unknown',
      'tight: 0.40 dB left where 1.00 dB are required; return loss unknown',
    ])
    expect(flags.map(([code]) => code)).toEqual([
      'curve-not-judged',
      'curve-not-judged',
      'floor-not-judged',
      'floor-not-judged',
    ])
  })

  it('a least loss that is missed makes it tight', () => {
    const { allowances } = judged({ one: allowance('a0', 'tx', 'edge', { leastLoss: '3 dB' }) })
    expect(allowances[0]).toMatchObject({ verdict: 'tight', words: 'tight: 2.00 dB under the least loss of 3.00 dB' })
  })

  it('what closes exactly is not over, whatever the last bit of the sum', () => {
    const lines = { a: line('a1', '0.1 dB'), b: line('a2', '0.2 dB') }
    expect(0.1 + 0.2 > 0.3).toBe(true)
    expect(judged({ one: allowance('a0', 'tx', 'rx', { limit: '0.3 dB' }) }, { lines }).allowances[0]?.verdict).toBe(
      'inside',
    )
  })
})
