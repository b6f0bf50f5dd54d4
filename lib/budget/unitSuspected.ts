import { DIMENSIONS, type Quantity } from '../channel/units'

/**
 * The unit in which the number that was typed would be a usual one.
 * @param units to try, the likeliest first
 * @param usual asks about a value in SI units
 * @returns null where it is usual in none of the others
 */
export function unitSuspected(
  quantity: Quantity,
  units: readonly string[],
  usual: (value: number) => boolean,
): string | null {
  const factors: Readonly<Record<string, number>> = DIMENSIONS[quantity.dimension].units
  const typed = factors[quantity.unit] ?? 1
  const fits = (unit: string) => unit !== quantity.unit && usual((quantity.value / typed) * (factors[unit] ?? 1))
  return units.find(fits) ?? null
}
