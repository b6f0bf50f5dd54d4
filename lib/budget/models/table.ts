import { interpolate, type Point, parsePoints } from '../../channel/tables'
import { formatScaled } from '../../channel/units'
import type { Owner } from '../findings'
import type { Model, ModelInput, ModelLoss } from './model'

/** Points of loss over frequency, interpolated and never extrapolated. */
export const table: Model = (input) => {
  const { fields, line } = input
  if (line.points === null || line.points.trim() === '') {
    return fields.say(
      'field-missing',
      'points',
      `${fields.name}: no points are given.`,
      "Type the loss at several frequencies, such as '1 GHz 0.4 dB; 5 GHz 1.1 dB'.",
    )
  }
  const parsed = parsePoints(line.points, 'loss')
  if ('reason' in parsed) {
    return fields.say('unreadable-value', 'points', `${fields.name}: the points cannot be read.`, parsed.reason)
  }
  return fromPoints(input, fields, parsed.points, 1)
}

/** Far points: where a power law through them differs from the straight line by more than this. */
const COARSE_DB = 0.1
const COARSE_SHARE = 0.02

/**
 * @param owner the record that holds the points
 * @param factor dB per unit of the points: 1 for a loss, the length for a loss per length
 */
export function fromPoints(
  input: ModelInput,
  owner: Owner,
  points: readonly Point[],
  factor: number,
): ModelLoss | null {
  const asked = formatScaled(input.hz, 'frequency')
  const found = interpolate(points, input.hz)
  if (found === null) {
    const lowest = formatScaled(points[0]?.hz ?? 0, 'frequency')
    const highest = formatScaled(points.at(-1)?.hz ?? 0, 'frequency')
    return owner.say(
      'outside-table',
      'points',
      `${owner.name}: ${asked} lies outside the points, which reach from ${lowest} to ${highest}; a table is never continued.`,
      `Add a point at ${asked} or beyond.`,
    )
  }
  const db = found.value * factor
  const differs = found.differs * factor
  if (differs > COARSE_DB && differs > COARSE_SHARE * db) {
    owner.say(
      'coarse-table',
      'points',
      `${owner.name}: the points around ${asked} lie far apart; a power law through them differs from the straight line by ${differs.toFixed(2)} dB.`,
      `Add a point near ${asked}.`,
    )
  }
  return { db, by: 'table', spreadDb: 0 }
}
