import { describe, expect, it } from 'vitest'
import { evaluate } from '../../lib/budget/evaluate'
import type { BudgetFile } from '../../lib/budget/schema'
import { link } from './links'

const head = (fields: Partial<BudgetFile['head']>) => {
  const { signalling, flags } = evaluate(link({ head: { schemaVersion: 1, ...fields } }), new Map())
  const ofHead = flags.filter(({ section, code }) => section === 'head' && code !== 'no-allowance')
  return { ...signalling, flags: ofHead.map(({ code, field }) => [code, field]) }
}

describe('what the head says about the rate', () => {
  it('states that a line rate includes coding and FEC', () => {
    expect(head({ bitRate: '106.25 Gb/s', rateType: 'line', code: 'PAM4' })).toEqual({
      lineRate: 106.25e9,
      bitsPerSymbol: 2,
      symbolRate: 53.125e9,
      unitInterval: 1 / 53.125e9,
      nyquist: 26.5625e9,
      statement:
        '106.25 Gb/s a lane as sent, coding and FEC included; PAM4, 2 bits per symbol, 53.125 GBd; Nyquist frequency 26.5625 GHz.',
      flags: [],
    })
  })

  it('states what a payload becomes (50 Gb/s with 256b/257b and RS(544,514): 53.125 Gb/s, intel.com 683805)', () => {
    const found = head({
      bitRate: '50 Gb/s',
      rateType: 'payload',
      code: 'PAM4',
      codingBits: 256,
      codingLineBits: 257,
      fecMessage: 514,
      fecCodeword: 544,
    })
    expect(found.statement).toBe(
      '50 Gb/s of payload a lane becomes 53.125 Gb/s as sent, with block code 256 → 257 and FEC 514 → 544; PAM4, 2 bits per symbol, 26.5625 GBd; Nyquist frequency 13.28125 GHz.',
    )
  })

  it('says what the Nyquist frequency means for RZ, and that log2 is an ideal', () => {
    expect(head({ bitRate: '10 Gb/s', rateType: 'line', code: 'RZ' }).statement).toMatch(
      /Nyquist frequency 5 GHz, half the symbol rate; a run of ones has its fundamental at the symbol rate, twice as high\.$/,
    )
    expect(head({ bitRate: '10 Gb/s', rateType: 'line', code: 'PAM6' }).statement).toMatch(
      /2\.585 bits per symbol \(the ideal; a code carries less\)/,
    )
  })

  it('takes a rate of unsaid type as sent, and warns', () => {
    const found = head({ bitRate: '10 Gb/s', code: 'NRZ' })
    expect(found.nyquist).toBe(5e9)
    expect(found.flags).toEqual([['rate-type-not-said', 'rateType']])
  })

  it.each([
    [{ rateType: 'line', code: 'NRZ' }, [['signalling-incomplete', 'bitRate']]],
    [{ rateType: 'line', bitRate: '10 Gb/s' }, [['signalling-incomplete', 'code']]],
    [{ rateType: 'payload', bitRate: '10 Gb/s', code: 'NRZ' }, [['signalling-incomplete', 'codingBits']]],
    [
      { rateType: 'line', bitRate: '10 Gb/s', code: 'NRZ', codingBits: 64 },
      [['signalling-incomplete', 'codingLineBits']],
    ],
    [
      { rateType: 'line', bitRate: '10 Gb/s', code: 'NRZ', fecCodeword: 544 },
      [['signalling-incomplete', 'fecMessage']],
    ],
    [
      { rateType: 'line', bitRate: '10 Gb/s', code: 'PAM3', codedBits: 11 },
      [['signalling-incomplete', 'codedSymbols']],
    ],
    [
      { rateType: 'line', bitRate: '10 Gb/s', code: 'PAM3', codedBits: 8, codedSymbols: 5 },
      [['signalling-impossible', 'codedBits']],
    ],
    [
      { rateType: 'line', bitRate: '10 Gb/s', code: 'NRZ', codingBits: 66, codingLineBits: 64 },
      [['signalling-impossible', 'codingLineBits']],
    ],
  ] as const)('gives no Nyquist frequency for %j', (fields, flags) => {
    const found = head(fields as Partial<BudgetFile['head']>)
    expect(found.nyquist).toBeNull()
    expect(found.symbolRate).toBeNull()
    expect(found.flags).toEqual(flags)
  })

  it('a link without a Nyquist frequency is judged at the frequency of its allowance', () => {
    const budget = link({
      head: { schemaVersion: 1 },
      lines: { a: { order: 'a1', kind: 'via', model: 'stated', loss: '2 dB', at: '10 GHz' } },
    })
    const evaluation = evaluate(budget, new Map())
    expect(evaluation.allowances[0]).toMatchObject({ verdict: 'inside', words: 'inside at 10 GHz', knownDb: 2 })
    expect(evaluation.lines.a?.loss).toEqual({
      atHz: null,
      nominalDb: null,
      lowDb: null,
      highDb: null,
      by: null,
      beside: [],
    })
  })
})
