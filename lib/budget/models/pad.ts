import { padCorner, shuntCapacitance } from '../../channel/pads'
import { CAPACITANCE } from '../quantities'
import type { Model } from './model'
import type { Piece, Values } from './piece'
import { type Bound, HIGHEST, holds } from './validity'

/** Share of the corner that a pad to ground reaches at the frequency; beyond it a pad is no lumped capacitance. */
export function overPadCorner(capacitance: number | undefined, { hz = Number.NaN, reference = Number.NaN }: Values) {
  return hz / padCorner(capacitance ?? Number.NaN, reference)
}

export const PAD_BOUNDS: readonly Bound[] = [
  {
    field: 'capacitance',
    what: 'frequency over that at which its capacitance takes half of the power',
    figure: (values) => overPadCorner(values.capacitance, values),
    least: 0,
    most: 1,
  },
]

/** A pad, of a component or a die: the capacitance of each conductor to ground. */
export const pad: Model = (input) => {
  const capacitance = input.fields.need('capacitance', CAPACITANCE)
  if (capacitance === null) return null
  const values = { capacitance }
  if (!holds(input, PAD_BOUNDS, values)) return null
  return { values, build: ({ capacitance: built = Number.NaN }) => pieceOf(built, input.reference) }
}

function pieceOf(capacitance: number, reference: number | null): Piece {
  return {
    from: 0,
    to: reference === null ? HIGHEST : Math.min(HIGHEST, padCorner(capacitance, reference)),
    reflects: true,
    twoPort: (hz, ohms) => shuntCapacitance(capacitance, hz, ohms),
    attenuation: null,
    uncertainty: 0,
  }
}
