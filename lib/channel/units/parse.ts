import { DIMENSIONS, type Dimension, SPELLINGS } from './dimensions'

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

const NUMBER = /^([+\-−]?)(\d+(?:[.,]\d+)?|[.,]\d+)(?:[eE]([+\-−]?\d{1,3}))?/

/**
 * Reads a number with its unit as a person types it: '3.2 in', '120mil', '3,2 mm', '0.85 dB/in'.
 * A decimal comma is read where it can only be one; '1,234' could be a thousand and is asked back.
 * @returns the value in SI units, or a refusal with a sentence that says what to do; never throws.
 */
export function parseQuantity(text: string, dimensions: Dimension | readonly Dimension[]): Quantity | QuantityRefusal {
  const wanted = typeof dimensions === 'string' ? [dimensions] : dimensions
  const trimmed = text.trim().replace(/\u00a0|\u202f/g, ' ')
  if (trimmed === '') return { code: 'empty', reason: 'Type a number with its unit.' }
  const match = NUMBER.exec(trimmed)
  if (!match) return { code: 'not-a-number', reason: `Start with a number, such as ${example(wanted)}.` }
  const [whole, sign, digits = '', exponent] = match
  if (/^[1-9]\d{0,2},\d{3}$/.test(digits)) {
    const [left, right] = digits.split(',')
    return {
      code: 'ambiguous-comma',
      reason: `Does ${digits} mean ${left}${right} or ${left}.${right}? Type it without the comma or with a point.`,
    }
  }
  const rest = trimmed.slice(whole.length).trim()
  if (/^[.,\d]/.test(rest)) {
    return { code: 'not-a-number', reason: 'Type the number without thousands separators, such as 1234.5.' }
  }
  const unit = SPELLINGS[rest] ?? rest
  for (const dimension of wanted) {
    const factor = (DIMENSIONS[dimension].units as Record<string, number>)[unit]
    if (factor === undefined) continue
    const power = exponent === undefined ? '' : `e${exponent.replace('−', '-')}`
    const magnitude = Number(`${digits.replace(',', '.')}${power}`)
    const value = (sign === '-' || sign === '−' ? -magnitude : magnitude) * factor
    if (!Number.isFinite(value)) return { code: 'not-a-number', reason: 'The number is too large.' }
    return { value: value === 0 ? 0 : value, unit, dimension }
  }
  if (unit === '') return { code: 'unit-missing', reason: `Add a unit: ${unitsOf(wanted)}.` }
  return { code: 'unit-unknown', reason: `'${rest}' is not a unit for this field; use ${unitsOf(wanted)}.` }
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
