import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  type LimitCurve,
  type LimitPiece,
  limitAt,
  parseCurve,
  worstAgainst,
  writeCurve,
} from '../../lib/channel/limits'

const curve = (text: string): LimitCurve => {
  const parsed = parseCurve(text)
  if ('reason' in parsed) throw new Error(parsed.reason)
  return parsed
}
const reason = (text: string) => {
  const parsed = parseCurve(text)
  return 'reason' in parsed ? parsed.reason : 'none'
}
const none = { constant: 0, root: 0, linear: 0, square: 0, cube: 0, inverseRoot: 0 }

describe('a limit curve as typed', () => {
  it('is read term by term, in any order, with either sign, comma and times sign', () => {
    expect(curve('0.05..6 GHz: 0,8 + 5.5*sqrt(f) + f - 0.01 f^3 + 2e-1 f^2; 6 GHz..15 GHz: 4f − 3')).toEqual({
      pieces: [
        { ...none, fromHz: 5e7, toHz: 6e9, constant: 0.8, root: 5.5, linear: 1, square: 0.2, cube: -0.01 },
        { ...none, fromHz: 6e9, toHz: 15e9, constant: -3, linear: 4 },
      ],
      from: 5e7,
      to: 15e9,
    })
  })

  it('takes roots and powers as people write them, a lower end in MHz and a unit said once', () => {
    const same = { ...none, fromHz: 1e8, toHz: 2e9, root: 8.3, square: 3.4, cube: 1, inverseRoot: 0.4 }
    expect(curve('100 MHz..2 GHz: 8.3 √f + 3.4 f² + f³ + 0.4/sqrt(f)').pieces).toEqual([same])
    expect(curve('100 to 2000 MHz: 8.3 sqrt( f ) + 3.4 · f ^ 2 + f^3 + 0.4 / √f').pieces).toEqual([same])
  })

  it('is sorted by frequency and may have a gap', () => {
    const gap = curve('5..6 GHz: 3\n1..2 GHz: 1')
    expect([gap.from, gap.to, gap.pieces.map(({ fromHz }) => fromHz)]).toEqual([1e9, 6e9, [1e9, 5e9]])
    expect([limitAt(gap, 1.5e9), limitAt(gap, 3e9), limitAt(gap, 5e9)]).toEqual([1, null, 3])
  })

  it.each([
    ['1..2 GHz: 1; 2 GHz: 3', "Piece 2 ('2 GHz: 3'): type the range, a colon and the limit, such as '0.05..6"],
    ['1..2: 1', "Piece 1 ('1..2: 1'): Add a unit: Hz, kHz, MHz, GHz."],
    ['2..1 GHz: 1', "Piece 1 ('2..1 GHz: 1'): the range must rise: the lower frequency first."],
    ['0..1 GHz: 1', "Piece 1 ('0..1 GHz: 1'): the lowest frequency must be above zero."],
    ['1..3 GHz: 1; 2..4 GHz: 2', "Piece 2 ('2..4 GHz: 2'): overlaps the piece from 1 GHz to 3 GHz"],
    ['1..2 GHz:', "Piece 1 ('1..2 GHz:'): type the limit behind the colon"],
    ['1..2 GHz: 1 + 2 f^4', "Piece 1 ('1..2 GHz: 1 + 2 f^4'): '^4' cannot be read"],
    ['1..2 GHz: 1 2 f', "Piece 1 ('1..2 GHz: 1 2 f'): '2 f' cannot be read"],
    ['1..2 GHz: 1 / f', "Piece 1 ('1..2 GHz: 1 / f'): '1 / f' cannot be read"],
    ['1..2 GHz: 1.076*(0.5 f)', "Piece 1 ('1..2 GHz: 1.076*(0.5 f)'): '1.076*(0.5 f)' cannot be read"],
    ['1..2 GHz: 1 +', "Piece 1 ('1..2 GHz: 1 +'): '+' cannot be read"],
    ['1..2 GHz: f + 2 f', "Piece 1 ('1..2 GHz: f + 2 f'): '+ 2 f': this term is there twice; add the two."],
    ['1..2 GHz: 1,234 f', "Piece 1 ('1..2 GHz: 1,234 f'): Does 1,234 mean 1234 or 1.234?"],
    ['1..2 GHz: -1 f', "Piece 1 ('1..2 GHz: -1 f'): gives -1 dB at 1 GHz; a loss limit is positive"],
    [' ; ', "Type at least one piece, such as '0.05..6 GHz: 0.8 + 5.49 sqrt(f) + 1.16 f'."],
  ])('%j is refused by the number of the piece', (text, expected) => {
    expect(reason(text).slice(0, expected.length)).toBe(expected)
  })

  it('is read again as it was written, to the last digit', () => {
    const hz = fc.double({ min: 1e5, max: 3e11, noNaN: true, noDefaultInfinity: true })
    const coefficient = fc
      .oneof(fc.constant(0), fc.double({ min: -1e3, max: 1e3, noNaN: true }))
      .map((value) => value || 0)
    const terms = fc.record({
      // So large that the limit is positive whatever the other terms are.
      constant: fc.double({ min: 1e12, max: 1e15, noNaN: true }),
      root: coefficient,
      linear: coefficient,
      square: coefficient,
      cube: coefficient,
      inverseRoot: coefficient,
    })
    const pieces = fc
      .tuple(fc.uniqueArray(hz, { minLength: 2, maxLength: 7 }), fc.array(terms, { minLength: 6, maxLength: 6 }))
      .map(([ends, all]): LimitPiece[] => {
        const rising = ends.sort((a, b) => a - b)
        return rising.slice(1).map((toHz, i) => ({ ...none, ...all[i], fromHz: rising[i] ?? 0, toHz }))
      })
    fc.assert(
      fc.property(pieces, (some) => {
        expect(curve(writeCurve(some)).pieces).toEqual(some)
      }),
    )
  })

  it('is written in the words it is read in', () => {
    const text = '0.05..12.890625 GHz: 1.5 + 4.6 sqrt(f) + 1.318 f; 12.890625..25.78125 GHz: -12.71 + 3.7 f'
    expect(writeCurve(curve(text).pieces)).toBe(text)
    expect(writeCurve(curve('1..2 GHz: 4 / sqrt(f) - 0.1 f^2 + 0').pieces)).toBe('1..2 GHz: -0.1 f^2 + 4 / sqrt(f)')
    expect(writeCurve(curve('1..2 GHz: 0').pieces)).toBe('1..2 GHz: 0')
  })
})

describe('the limit at a frequency', () => {
  const kr = curve('0.05..6 GHz: 0.8 + 5 sqrt(f) + f; 6..15 GHz: -59.2 + 5 sqrt(f) + 11 f')

  it('is the sum of the terms with f in GHz (by hand)', () => {
    expect(limitAt(kr, 4e9)).toBeCloseTo(0.8 + 5 * 2 + 4, 12)
    expect(limitAt(kr, 9e9)).toBeCloseTo(-59.2 + 5 * 3 + 11 * 9, 12)
    expect(limitAt(curve('0.1..10 GHz: 8 sqrt(f) + 0.5 f^2 + 0.25 f^3 + 6 / sqrt(f)'), 4e9)).toBeCloseTo(
      16 + 8 + 16 + 3,
      12,
    )
  })

  it('is not continued outside the pieces; only rounding is forgiven', () => {
    expect([limitAt(kr, 4.9e7), limitAt(kr, 15.1e9)]).toEqual([null, null])
    expect(limitAt(kr, 15e9 * (1 + 1e-12))).toBeCloseTo(-59.2 + 5 * Math.sqrt(15) + 165, 6)
  })

  it('is the stricter one where two pieces meet, whichever side it is on', () => {
    expect(limitAt(curve('1..2 GHz: 5; 2..3 GHz: 4'), 2e9)).toBe(4)
    expect(limitAt(curve('1..2 GHz: 4; 2..3 GHz: 5'), 2e9)).toBe(4)
  })
})

describe('a sampled loss against a curve', () => {
  const flat = curve('2..4 GHz: 10; 6..8 GHz: 20')

  it('is judged within the pieces alone and says the worst excess and the band of the misses (by hand)', () => {
    const hz = [1e9, 2e9, 3e9, 4e9, 5e9, 6e9, 7e9, 9e9]
    expect(worstAgainst(flat, hz, [99, 9, 10.5, 12, 99, 20, 20.25, 99])).toEqual({
      missedFromHz: 3e9,
      missedToHz: 7e9,
      worstDb: 2,
      worstAtHz: 4e9,
    })
  })

  it('keeps a limit that it just reaches', () => {
    expect(worstAgainst(flat, Float64Array.of(3e9, 7e9), Float64Array.of(0.1 + 9.9, 20))).toBe(null)
  })

  it('refuses lists that do not belong together and losses that are not known', () => {
    expect(() => worstAgainst(flat, [3e9], [1, 2])).toThrow(RangeError)
    expect(() => worstAgainst(flat, [3e9], [Number.NaN])).toThrow(RangeError)
  })
})
