import { describe, expect, it } from 'vitest'
import { evaluate } from '../../lib/budget/evaluate'
import { margins } from '../../lib/budget/margins'
import { line, link } from './links'

const EVIDENCE = new Map()
const only = (budget: Parameters<typeof evaluate>[0]) => {
  const [allowance] = evaluate(budget, EVIDENCE).allowances
  if (!allowance) throw new Error('no allowance')
  return allowance
}

describe('verdicts (word list of the design; sums by hand)', () => {
  it('is inside with the required margin kept', () => {
    const result = only(link({ lines: { a: line('a1', '4 dB'), b: line('a2', '5.5 dB') } }))
    expect(result.verdict).toBe('inside')
    expect(result.words).toBe('inside')
    expect(result.knownDb).toBeCloseTo(9.5, 12)
    expect(result.marginDb).toBeCloseTo(2.5, 12)
  })

  it('is tight under the required margin, and exactly the required margin is enough', () => {
    expect(only(link({ lines: { a: line('a1', '11 dB') } })).verdict).toBe('inside')
    const result = only(link({ lines: { a: line('a1', '11.2 dB') } }))
    expect(result.verdict).toBe('tight')
    expect(result.words).toBe('tight: 0.80 dB left where 1.00 dB are required')
  })

  it('is over although lines are undecided, and says how many', () => {
    const lines = { a: line('a1', '13.11 dB'), b: line('a2', null), c: line('a3', null) }
    const result = only(link({ lines }))
    expect(result.verdict).toBe('over')
    expect(result.words).toBe('over by 1.11 dB although 2 lines are undecided')
    expect(result.lossDb).toBeNull()
    expect(result.marginDb).toBeNull()
  })

  it('is undecided with a line without a number, and says what is used and left', () => {
    const result = only(link({ lines: { a: line('a1', '8 dB'), b: line('a2', null) } }))
    expect(result.verdict).toBe('undecided')
    expect(result.words).toBe('undecided: 8.00 of 12.00 dB used, 4.00 dB left for 1 line')
    expect(result.leftDb).toBeCloseTo(4, 12)
    expect(result.undecidedLines).toEqual(['b'])
  })

  it('is undecided with no allowance at all', () => {
    expect(evaluate(link({ lines: {}, allowances: {} }), EVIDENCE).verdict).toBe('undecided')
  })

  it('summarises each allowance for the trail', () => {
    const evaluation = evaluate(link({ lines: { a: line('a1', '4 dB') } }), EVIDENCE)
    expect(margins(evaluation)).toEqual({ limit: { verdict: 'inside', marginDb: 8, knownDb: 4 } })
    const nowhere = { ...link({}).allowances.limit, order: 'a0', to: null }
    const without = evaluate(link({ lines: { a: line('a1', '4 dB') }, allowances: { limit: nowhere } }), EVIDENCE)
    expect(margins(without)).toEqual({ limit: { verdict: 'undecided', marginDb: null, knownDb: null } })
  })
})
