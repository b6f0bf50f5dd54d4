import { describe, expect, it } from 'vitest'
import { compareVerdicts, type Facts, verdictOf, worstVerdict } from '../../../lib/budget/allowance/verdict'
import type { Verdict } from '../../../lib/budget/schema'

/** 12 dB with 1 dB of required margin, 9 dB used, judged at Nyquist. */
const facts = (rest: Partial<Facts> = {}): Facts => ({
  limit: 12,
  requiredMargin: 1,
  leastLoss: null,
  known: 9,
  lowest: 9,
  undecidedLines: 0,
  overlapUndecided: false,
  blocked: [],
  missed: [],
  unknown: [],
  where: 'at Nyquist',
  atNyquist: true,
  ...rest,
})
const elsewhere = { where: 'at 20 GHz', atNyquist: false }
const words = (rest: Partial<Facts>) => verdictOf(facts(rest)).words

describe('a verdict (word list of the design; common practice, no source)', () => {
  it('is inside with nothing to say, and names the frequency where it is not Nyquist', () => {
    expect(verdictOf(facts())).toEqual({ verdict: 'inside', words: 'inside', reasons: [] })
    expect(words(elsewhere)).toBe('inside at 20 GHz')
  })

  it('names the frequency too where something beside the loss is unknown', () => {
    expect(words({ unknown: ['limit curve', 'return loss'] })).toBe(
      'inside at Nyquist; limit curve and return loss unknown',
    )
    expect(words({ ...elsewhere, unknown: ['return loss'] })).toBe('inside at 20 GHz; return loss unknown')
  })

  it('is undecided without a limit, or where the limit cannot be compared, whatever the sum', () => {
    expect(verdictOf(facts({ limit: null, known: 99 }))).toEqual({
      verdict: 'undecided',
      words: 'undecided: the allowance has no limit',
      reasons: ['the allowance has no limit'],
    })
    expect(verdictOf(facts({ known: 99, blocked: ['other planes', 'other reference'] }))).toEqual({
      verdict: 'undecided',
      words: 'undecided: other planes',
      reasons: ['other planes', 'other reference'],
    })
    expect(words({ limit: null, blocked: ['other planes'] })).toBe('undecided: other planes')
  })

  it('is over, with lines undecided too', () => {
    expect(verdictOf(facts({ known: 12.5 }))).toEqual({ verdict: 'over', words: 'over by 0.50 dB', reasons: [] })
    expect(words({ known: 12.5, ...elsewhere })).toBe('over by 0.50 dB at 20 GHz')
    expect(words({ known: 12.5, undecidedLines: 1 })).toBe('over by 0.50 dB although 1 line is undecided')
    expect(words({ known: 12.5, undecidedLines: 2, ...elsewhere })).toBe(
      'over by 0.50 dB at 20 GHz although 2 lines are undecided',
    )
  })

  it('is not over where an overlap without a number may still bring the sum down', () => {
    expect(verdictOf(facts({ known: 12.5, undecidedLines: 1, overlapUndecided: true }))).toEqual({
      verdict: 'undecided',
      words: 'undecided: 12.50 of 12.00 dB used before an overlap without a number',
      reasons: [],
    })
    const left = { undecidedLines: 1, overlapUndecided: true, ...elsewhere }
    expect(words(left)).toBe('undecided at 20 GHz: 9.00 of 12.00 dB used, 3.00 dB left for 1 line')
    expect(words({ ...left, known: 12 })).toBe('undecided at 20 GHz: 12.00 of 12.00 dB used, 0.00 dB left for 1 line')
  })

  it('is undecided with lines without a number, even where too little is left already', () => {
    expect(words({ known: 11.5, undecidedLines: 2 })).toBe(
      'undecided: 11.50 of 12.00 dB used, 0.50 dB left for 2 lines',
    )
  })

  it('is tight for each of its reasons, all of them named', () => {
    const margin = '0.50 dB left where 1.00 dB are required'
    expect(verdictOf(facts({ known: 11.5 }))).toEqual({
      verdict: 'tight',
      words: `tight: ${margin}`,
      reasons: [margin],
    })
    const least = '0.25 dB under the least loss of 8.00 dB'
    expect(words({ leastLoss: null, known: -1, lowest: -1 })).toBe('inside')
    const curve = 'the limit curve is missed by 0.10 dB'
    expect(verdictOf(facts({ leastLoss: 8, lowest: 7.75 })).reasons).toEqual([least])
    expect(verdictOf(facts({ missed: [curve] }))).toEqual({
      verdict: 'tight',
      words: `tight: ${curve}`,
      reasons: [curve],
    })
    const all = facts({
      known: 11.5,
      leastLoss: 8,
      lowest: 7.75,
      missed: [curve],
      unknown: ['return loss'],
      ...elsewhere,
    })
    expect(verdictOf(all)).toEqual({
      verdict: 'tight',
      words: `tight at 20 GHz: ${margin}; ${least}; ${curve}; return loss unknown`,
      reasons: [margin, least, curve],
    })
  })

  it('takes a billionth of a decibel for the rounding of a sum, and no more, on each border', () => {
    const none = { limit: 0, requiredMargin: 0, known: 1e-9, lowest: 0 }
    expect(words(none)).toBe('inside')
    expect(words({ ...none, leastLoss: 0, lowest: -1e-9 })).toBe('inside')
    expect(words({ ...none, undecidedLines: 1, overlapUndecided: true })).toContain('left for 1 line')
    expect(verdictOf(facts({ ...none, known: 2e-9 })).verdict).toBe('over')
    expect(verdictOf(facts({ ...none, known: 0, requiredMargin: 2e-9 })).verdict).toBe('tight')
    expect(verdictOf(facts({ ...none, leastLoss: 0, lowest: -2e-9 })).verdict).toBe('tight')
    // What closes exactly, or nearly, keeps a required margin of nothing.
    expect(verdictOf(facts({ limit: 0.3, requiredMargin: 0, known: 0.1 + 0.2 })).verdict).toBe('inside')
  })
})

describe('of several verdicts', () => {
  it('over is worse than undecided, undecided than tight, tight than inside', () => {
    const all: Verdict[] = ['tight', 'inside', 'over', 'undecided']
    expect([...all].sort(compareVerdicts)).toEqual(['over', 'undecided', 'tight', 'inside'])
    expect(compareVerdicts('tight', 'tight')).toBe(0)
  })

  it('the worst counts, and none at all is undecided; the list stays as it was', () => {
    const list: readonly Verdict[] = ['inside', 'tight', 'inside']
    expect(worstVerdict(list)).toBe('tight')
    expect(list).toEqual(['inside', 'tight', 'inside'])
    expect(worstVerdict(['tight', 'over', 'undecided'])).toBe('over')
    expect(worstVerdict([])).toBe('undecided')
  })
})
