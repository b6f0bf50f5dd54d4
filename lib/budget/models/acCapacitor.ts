import { inductanceCorner, mountedCapacitor } from '../../channel/components'
import { padCorner } from '../../channel/pads'
import { CAPACITANCE, INDUCTANCE, RESISTANCE } from '../quantities'
import type { Model } from './model'
import { overPadCorner } from './pad'
import type { Piece } from './piece'
import { type Bound, HIGHEST, holds } from './validity'

/** Smallest and largest of the capacitors that block direct current, and the most that one resists (common practice, no source). */
export const AC_CAPACITOR_BOUNDS: readonly Bound[] = [
  {
    field: 'capacitance',
    what: 'capacitance in nF',
    figure: ({ capacitance = Number.NaN }) => capacitance * 1e9,
    least: 1,
    most: 1e5,
  },
  {
    field: 'resistance',
    what: 'series resistance in Ω',
    figure: ({ resistance = Number.NaN }) => resistance,
    least: 0,
    most: 10,
  },
  {
    field: 'inductance',
    what: 'frequency over that at which its inductance takes half of the power',
    figure: ({ inductance = Number.NaN, reference = Number.NaN, hz = Number.NaN }) =>
      hz / inductanceCorner(inductance, reference),
    least: 0,
    most: 1,
  },
  {
    field: 'padCapacitance',
    what: 'frequency over that at which one pad takes half of the power',
    figure: (values) => overPadCorner(values.padCapacitance, values),
    least: 0,
    most: 1,
  },
]

/**
 * A capacitor in each conductor with its series resistance and inductance, and the pads at both ends. All four are needed: an empty
 * field could be a forgotten one; 0 can be typed.
 */
export const acCapacitor: Model = (input) => {
  const { fields, reference } = input
  const capacitance = fields.need('capacitance', CAPACITANCE)
  const resistance = fields.need('resistance', RESISTANCE)
  const inductance = fields.need('inductance', INDUCTANCE)
  const padCapacitance = fields.need('padCapacitance', CAPACITANCE)
  if (capacitance === null || resistance === null || inductance === null || padCapacitance === null) return null
  const values = { capacitance, resistance, inductance, padCapacitance }
  if (!holds(input, AC_CAPACITOR_BOUNDS, values)) return null
  return { values, build: (changed) => pieceOf({ ...values, ...changed }, reference) }
}

type Parts = Parameters<typeof mountedCapacitor>[0] & { readonly padCapacitance: number }

/** From 0 Hz on: that it blocks what is slow is real. */
function pieceOf(parts: Parts, reference: number | null): Piece {
  const { padCapacitance, inductance } = parts
  const corner =
    reference === null
      ? HIGHEST
      : Math.min(padCorner(padCapacitance, reference), inductanceCorner(inductance, reference))
  return {
    from: 0,
    to: Math.min(HIGHEST, corner),
    reflects: true,
    twoPort: (hz, ohms) => mountedCapacitor(parts, padCapacitance, hz, ohms),
    attenuation: null,
    uncertainty: 0,
  }
}
