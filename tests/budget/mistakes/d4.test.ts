import { describe, expect, it } from 'vitest'
import type { BudgetFile } from '../../../lib/budget/schema'
import { line, link } from '../links'
import { evaluated, flagged, words } from './flagged'

type Head = Partial<BudgetFile['head']>
const { head, allowances } = link({})
const RS544 = { codingBits: 256, codingLineBits: 257, fecMessage: 514, fecCodeword: 544 }
const NRZ_32 = { bitRate: '32 Gb/s', code: 'NRZ' } as const
const PAM4_53 = { bitRate: '53.125 Gb/s', code: 'PAM4' } as const
const PAM4_106 = { bitRate: '106.25 Gb/s', code: 'PAM4' } as const

const at = (rates: Head, ghz: string, nyquist: string) => ({
  head: { ...head, ...rates },
  lines: { v: line('a1', '1 dB', { kind: 'via', at: `${ghz} GHz` }) },
  allowances: { limit: { ...allowances.limit, order: 'a0', at: `${nyquist} GHz` } },
})

/** Rates and Nyquist frequencies: practice.md D4; 50 and 100 Gb/s lanes with RS(544,514): IEEE 802.3 clauses 91 and 134 (from memory). */
describe('mistake 4: a loss at the wrong Nyquist frequency, named (rates from memory of IEEE 802.3 and PCI Express)', () => {
  it.each([
    ['12.89 for 13.28: without the FEC', { ...PAM4_53, ...RS544 }, '12.890625', '13.28125', /without the FEC/],
    ['28.0 for 26.5625: the rate class', PAM4_106, '28', '26.5625', /rate class/],
    ['the symbol rate for its half', PAM4_106, '53.125', '26.5625', /symbol rate; the Nyquist frequency is half/],
    ['32 for 16 GHz: the symbol rate of NRZ', NRZ_32, '32', '16', /symbol rate; the Nyquist frequency is half/],
    [
      'bit rate by levels: 13.33 for 12.62 of PAM3',
      { bitRate: '40 Gb/s', code: 'PAM3' },
      '13.3333',
      '12.6186',
      /divided by the 3 levels/,
    ],
    [
      'the payload instead of the rate sent',
      { bitRate: '50 Gb/s', rateType: 'payload', code: 'PAM4', ...RS544 },
      '12.5',
      '13.28125',
      /of the payload, without coding and FEC/,
    ],
    ['as if it were NRZ', PAM4_106, '53.125', '26.5625', /symbol rate|NRZ/],
  ] satisfies [string, Head, string, string, RegExp][])('%s', (_, rates, wrong, nyquist, named) => {
    const parts = at(rates, wrong, nyquist)
    expect(evaluated(parts).allowances[0]?.verdict).toBe('undecided')
    expect(flagged('frequency-too-far', parts)).toEqual(['v at'])
    expect(flagged('usual-wrong-frequency', parts)).toEqual(['v at'])
    expect(words('usual-wrong-frequency', parts)).toMatch(named)
  })

  it('within 2 % it holds and nothing is said; a little further a discrete is undecided', () => {
    const right = at(PAM4_106, '26.05', '26.5625')
    expect(evaluated(right).lines.v?.loss.nominalDb).toBe(1)
    expect(evaluated(right).flags).toEqual([])
    expect(evaluated(at(PAM4_106, '26.03', '26.5625')).lines.v?.loss.nominalDb).toBeNull()
  })

  it('an allowance at a usual wrong frequency is named too', () => {
    expect(flagged('usual-wrong-frequency', at(PAM4_106, '26.5625', '28'))).toContain('limit at')
  })
})
