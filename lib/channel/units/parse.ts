import { DIMENSIONS, type Dimension } from './dimensions'
import { unitOf } from './unit'

export type Quantity = {
  /** Value in the SI unit of the dimension (temperature: °C; loss: dB). */
  readonly value: number
  readonly unit: string
  readonly dimension: Dimension
}

export type QuantityRefusal = {
  readonly code: 'empty' | 'not-a-number' | 'ambiguous-comma' | 'unit-missing' | 'unit-unknown'
  /** A sentence that says what to do. */
  readonly reason: string
}

/** A sign (minus, true minus or en dash), digits with one point or comma, and a power of ten. */
const NUMBER = /^([+\-−–]?)\s*(\d+(?:[.,]\d+)?|[.,]\d+)(?:[eE]([+\-−]?\d{1,3})(?!\d))?/

/**
 * Reads a number with its unit as a person types it: '3.2 in', '120mil', '3,2 mm', '0.85 dB/in'.
 * A decimal comma is read where it can only be one; '1,234' could be a thousand and is asked back.
 * @returns the value in SI units, or a refusal with a sentence that says what to do; never throws.
 */
export function parseQuantity(text: string, dimensions: Dimension | readonly Dimension[]): Quantity | QuantityRefusal {
  const wanted = typeof dimensions === 'string' ? [dimensions] : dimensions
  const trimmed = text.trim()
  if (trimmed === '') return { code: 'empty', reason: 'Type a number with its unit.' }
  const match = NUMBER.exec(trimmed)
  if (!match) return { code: 'not-a-number', reason: `Start with a number, such as ${example(wanted)}.` }
  const [whole, sign = '', digits = '', exponent = '0'] = match
  const rest = trimmed.slice(whole.length).trim()
  if (/^[.,'’\d]/.test(rest)) {
    return { code: 'not-a-number', reason: 'Type the number without thousands separators, such as 1234.5.' }
  }
  if (/^[1-9]\d{0,2},\d{3}$/.test(digits)) {
    const [left, right] = digits.split(',')
    return {
      code: 'ambiguous-comma',
      reason: `Does ${digits} mean ${left}${right} or ${left}.${right}? Type it without the comma or with a point.`,
    }
  }
  const decimal = digits.replace(',', '.')
  for (const dimension of wanted) {
    const found = unitOf(rest, dimension)
    if (found === null) continue
    const magnitude = times(decimal, Number(exponent.replace('−', '-')), found.factor)
    if (!Number.isFinite(magnitude)) return { code: 'not-a-number', reason: 'The number is too large.' }
    if (magnitude === 0 && /[1-9]/.test(decimal)) return { code: 'not-a-number', reason: 'The number is too small.' }
    const negative = sign !== '' && sign !== '+'
    return { value: negative && magnitude !== 0 ? -magnitude : magnitude, unit: found.unit, dimension }
  }
  if (rest === '') return { code: 'unit-missing', reason: `Add a unit: ${unitsOf(wanted)}.` }
  return { code: 'unit-unknown', reason: `'${rest}' is not a unit for this field; use ${unitsOf(wanted)}.` }
}

/** Digits × 10^exponent × factor. Where the factor is a power of ten too, the result is the double nearest to what was typed. */
function times(decimal: string, exponent: number, factor: number): number {
  const power = Math.round(Math.log10(factor))
  return Number(`1e${power}`) === factor
    ? Number(`${decimal}e${exponent + power}`)
    : Number(`${decimal}e${exponent}`) * factor
}

export function isQuantity(result: Quantity | QuantityRefusal): result is Quantity {
  return 'value' in result
}

/** Adds the unit of the field where a person typed a bare number, so that what is kept can be read alone. */
export function withUnit(text: string, dimensions: Dimension | readonly Dimension[], unit: string): string {
  const result = parseQuantity(text, dimensions)
  return !isQuantity(result) && result.code === 'unit-missing' && unit !== '' ? `${text.trim()} ${unit}` : text.trim()
}

function unitsOf(dimensions: readonly Dimension[]): string {
  return dimensions.flatMap((dimension) => Object.keys(DIMENSIONS[dimension].units)).join(', ')
}

function example(dimensions: readonly Dimension[]): string {
  const unit = Object.keys(DIMENSIONS[dimensions[0] ?? 'number'].units)[0] ?? ''
  return unit === '' ? '3.6' : `3.6 ${unit}`
}
