import { shuntCapacitanceLoss } from '../../channel/pads/shuntCapacitance'
import { CAPACITANCE } from '../quantities'
import type { Model } from './model'

/** A pad: the capacitance of each conductor to ground, between matched lines in the budget's differential reference. */
export const pad: Model = (input) => {
  const capacitance = input.fields.need('capacitance', CAPACITANCE)
  if (input.reference === null) {
    return input.fields.say(
      'field-missing',
      'capacitance',
      `${input.fields.name}: the loss of a pad depends on the differential reference impedance, which the link does not say.`,
      "Type the link's reference impedance, such as 100 Ω.",
    )
  }
  if (capacitance === null) return null
  return { db: shuntCapacitanceLoss(capacitance, input.reference, input.hz), by: 'computed', spreadDb: 0 }
}
