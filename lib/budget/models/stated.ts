import { FREQUENCY, LOSS } from '../quantities'
import { atFrequency } from './atFrequency'
import type { Model } from './model'

/** A number at a frequency. A reserve without a frequency is held back at every frequency. */
export const stated: Model = (input) => {
  const loss = input.fields.need('loss', LOSS)
  if (input.line.kind === 'reserve' && input.line.at === null) {
    return loss === null ? null : { db: loss, by: 'stated', spreadDb: 0 }
  }
  const at = input.fields.need('at', FREQUENCY)
  if (loss === null || at === null) return null
  return atFrequency(input, input.fields, loss, at)
}
