import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { Decimal } from '../../../lib/channel/touchstone/decimal'

const decimal = new Decimal()
const read = (text: string, shift = 0) => decimal.read(new TextEncoder().encode(text), 0, shift)

/** Texts whose value differs from Number(text) in any bit, the sign of zero among them. Number is ECMAScript's correctly rounded reading. */
const wrong = (texts: readonly string[]) => texts.filter((text) => !Object.is(read(text), Number(text)))

const digits = (most: number) => fc.stringMatching(new RegExp(`^\\d{1,${most}}$`))
const sign = fc.constantFrom('', '-', '+')
const exponent = (most: number) =>
  fc.oneof(
    fc.constant(''),
    fc
      .tuple(
        fc.constantFrom('e', 'E', 'e+', 'E-', 'e-', 'E+'),
        fc.integer({ min: 0, max: most }),
        fc.integer({ min: 1, max: 3 }),
      )
      .map(([mark, value, width]) => `${mark}${String(value).padStart(width, '0')}`),
  )
const text = (before: number, behind: number, power: number) =>
  fc.tuple(sign, digits(before), digits(behind), exponent(power)).map(([s, a, b, e]) => `${s}${a}.${b}${e}`)

describe('decimal numbers have the bits of Number()', () => {
  it.each([
    ['as files have them', text(3, 16, 12)],
    ['with 20 and more digits', text(5, 28, 40)],
    ['with powers out to zero, subnormals and infinity', text(4, 20, 345)],
    ['with hundreds of digits', text(150, 150, 30)],
  ])('%s: 20,000 random texts, the seed is printed on failure', (_, texts) => {
    fc.assert(
      fc.property(fc.array(texts, { minLength: 200, maxLength: 200 }), (many) => {
        expect(wrong(many)).toEqual([])
      }),
      { numRuns: 100 },
    )
  })

  it('of every double, written as short as it goes and with 17 and 21 digits: 20,000 random ones', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ noNaN: true, noDefaultInfinity: true }), { minLength: 200, maxLength: 200 }),
        (values) => {
          const texts = values.flatMap((value) => [String(value), value.toExponential(16), value.toExponential(20)])
          expect(wrong(texts.map((text) => (text === '0' ? '-0' : text)))).toEqual([])
        },
      ),
      { numRuns: 100 },
    )
  })

  it('where two doubles are equally near, or nearly so: 2,000 random middles and their neighbours in the last digit', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 2 ** 52 - 1 }), fc.integer({ min: -8, max: 6 }), (fraction, power) => {
        // The middle of two neighbours: an odd number of halves of their distance, exact in decimal.
        const halves = (2n ** 52n + BigInt(fraction)) * 2n + 1n
        const middle = power >= 0 ? `${halves * 2n ** BigInt(power)}` : (halves * 5n ** BigInt(-power)).toString()
        const scale = power >= 0 ? '' : `e${power}`
        const last = BigInt(middle)
        expect(wrong([`${middle}${scale}`, `${last + 1n}${scale}`, `${last - 1n}${scale}`])).toEqual([])
      }),
      { numRuns: 2000 },
    )
  })

  it.each([
    '0',
    '-0',
    '+0.0',
    '.5',
    '5.',
    '-.25E+2',
    '00012.500',
    '1e22',
    '1e23',
    '9007199254740993',
    '9007199254740992.5',
    '1.7976931348623157e308',
    '1.7976931348623159e308',
    '4.9e-324',
    '2.4703282292062327e-324',
    '2.4703282292062328e-324',
    '2.2250738585072011e-308',
    '2.2250738585072014e-308',
    '1e-400',
    '1e400',
    '0e99999999',
    '1.00000000000000000000e+007',
    '0.000000000000000000000000000000000000001234567890123456789',
    '123456789012345678901234567890',
    '8.41e+21',
    '9.5e-21',
    '6.0221407600000000000000000001e23',
    '1e0000000000000000000005',
    '1e-99999999999999999999',
  ])('%s', (text) => {
    expect(wrong([text])).toEqual([])
  })
})

describe('a unit moves the point before the number is rounded', () => {
  it('as Number() of the text with the power added: 20,000 random frequencies', () => {
    fc.assert(
      fc.property(
        fc.array(fc.tuple(text(4, 17, 9), fc.constantFrom(3, 6, 9)), { minLength: 200, maxLength: 200 }),
        (many) => {
          const differ = many.filter(([text, shift]) => {
            const [mantissa = '', power = '0'] = text.toLowerCase().split('e')
            return !Object.is(read(text, shift), Number(`${mantissa}e${Number(power) + shift}`))
          })
          expect(differ).toEqual([])
        },
      ),
      { numRuns: 100 },
    )
  })

  it('so that one frequency is one number in every unit', () => {
    expect([read('4.35', 9), read('4350', 6), read('4350000', 3)]).toEqual([4.35e9, 4.35e9, 4.35e9])
    expect(read('1.005', 9)).toBe(1_005_000_000)
  })
})

describe('what is no number', () => {
  it.each(['', '-', '.', '+.', 'e5', '1e', '1e+', '-.e1', 'nan', 'inf', `1${'0'.repeat(400)}`])('%j is NaN', (text) => {
    expect(read(text)).toBeNaN()
  })

  it('ends where the number does', () => {
    read('1.5.2')
    expect(decimal.end).toBe(3)
    read('-12e-3,4')
    expect(decimal.end).toBe(6)
  })
})
