import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  bitsPerSymbol,
  LEVELS,
  type LineCode,
  type RateInput,
  ratesOf,
  usualMistake,
} from '../../lib/channel/signalling'

const BASE: RateInput = {
  bitRate: 10e9,
  rateType: 'line',
  code: 'NRZ',
  group: null,
  blockCode: null,
  fec: null,
}
const B64 = { payload: 64, sent: 66 }
const B257 = { payload: 256, sent: 257 }
const RS528 = { payload: 514, sent: 528 }
const RS544 = { payload: 514, sent: 544 }
const rates = (input: Partial<RateInput>) => {
  const found = ratesOf({ ...BASE, ...input })
  if (!found) throw new Error('no rates')
  return found
}
const mistake = (ghz: number, input: Partial<RateInput>) => usualMistake(ghz * 1e9, { ...BASE, ...input }, rates(input))

describe('published rates', () => {
  it.each([
    [
      '10GBASE-KR (intel.com 683805: 5.15625 GHz)',
      { bitRate: 10e9, rateType: 'payload', blockCode: B64 },
      10.3125,
      5.15625,
    ],
    [
      '25G lane, 256b/257b and RS(528,514) (from memory)',
      { bitRate: 25e9, rateType: 'payload', blockCode: B257, fec: RS528 },
      25.78125,
      12.890625,
    ],
    ['25G lane, 64b/66b (from memory)', { bitRate: 25e9, rateType: 'payload', blockCode: B64 }, 25.78125, 12.890625],
    [
      '50G lane PAM4 (intel.com 683805: 53.125 Gb/s)',
      { bitRate: 50e9, rateType: 'payload', code: 'PAM4', blockCode: B257, fec: RS544 },
      53.125,
      13.28125,
    ],
    [
      'the same bits as NRZ (physics.md D1)',
      { bitRate: 50e9, rateType: 'payload', blockCode: B257, fec: RS544 },
      53.125,
      26.5625,
    ],
    ['100G lane PAM4 (from memory)', { bitRate: 106.25e9, code: 'PAM4' }, 106.25, 26.5625],
    ['64 GT/s PAM4 (from memory)', { bitRate: 64e9, code: 'PAM4' }, 64, 16],
    ['32 GT/s NRZ (asteralabs.com, tag pci-sig)', { bitRate: 32e9 }, 32, 16],
  ] as const)('%s', (_, input, lineGb, nyquistGHz) => {
    const found = rates(input as Partial<RateInput>)
    expect(found.lineRate / 1e9).toBeCloseTo(lineGb, 9)
    expect(found.nyquist / 1e9).toBeCloseTo(nyquistGHz, 9)
    expect(found.unitInterval * found.symbolRate).toBeCloseTo(1, 15)
  })
})

describe('bits per symbol', () => {
  it.each([
    ['NRZ', 1],
    ['RZ', 1],
    ['PAM3', 1.584962500721156],
    ['PAM4', 2],
    ['PAM6', 2.584962500721156],
    ['PAM8', 3],
    ['PAM16', 4],
  ] as const)('%s carries log2 of its levels: %f (log2 by hand)', (code, expected) => {
    expect(bitsPerSymbol(code, null)).toBeCloseTo(expected, 15)
  })

  it('a coded group carries what it says: 11 bits in 7 ternary symbols are 1.5714', () => {
    expect(bitsPerSymbol('PAM3', { bits: 11, symbols: 7 })).toBe(11 / 7)
  })

  it('a group of more bits than its levels can tell apart is refused', () => {
    expect(bitsPerSymbol('PAM3', { bits: 12, symbols: 7 })).toBeNull()
    expect(bitsPerSymbol('PAM4', { bits: 2, symbols: 1 })).toBe(2)
    expect(ratesOf({ ...BASE, code: 'PAM3', group: { bits: 8, symbols: 5 } })).toBeNull()
  })

  it('RZ keeps the definition: half the symbol rate', () => {
    expect(rates({ code: 'RZ' }).nyquist).toBe(5e9)
  })

  it('bit rate over levels is never the Nyquist frequency but for 2 and 4 levels (arithmetic)', () => {
    for (const [code, levels] of Object.entries(LEVELS)) {
      const agrees = Math.abs(rates({ code: code as LineCode }).nyquist - BASE.bitRate / levels) < 1
      expect(agrees, code).toBe(levels === 2 || levels === 4)
    }
  })
})

describe('the usual wrong Nyquist frequency', () => {
  const pam4 = { bitRate: 106.25e9, code: 'PAM4' } as const
  const said = { ...pam4, blockCode: B257, fec: RS544 }
  const fifty = { bitRate: 53.125e9, code: 'PAM4', blockCode: B257, fec: RS544 } as const

  it.each([
    [12.890625, fifty, 'the Nyquist frequency with 64b/66b coding and without the FEC'],
    [
      12.89,
      { bitRate: 53.125e9, code: 'PAM4' },
      'the Nyquist frequency with 64b/66b coding and without the FEC, if the rate sent contains 256b/257b and RS(544,514)',
    ],
    [12.5, fifty, 'the Nyquist frequency of the payload, without coding and FEC'],
    [25, said, 'the Nyquist frequency of the payload, without coding and FEC'],
    [28, pam4, 'the Nyquist frequency of the 112 Gb/s rate class, not of the rate sent'],
    [106.25, pam4, 'the bit rate itself'],
    [53.125, pam4, 'the symbol rate; the Nyquist frequency is half of it'],
    [32, { bitRate: 32e9 }, 'the bit rate, which is the symbol rate; the Nyquist frequency is half of it'],
    [8, { bitRate: 32e9 }, 'the Nyquist frequency as if the code were PAM4'],
    [5, { bitRate: 10.3125e9 }, 'the Nyquist frequency without 64b/66b coding, if the rate sent contains it'],
    [5, { bitRate: 10.3125e9, blockCode: B64 }, 'the Nyquist frequency of the payload, without coding and FEC'],
    [40 / 3, { bitRate: 40e9, code: 'PAM3' }, 'the bit rate divided by the 3 levels instead of by the bits per symbol'],
    [5, { bitRate: 40e9, code: 'PAM8' }, 'the bit rate divided by the 8 levels instead of by the bits per symbol'],
    [20, { bitRate: 40e9, code: 'PAM3' }, 'the Nyquist frequency as if the code were NRZ'],
  ] as const)('%f GHz', (ghz, input, words) => {
    expect(mistake(ghz, input as Partial<RateInput>)).toBe(words)
  })

  it('is silent within 2 % of the right one, and where nothing fits', () => {
    expect(mistake(26.5625, pam4)).toBeNull()
    expect(mistake(26.1, pam4)).toBeNull()
    expect(mistake(26.5625 * 0.98, pam4)).toBeNull()
    expect(mistake(26.5625 * 1.02, pam4)).toBeNull()
    expect(mistake(19.3, pam4)).toBeNull()
  })

  it('never names the right frequency, whatever the signalling (random)', () => {
    const overhead = fc.option(
      fc
        .tuple(fc.integer({ min: 1, max: 600 }), fc.nat(60))
        .map(([payload, more]) => ({ payload, sent: payload + more })),
    )
    fc.assert(
      fc.property(
        fc.double({ min: 1e6, max: 2e12, noNaN: true }),
        fc.constantFrom(...(Object.keys(LEVELS) as LineCode[])),
        overhead,
        overhead,
        fc.double({ min: 0.98, max: 1.02, noNaN: true }),
        (bitRate, code, blockCode, fec, off) => {
          const input = { ...BASE, bitRate, code, blockCode, fec }
          const found = rates(input)
          return usualMistake(found.nyquist * off, input, found) === null
        },
      ),
    )
  })
})
