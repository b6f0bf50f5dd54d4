import { bulkAttenuation, type CableTerms } from '../../channel/cables'
import { COPPER_STATED_AT, copperConductivity } from '../../channel/materials/copper'
import { formatScaled } from '../../channel/units'
import { FREQUENCY, LOSS_PER_LENGTH } from '../quantities'
import type { ModelInput } from './model'
import type { Surroundings, Values } from './piece'

/** Terms of an attenuation per length and the range that they hold in. */
export type FittedTerms = { readonly values: Values; readonly from: number; readonly to: number }

/**
 * Reads √f and f terms and both ends of their range; all four must be said, for an empty term could be a forgotten one.
 * @returns null after writing down what lacks, or that the frequency lies outside the range
 */
export function fittedTerms(input: ModelInput): FittedTerms | null {
  const { fields, hz } = input
  const rootTerm = fields.need('rootTerm', LOSS_PER_LENGTH)
  const linearTerm = fields.need('linearTerm', LOSS_PER_LENGTH)
  const from = fields.need('validFrom', FREQUENCY)
  const to = fields.need('validTo', FREQUENCY)
  if (rootTerm === null || linearTerm === null || from === null || to === null) return null
  if (hz >= from && hz <= to) return { values: { rootTerm, linearTerm }, from, to }
  const asked = formatScaled(hz, 'frequency')
  return fields.say(
    'outside-validity',
    hz < from ? 'validFrom' : 'validTo',
    `${fields.name}: the terms hold from ${formatScaled(from, 'frequency')} to ${formatScaled(to, 'frequency')}; ${asked} lies outside.`,
    `Give terms that were fitted beyond ${asked}, or state the loss there.`,
  )
}

/**
 * dB of the whole length in other surroundings than the terms were fitted in: the √f term is the conductors' and grows with the root of
 * copper's resistivity over that at 20 °C, the f term is the dielectric's and takes dfFactor. A square term stays. dfAdded and dkAdded
 * need a permittivity that terms do not know, and are not used. At 20 °C with factor 1 the terms stand as typed.
 */
export function termsLoss(values: Values, surroundings: Surroundings): (hz: Float64Array) => Float64Array {
  const { length = Number.NaN, rootTerm = Number.NaN, linearTerm = Number.NaN, squareTerm = 0 } = values
  const { temperature, dfFactor } = surroundings
  const warm = Math.sqrt(copperConductivity(COPPER_STATED_AT) / copperConductivity(temperature))
  const terms: CableTerms = { root: rootTerm * warm, linear: linearTerm * dfFactor, square: squareTerm }
  return (hz) => {
    const db = bulkAttenuation(terms, hz)
    for (let i = 0; i < db.length; i++) db[i] = (db[i] as number) * length
    return db
  }
}
