import { describe, expect, it } from 'vitest'
import type { Basis } from '../../../lib/budget/schema'
import { line, link } from '../links'
import { evaluated, flagged, words } from './flagged'

const { limit } = link({}).allowances
const judged = (rest: object) => ({ allowances: { limit: { ...limit, order: 'a0', ...rest } } })

describe('mistake 10: one lot taken as independent, a reserve and a corner for the same, "inside" on guesses (practice A2, A13)', () => {
  const lot = (rest: object) => ({
    assemblies: { b: { order: 'a0', name: 'Board' } },
    lines: {
      a: line('a1', '3 dB', { assembly: 'b', tolerancePlus: '0.3 dB', ...rest }),
      b: line('a2', '4 dB', { assembly: 'b', tolerancePlus: '0.4 dB', ...rest }),
    },
  })

  it('lines of one assembly vary together by default: 0.3 + 0.4, not √(0.3² + 0.4²) (JCGM 100:2008, 5.2.2)', () => {
    expect(evaluated(lot({})).allowances[0]?.rssDb).toBeCloseTo(0.7, 12)
    const apart = lot({ group: 'none', groupNote: 'Two fabricators.' })
    expect(evaluated(apart).allowances[0]?.rssDb).toBeCloseTo(0.5, 12)
    expect(flagged('group-off-without-note', apart)).toEqual([])
  })

  it('taking them apart without a reason changes nothing and is flagged', () => {
    expect(evaluated(lot({ group: 'none' })).allowances[0]?.rssDb).toBeCloseTo(0.7, 12)
    expect(flagged('group-off-without-note', lot({ group: 'none' }))).toEqual(['a groupNote', 'b groupNote'])
  })

  it('a reserve for temperature clashes with a hot corner, one for the process with the tolerances', () => {
    const held = (purpose: 'temperature' | 'process') => ({
      lines: {
        a: line('a1', '4 dB', { kind: 'trace' }),
        r: line('a2', '1 dB', { kind: 'reserve', at: null, purpose }),
      },
    })
    const hot = {
      ...judged({ judgedCorner: 'hot' }),
      corners: { hot: { order: 'a0', name: 'Hot', temperature: '65 °C', lossPerKelvin: '0.12 %/K' } },
    }
    expect(flagged('reserve-and-corner', { ...held('temperature'), ...hot })).toEqual(['r purpose'])
    expect(flagged('reserve-and-corner', held('temperature'))).toEqual([])
    expect(flagged('reserve-and-corner', { ...held('process'), ...judged({ judgedStatistic: 'rss' }) })).toEqual([
      'r purpose',
    ])
  })

  const guessed = (basis: Basis | null, loss = '3 dB') => ({
    lines: { a: line('a1', '7 dB', { basis: 'measured' }), b: line('a2', loss, { basis }) },
  })
  it('inside or tight, while targets, estimates and unsaid numbers exceed the margin', () => {
    // 12 dB allowed: 7 + 3 leave 2.
    for (const basis of ['target', 'estimate', null] as const)
      expect(flagged('inside-on-guesses', guessed(basis)), String(basis)).toEqual(['limit null'])
    for (const basis of ['simulated', 'datasheet', 'measured'] as const)
      expect(flagged('inside-on-guesses', guessed(basis)), basis).toEqual([])
    expect(words('inside-on-guesses', guessed('estimate'))).toMatch(
      /inside with 2\.00 dB of margin, while 3\.00 dB of loss/,
    )
    expect(flagged('inside-on-guesses', guessed('estimate', '2.4 dB'))).toEqual([])
    expect(flagged('inside-on-guesses', guessed('estimate', '4.5 dB'))).toEqual(['limit null'])
    expect(flagged('inside-on-guesses', guessed('estimate', '6 dB'))).toEqual([])
  })
})
