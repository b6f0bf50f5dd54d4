import { DIMENSIONS, type Dimension } from './dimensions'

/**
 * Writes an SI value in a unit that parseQuantity reads back: '26.5625 GHz'.
 * @param value in the SI unit of the dimension
 * @param digits significant digits at most; zeros at the end are left out
 * @throws RangeError for a value that is not finite or a unit that the dimension lacks
 */
export function formatQuantity<D extends Dimension>(
  value: number,
  dimension: D,
  unit: keyof (typeof DIMENSIONS)[D]['units'] & string,
  digits = 12,
): string {
  const factor = (DIMENSIONS[dimension].units as Record<string, number>)[unit]
  if (factor === undefined) throw new RangeError(`'${unit}' is not a unit of ${dimension}`)
  if (!Number.isFinite(value)) throw new RangeError(`${value} is not a quantity`)
  const text = String(Number((value / factor).toPrecision(digits)) || 0)
  return unit === '' ? text : `${text} ${unit}`
}

/** The same in the unit that leaves 1 to 999 before the point where there is one: frequencies, rates, times, capacitances. */
export function formatScaled(
  value: number,
  dimension: 'frequency' | 'bitRate' | 'symbolRate' | 'time' | 'capacitance',
  digits = 6,
): string {
  const units: Record<string, number> = DIMENSIONS[dimension].units
  const scaled = Object.keys(units).filter((unit) => !unit.includes('T/s'))
  scaled.sort((a, b) => (units[a] ?? 1) - (units[b] ?? 1))
  const rounded = Math.abs(Number(value.toPrecision(digits)))
  const fits = scaled.filter((unit) => rounded >= (units[unit] ?? 1) * (1 - 1e-12))
  const unit = fits.at(-1) ?? scaled[0] ?? ''
  return formatQuantity(value, dimension, unit as never, digits)
}
