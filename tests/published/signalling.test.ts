import { describe, expect, it } from 'vitest'
import type { BudgetFile } from '../../lib/budget/schema'
import { evaluateFile } from './straightLink'

const signalling = (head: Omit<BudgetFile['head'], 'schemaVersion'>) =>
  evaluateFile({ head: { schemaVersion: 1, ...head } }).signalling

describe('the Nyquist frequency of published rates', () => {
  it('112 Gb/s PAM4 is 28 GHz (common practice, no source)', () => {
    expect(signalling({ bitRate: '112 Gb/s', rateType: 'line', code: 'PAM4' })).toMatchObject({
      lineRate: 112e9,
      bitsPerSymbol: 2,
      symbolRate: 56e9,
      nyquist: 28e9,
    })
  })

  it('10 Gb/s NRZ is 5 GHz (common practice, no source)', () => {
    expect(signalling({ bitRate: '10 Gb/s', rateType: 'line', code: 'NRZ' })).toMatchObject({
      bitsPerSymbol: 1,
      symbolRate: 10e9,
      unitInterval: 1e-10,
      nyquist: 5e9,
    })
  })

  it('32 GT/s NRZ is 16 GHz (asteralabs.com, tag pci-sig)', () => {
    expect(signalling({ bitRate: '32 GT/s', rateType: 'line', code: 'NRZ' }).nyquist).toBe(16e9)
  })

  it('ideal 40 Gb/s PAM3 is 12.62 GHz and not the 13.33 GHz of bit rate over levels (arithmetic, no source)', () => {
    // ln 3 / ln 2 = 1.584962500721156 bits a symbol.
    const nyquist = signalling({ bitRate: '40 Gb/s', rateType: 'line', code: 'PAM3' }).nyquist ?? 0
    expect(nyquist / 1e9).toBeCloseTo(40 / 1.584962500721156 / 2, 9)
    expect(nyquist / 1e9).toBeCloseTo(12.62, 2)
    expect(Math.abs(nyquist / 1e9 - 40 / 3)).toBeGreaterThan(0.7)
  })

  it('25.6 GBd of PAM3 with 11 bits in 7 symbols is 12.8 GHz (from memory)', () => {
    const bitRate = (25.6 * 11) / 7
    expect(bitRate).toBeCloseTo(40.228571428571, 9)
    const found = signalling({
      bitRate: `${bitRate} Gb/s`,
      rateType: 'line',
      code: 'PAM3',
      codedBits: 11,
      codedSymbols: 7,
    })
    expect((found.symbolRate ?? 0) / 1e9).toBeCloseTo(25.6, 9)
    expect((found.nyquist ?? 0) / 1e9).toBeCloseTo(12.8, 9)
  })

  it('50 Gb/s payload with 256b/257b and RS(544,514) as PAM4 is 13.28125 GHz (intel.com 683805)', () => {
    // That page: 50 × 66/64 = 51.5625; × 34/33 = 53.125 Gb/s. 257/256 × 544/514 is the same factor.
    const lineRate = ((50 * 66) / 64) * (34 / 33)
    const found = signalling({
      bitRate: '50 Gb/s',
      rateType: 'payload',
      code: 'PAM4',
      codingBits: 256,
      codingLineBits: 257,
      fecMessage: 514,
      fecCodeword: 544,
    })
    expect(lineRate).toBeCloseTo(53.125, 9)
    expect((found.lineRate ?? 0) / 1e9).toBeCloseTo(lineRate, 9)
    expect((found.nyquist ?? 0) / 1e9).toBeCloseTo(13.28125, 9)
  })

  it('25 Gb/s payload with 256b/257b and RS(528,514) as NRZ is 12.890625 GHz (from memory)', () => {
    const found = signalling({
      bitRate: '25 Gb/s',
      rateType: 'payload',
      code: 'NRZ',
      codingBits: 256,
      codingLineBits: 257,
      fecMessage: 514,
      fecCodeword: 528,
    })
    // The code words fit into what the transcoding saves: 25 × 66/64 exactly.
    expect((found.lineRate ?? 0) / 1e9).toBeCloseTo((25 * 66) / 64, 9)
    expect((found.nyquist ?? 0) / 1e9).toBeCloseTo(12.890625, 9)
  })
})
