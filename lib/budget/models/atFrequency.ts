import { discreteLoss, type Moved, moveUniformLoss } from '../../channel/lines'
import { formatScaled } from '../../channel/units'
import type { Owner } from '../findings'
import { isUniform } from '../uniform'
import type { ModelInput, ModelLoss } from './model'

/**
 * A number that holds at one frequency, brought to the frequency asked for: as it stands within ±2 %, moved for traces and
 * cable, never moved for a discrete.
 * @param owner the record that says the frequency in its field 'at'
 */
export function atFrequency(input: ModelInput, owner: Owner, db: number, statedHz: number): ModelLoss | null {
  const uniform = isUniform(input.line)
  const moved = uniform ? moveUniformLoss(db, statedHz, input.hz) : discreteLoss(db, statedHz, input.hz)
  if (moved === null) return refuse(input, owner, statedHz, uniform)
  if (moved.spreadDb > 0) warn(input, owner, statedHz, moved)
  return { db: moved.db, by: moved.by, spreadDb: moved.spreadDb }
}

function refuse(input: ModelInput, owner: Owner, statedHz: number, uniform: boolean): null {
  const mistake = input.mistake(statedHz)
  const asked = formatScaled(input.hz, 'frequency')
  const stated = formatScaled(statedHz, 'frequency')
  const law = uniform
    ? 'traces and cable move by a ratio of 0.67 to 1.5 and no further'
    : `${input.line.kind === 'cable' ? 'a part without length' : 'a discrete'} is never moved to another frequency`
  sayMistake(input, owner, statedHz)
  return owner.say(
    'frequency-too-far',
    'at',
    `${owner.name}: the number holds at ${stated} and is asked for at ${asked}; ${law}.${mistake ? ` ${stated} is ${mistake}.` : ''}`,
    `Give the loss at ${asked}, or a table of points that reaches it.`,
  )
}

function warn(input: ModelInput, owner: Owner, statedHz: number, moved: Moved): void {
  sayMistake(input, owner, statedHz)
  owner.say(
    'moved-with-spread',
    'at',
    `${owner.name}: moved from ${formatScaled(statedHz, 'frequency')} to ${formatScaled(input.hz, 'frequency')} between the √f and the f law; ±${moved.spreadDb.toFixed(2)} dB was added to the tolerance.`,
    `Give the loss at ${formatScaled(input.hz, 'frequency')}.`,
  )
}

function sayMistake(input: ModelInput, owner: Owner, statedHz: number): void {
  const mistake = input.mistake(statedHz)
  if (mistake === null) return
  owner.say(
    'usual-wrong-frequency',
    'at',
    `${owner.name}: ${formatScaled(statedHz, 'frequency')} is ${mistake}.`,
    'Ask for the loss at the Nyquist frequency, or correct the frequency if it was mistyped.',
  )
}
