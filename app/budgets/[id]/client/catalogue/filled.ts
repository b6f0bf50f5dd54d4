import type { Scalar } from '../../../../../lib/budget/schema'

/** The fields that say something: a new record has every other one empty anyway. */
export function filled(fields: Readonly<Record<string, Scalar | undefined>>): Readonly<Record<string, Scalar>> {
  const said = Object.entries(fields).filter(([, value]) => value !== null && value !== undefined && value !== '')
  return Object.fromEntries(said) as Record<string, Scalar>
}
