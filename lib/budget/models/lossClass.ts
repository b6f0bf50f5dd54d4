import { parsePoints } from '../../channel/tables'
import type { Findings } from '../findings'
import { FREQUENCY, LENGTH, LOSS_PER_LENGTH, NUMBER } from '../quantities'
import { atFrequency } from './atFrequency'
import { refuseImpossible } from './copperGuard'
import { ownLine } from './knownPiece'
import type { Model, ModelInput } from './model'
import { fromPoints } from './table'

/** Length times a loss class of the line's assembly. */
export const lossClass: Model = (input) => {
  const { fields, classFields } = input
  const length = fields.need('length', LENGTH)
  if (classFields === null) {
    const taken = input.line.lossClass !== null
    return fields.say(
      'class-missing',
      'lossClass',
      `${fields.name}: ${taken ? 'its loss class does not exist or was taken out' : 'no loss class is chosen'}.`,
      'Choose a loss class of its assembly, or state the loss itself.',
    )
  }
  const scale = classFields.may('scale', NUMBER)
  if (length === null || scale === 'unreadable') return null
  return attenuation(input, classFields, length, scale ?? 1)
}

/** @param scale what a coupon of the class measured, over what the class says */
function attenuation(input: ModelInput, fields: Findings<'lossClasses'>, length: number, scale: number) {
  const { points: text } = fields.record
  if (text === null || text.trim() === '') {
    const perLength = fields.need('lossPerLength', LOSS_PER_LENGTH)
    const at = fields.need('at', FREQUENCY)
    if (perLength === null || at === null) return null
    if (refuseImpossible(input, fields, 'lossPerLength', perLength * scale, at)) return null
    return atFrequency(input, fields, perLength * (length * scale), at)
  }
  const parsed = parsePoints(text, 'lossPerLength')
  if ('reason' in parsed) {
    return fields.say('unreadable-value', 'points', `${fields.name}: the points cannot be read.`, parsed.reason)
  }
  const stated = fields.record.lossPerLength !== null || fields.record.at !== null
  const perLength = stated ? fields.need('lossPerLength', LOSS_PER_LENGTH) : null
  const at = stated ? fields.need('at', FREQUENCY) : null
  if (stated && (perLength === null || at === null)) return null
  const further = perLength !== null && at !== null ? [{ hz: at, value: perLength }] : []
  const points = [...parsed.points.filter((point) => point.hz !== at), ...further].sort((a, b) => a.hz - b.hz)
  const own = ownLine(input.fields)
  if (own === null) return null
  return fromPoints(input, fields, points, { length, ...own }, (values) => (values.length ?? Number.NaN) * scale)
}
