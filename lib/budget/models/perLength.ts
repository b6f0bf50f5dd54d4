import { twoTermAttenuation } from '../../channel/lines'
import { formatScaled } from '../../channel/units'
import { FREQUENCY, LENGTH, LOSS_PER_LENGTH } from '../quantities'
import { atFrequency } from './atFrequency'
import type { Model, ModelInput, ModelLoss } from './model'

/** Length times an attenuation: √f and f terms where they are given, else a number at a frequency. */
export const perLength: Model = (input) => {
  const { fields, line } = input
  const length = fields.need('length', LENGTH)
  if (line.rootTerm !== null || line.linearTerm !== null) return twoTerms(input, length)
  const attenuation = fields.need('lossPerLength', LOSS_PER_LENGTH)
  const at = fields.need('at', FREQUENCY)
  if (length === null || attenuation === null || at === null) return null
  return atFrequency(input, fields, attenuation * length, at)
}

/** Both terms and both ends of their range must be said: an empty term could be a forgotten one. */
function twoTerms(input: ModelInput, length: number | null): ModelLoss | null {
  const { fields, hz } = input
  const root = fields.need('rootTerm', LOSS_PER_LENGTH)
  const linear = fields.need('linearTerm', LOSS_PER_LENGTH)
  const from = fields.need('validFrom', FREQUENCY)
  const to = fields.need('validTo', FREQUENCY)
  if (length === null || root === null || linear === null || from === null || to === null) return null
  if (hz < from || hz > to) {
    const asked = formatScaled(hz, 'frequency')
    return fields.say(
      'outside-validity',
      hz < from ? 'validFrom' : 'validTo',
      `${fields.name}: the terms hold from ${formatScaled(from, 'frequency')} to ${formatScaled(to, 'frequency')}; ${asked} lies outside.`,
      `Give terms that were fitted beyond ${asked}, or state the loss there.`,
    )
  }
  return { db: twoTermAttenuation(root, linear, hz) * length, by: 'computed', spreadDb: 0 }
}
