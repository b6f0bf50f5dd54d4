import { describe, expect, it } from 'vitest'
import { evaluate } from '../../lib/budget/evaluate'
import { type BudgetFile, COVER_CODES, type LineKind, sortedSet } from '../../lib/budget/schema'
import { line, link } from './links'

type Piece = readonly [kind: LineKind, covers: string | null, rest?: Parameters<typeof line>[2]]

/** Flags about what pieces in channel order cover: code, id of the line, item. Ids are p1, p2 … */
function joints(...pieces: Piece[]) {
  const lines = Object.fromEntries(
    pieces.map(([kind, covers, rest], n) => [
      `p${n + 1}`,
      line(`a${n + 1}`, '0.4 dB', { kind, covers: covers && sortedSet(covers.split(' '), COVER_CODES), ...rest }),
    ]),
  )
  const { flags } = evaluate(link({ lines } satisfies Partial<BudgetFile>), new Map())
  return flags
    .filter(({ code }) =>
      ['counted-twice', 'nobody-counts', 'covers-not-said', 'covers-not-of-kind', 'fixtures-in'].includes(code),
    )
    .map(({ code, id, message }) =>
      `${code} ${id} ${/the ([^,]*?)(, and| between| at)/.exec(message)?.[1] ?? ''}`.trim(),
    )
}

describe('a footprint via (practice.md D1)', () => {
  it('in the connector’s number and again as a line is counted twice', () => {
    expect(joints(['via', null], ['connector', 'mating-interface footprint-via-a'], ['via', ''])).toEqual([
      'counted-twice p2 footprint via',
    ])
    expect(joints(['via', 'footprint-via-b'], ['connector', 'mating-interface footprint-via-a'])).toEqual([
      'counted-twice p2 footprint via',
    ])
    expect(joints(['connector', 'footprint-via-b'], ['other', 'footprint-via-a pads'])).toEqual([
      'counted-twice p1 footprint via',
    ])
    expect(joints(['via', ''], ['other', 'footprint-via-a pads'])).toEqual(['counted-twice p2 footprint via'])
  })

  it('left out by the connector with no via line beside it is counted by nobody', () => {
    expect(joints(['trace', ''], ['connector', 'mating-interface'], ['trace', ''])).toEqual([
      'nobody-counts p2 footprint via',
      'nobody-counts p2 footprint via',
    ])
    expect(joints(['trace', ''], ['connector', 'mating-interface footprint-via-a'], ['via', ''])).toEqual([])
  })

  it('is no claim where the connector does not say what it covers', () => {
    expect(joints(['trace', ''], ['connector', null], ['via', ''])).toEqual(['covers-not-said p2'])
  })

  it('a via under a ball is another via', () => {
    expect(joints(['via', 'ball-via'], ['connector', 'mating-interface footprint-via-a'])).toEqual([])
  })

  it('is looked for across planes, reserves and overlaps', () => {
    expect(joints(['via', ''], ['reserve', null], ['connector', 'footprint-via-a'])).toEqual([
      'counted-twice p3 footprint via',
    ])
  })
})

describe('the via under a ball', () => {
  it('is counted twice, once, or by nobody', () => {
    expect(joints(['package', 'package-trace ball ball-via'], ['via', 'ball-via breakout-b'])).toEqual([
      'counted-twice p1 via under the ball',
    ])
    expect(joints(['via', null], ['package', 'package-trace ball-via'])).toEqual([
      'counted-twice p2 via under the ball',
    ])
    expect(joints(['package', 'package-trace ball'], ['via', 'ball-via'])).toEqual([])
    expect(joints(['package', 'package-trace ball'], ['trace', ''])).toEqual(['nobody-counts p1 via under the ball'])
    expect(joints(['package', null], ['trace', ''])).toEqual(['covers-not-said p1'])
    expect(joints(['package', 'ball-via'], ['via', 'footprint-via-b'])).toEqual([])
  })
})

describe('breakouts, mating interfaces and pads', () => {
  it('a breakout that both ends include is counted twice, said once', () => {
    expect(joints(['via', 'ball-via breakout-b'], ['trace', 'breakout-a'])).toEqual(['counted-twice p1 breakout'])
    expect(joints(['via', 'ball-via breakout-b'], ['trace', 'breakout-b'])).toEqual([])
  })

  it('a mating interface is counted by one of connector, second half and cable', () => {
    expect(joints(['connector', 'mating-interface'], ['connector', 'mating-interface'])).toEqual([
      'counted-twice p1 mating interface',
    ])
    expect(joints(['connector', 'mating-interface'], ['cable', 'bulk terminations mated-pairs'])).toEqual([
      'counted-twice p1 mating interface',
    ])
    expect(joints(['connector', 'mating-interface'], ['cable', 'bulk terminations'])).toEqual([])
  })

  it('a pad capacitance beside a component that includes its pads is counted twice', () => {
    const pad = { model: 'pad', capacitance: '50 fF' } as const
    expect(joints(['component', 'pads'], ['component', '', pad])).toEqual(['counted-twice p1 pad'])
  })
})

describe('cable (practice.md D8)', () => {
  it('whose mated pairs nobody counts', () => {
    expect(joints(['via', ''], ['cable', 'bulk terminations'], ['connector', 'mating-interface'])).toEqual([
      'nobody-counts p2 mated pair',
    ])
    expect(joints(['via', ''], ['cable', 'bulk terminations mated-pairs'])).toEqual([])
  })

  it('bulk alone is no assembly', () => {
    expect(joints(['connector', 'mating-interface'], ['cable', 'bulk'], ['connector', 'mating-interface'])).toEqual([
      'nobody-counts p2 wire terminations or paddle cards',
    ])
    expect(joints(['cable', 'terminations'], ['cable', 'bulk'], ['cable', 'terminations'])).toEqual([])
    expect(joints(['cable', null], ['cable', 'bulk'])).toEqual(['covers-not-said p1'])
  })

  it('with its test fixtures in is flagged until an overlap takes them out', () => {
    const assembly = 'bulk terminations paddle-cards mated-pairs test-fixtures'
    expect(joints(['cable', assembly], ['other', ''])).toEqual(['fixtures-in p1'])
    expect(joints(['cable', assembly], ['overlap', null, { overlapA: 'p1', overlapB: 'p3' }], ['other', ''])).toEqual(
      [],
    )
  })
})

describe('what a line covers', () => {
  it('must belong to its kind', () => {
    expect(joints(['trace', 'breakout-a ball-via'])).toEqual(['covers-not-of-kind p1'])
  })
})
