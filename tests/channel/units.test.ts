import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  DIMENSIONS,
  type Dimension,
  formatQuantity,
  formatScaled,
  isQuantity,
  parseQuantity,
  withUnit,
} from '../../lib/channel/units'
import { SPELLINGS } from '../../lib/channel/units/dimensions'

const value = (text: string, dimension: Dimension) => {
  const result = parseQuantity(text, dimension)
  if (!isQuantity(result)) throw new Error(`${text}: ${result.reason}`)
  return result.value
}
const refusal = (text: string, dimension: Dimension) => {
  const result = parseQuantity(text, dimension)
  if (isQuantity(result)) throw new Error(`${text} was read as ${result.value}`)
  return result
}
const DIMENSION_NAMES = Object.keys(DIMENSIONS) as Dimension[]

describe('factors (NIST SP 811, appendix B.8: 1 in = 0.0254 m, 1 ft = 0.3048 m, exact)', () => {
  it.each([
    ['1 in', 'length', 0.0254],
    ['1 mil', 'length', 0.0000254],
    ['1 ft', 'length', 0.3048],
    ['1000 mil', 'length', 0.0254],
    ['25.4 mm', 'length', 0.0254],
    ['26.5625 GHz', 'frequency', 26562500000],
    ['106.25 Gb/s', 'bitRate', 106250000000],
    ['32 GT/s', 'bitRate', 32000000000],
    ['0.0254 dB/mm', 'lossPerLength', 25.4],
    ['1 dB/in', 'lossPerLength', 1 / 0.0254],
    ['12 dB/ft', 'lossPerLength', 12 / 0.3048],
    ['170 ps/in', 'delayPerLength', 170e-12 / 0.0254],
    ['120 fF', 'capacitance', 120e-15],
    ['0.12 %/K', 'perKelvin', 0.0012],
    ['-40 °C', 'temperature', -40],
  ] as const)('%s', (text, dimension, expected) => {
    expect(value(text, dimension)).toBeCloseTo(expected, 15 - Math.ceil(Math.log10(Math.abs(expected))))
  })

  it('reads decimal units to the double nearest to what was typed', () => {
    expect(value('0.3 GHz', 'frequency')).toBe(300000000)
    expect(value('1.1 GHz', 'frequency')).toBe(1100000000)
    expect(value('0.1 mm', 'length')).toBe(0.0001)
    expect(value('12.3 fF', 'capacitance')).toBe(12.3e-15)
    expect(value('6 %', 'ratio')).toBe(0.06)
    expect(value('2.3e3 ps', 'time')).toBe(2.3e-9)
  })
})

describe('what a person types', () => {
  it.each([
    ['3,2 in', 'length', 3.2 * 0.0254],
    ['3.2in', 'length', 3.2 * 0.0254],
    ['3.2"', 'length', 3.2 * 0.0254],
    ['3.2 inches', 'length', 3.2 * 0.0254],
    ['0,125 in', 'length', 0.125 * 0.0254],
    ['12,34 mm', 'length', 0.01234],
    ['.5 dB', 'loss', 0.5],
    [',5 dB', 'loss', 0.5],
    ['−1.5 dB', 'loss', -1.5],
    ['– 1.5 dB', 'loss', -1.5],
    ['+1.5 dB', 'loss', 1.5],
    ['1e−3 dB', 'loss', 0.001],
    ['3\u00a0dB', 'loss', 3],
    ['3\u202fdB', 'loss', 3],
    [' 5 \u03bcm ', 'length', 5e-6],
    ['5 \u00b5m', 'length', 5e-6],
    ['100 \u2126', 'resistance', 100],
    ['100 \u03a9', 'resistance', 100],
    ['100 ohms', 'resistance', 100],
    ['26.5625 ghz', 'frequency', 26.5625e9],
    ['0.95 DB/IN', 'lossPerLength', 0.95 / 0.0254],
    ['0.95 dB / inch', 'lossPerLength', 0.95 / 0.0254],
    ['53.125 GBaud', 'symbolRate', 53.125e9],
    ['106.25 Gbit/s', 'bitRate', 106.25e9],
    ['106.25 Gbps', 'bitRate', 106.25e9],
    ['65 ° C', 'temperature', 65],
    ['65 ℃', 'temperature', 65],
    ['3.6', 'number', 3.6],
  ] as const)('reads %j', (text, dimension, expected) => {
    expect(value(text, dimension)).toBeCloseTo(expected, 12)
  })

  it('asks back where a comma could part thousands', () => {
    expect(refusal('1,234 mm', 'length')).toEqual({
      code: 'ambiguous-comma',
      reason: 'Does 1,234 mean 1234 or 1.234? Type it without the comma or with a point.',
    })
    expect(refusal('-12,345 dB', 'loss').code).toBe('ambiguous-comma')
  })

  it.each(['1,234.5 mm', '1.234,5 mm', '1,234,567 mm', '1 234 mm', "1'234 mm", '1.2.3 mm'])(
    'says that %j has thousands separators',
    (text) => {
      expect(refusal(text, 'length').reason).toBe('Type the number without thousands separators, such as 1234.5.')
    },
  )

  it('refuses a bare number and names the units', () => {
    expect(refusal('3.2', 'length')).toEqual({
      code: 'unit-missing',
      reason: 'Add a unit: m, cm, mm, µm, in, mil, ft.',
    })
    expect(parseQuantity('3.2', ['loss', 'ratio'])).toEqual({ code: 'unit-missing', reason: 'Add a unit: dB, %.' })
  })

  it.each([
    ['5 GB/s', 'bitRate'],
    ['5 MHZ/s', 'frequency'],
    ['5 mhz', 'frequency'],
    ['5 MM', 'length'],
    ['5 MΩ', 'resistance'],
    ['5 dB/m', 'loss'],
    ['5 constructor', 'loss'],
    ['5 __proto__', 'length'],
    ['5 toString', 'number'],
  ] as const)('does not take %j for a %s', (text, dimension) => {
    expect(refusal(text, dimension).code).toBe('unit-unknown')
  })

  it('never reads a number as nothing: too small and too large are refused', () => {
    expect(refusal('1e-400 mm', 'length').reason).toBe('The number is too small.')
    expect(refusal('1e400 mm', 'length').reason).toBe('The number is too large.')
    expect(refusal('1e9999 mm', 'length').code).toBe('unit-unknown')
    expect(Object.is(value('-0 dB', 'loss'), 0)).toBe(true)
  })

  it('adds the unit of the field to a bare number only', () => {
    expect(withUnit(' 3.2 ', 'length', 'in')).toBe('3.2 in')
    expect(withUnit('3.2 mm', 'length', 'in')).toBe('3.2 mm')
    expect(withUnit('1,234', 'length', 'in')).toBe('1,234')
  })
})

describe('every unit and spelling', () => {
  it('each spelling is understood by some dimension', () => {
    for (const spelling of Object.keys(SPELLINGS)) {
      const read = DIMENSION_NAMES.some((dimension) => isQuantity(parseQuantity(`1 ${spelling}`, dimension)))
      expect(read, spelling).toBe(true)
    }
  })

  it('no unit of a dimension is another one but for its case', () => {
    for (const dimension of DIMENSION_NAMES) {
      const units = Object.keys(DIMENSIONS[dimension].units)
      for (const unit of units) expect(parseQuantity(`1 ${unit}`, dimension)).toMatchObject({ unit, dimension })
    }
  })
})

describe('any text', () => {
  const piece = fc.oneof(
    fc.constantFrom(...'0123456789.,+-−eE %/°µμΩ"dBGHzinmsFfp\u00a0'),
    fc.constantFrom('1,234', '1e', 'GHz', 'dB/in', 'constructor', '__proto__', ' '),
    fc.string({ unit: 'grapheme', maxLength: 3 }),
  )
  const text = fc.array(piece, { maxLength: 14 }).map((pieces) => pieces.join(''))

  it('is a finite value in a unit of the field, or a refusal with a sentence', () => {
    fc.assert(
      fc.property(text, fc.constantFrom(...DIMENSION_NAMES), (typed, dimension) => {
        const result = parseQuantity(typed, dimension)
        if (!isQuantity(result)) return /^[A-Z'].*[.?]$/su.test(result.reason)
        return (
          Number.isFinite(result.value) &&
          !Object.is(result.value, -0) &&
          Object.hasOwn(DIMENSIONS[dimension].units, result.unit)
        )
      }),
      { numRuns: 3000 },
    )
  })

  it('reads what it writes', () => {
    const number = fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e15, max: 1e15 })
    const unit = fc
      .constantFrom(...DIMENSION_NAMES)
      .chain((dimension) =>
        fc.constantFrom(...Object.keys(DIMENSIONS[dimension].units)).map((u) => ({ dimension, unit: u })),
      )
    fc.assert(
      fc.property(number, unit, (si, { dimension, unit: u }) => {
        fc.pre(Math.abs(si) > 1e-280 || si === 0)
        const read = value(formatQuantity(si, dimension, u as never, 17), dimension)
        expect(Math.abs(read - si)).toBeLessThanOrEqual(Math.abs(si) * 1e-15)
      }),
    )
  })

  it('reads a decimal point and an unambiguous decimal comma alike', () => {
    fc.assert(
      fc.property(fc.nat(99999), fc.stringMatching(/^\d{1,5}$/), (whole, fraction) => {
        fc.pre(fraction.length !== 3 || whole > 999 || whole === 0)
        expect(value(`${whole},${fraction} mm`, 'length')).toBe(value(`${whole}.${fraction} mm`, 'length'))
      }),
    )
  })
})

describe('writing', () => {
  it('writes as many digits as asked for and no zeros at the end', () => {
    expect(formatQuantity(26.5625e9, 'frequency', 'GHz')).toBe('26.5625 GHz')
    expect(formatQuantity(0.08128, 'length', 'in')).toBe('3.2 in')
    expect(formatQuantity(1 / 3, 'length', 'mm', 4)).toBe('333.3 mm')
    expect(formatQuantity(-0, 'loss', 'dB')).toBe('0 dB')
    expect(formatQuantity(3.6, 'number', '')).toBe('3.6')
  })

  it('chooses the unit with one to three digits before the point', () => {
    expect(formatScaled(5.15625e9, 'frequency')).toBe('5.15625 GHz')
    expect(formatScaled(999.9999999e6, 'frequency')).toBe('1 GHz')
    expect(formatScaled(0, 'frequency')).toBe('0 Hz')
    expect(formatScaled(120e-15, 'capacitance')).toBe('120 fF')
    expect(formatScaled(2e-12, 'time')).toBe('2 ps')
    expect(formatScaled(106.25e9, 'bitRate')).toBe('106.25 Gb/s')
  })

  it('refuses what is no number', () => {
    expect(() => formatQuantity(Number.NaN, 'loss', 'dB')).toThrow(RangeError)
  })
})
