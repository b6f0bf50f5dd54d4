import { interpolate, interpolateOver, type Point, parsePoints } from '../../channel/tables'
import { formatScaled } from '../../channel/units'
import type { Owner } from '../findings'
import { LENGTH } from '../quantities'
import { isUniform } from '../uniform'
import { knownPiece, lineOf, ownLine } from './knownPiece'
import type { Model, ModelInput } from './model'
import type { Computed, Values } from './piece'

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
  const itself = isUniform(line) ? ownLengthOfLine(input) : {}
  return itself && fromPoints(input, fields, parsed.points, itself, () => 1)
}

/** A table is of the whole line, so its length serves the delay only. */
function ownLengthOfLine({ fields }: ModelInput): Values | null {
  const length = fields.may('length', LENGTH)
  const own = ownLine(fields)
  if (length === 'unreadable' || own === null) return null
  return length === null ? {} : { length, ...own }
}

/** Far points: where a power law through them differs from the straight line by more than this. */
const COARSE_DB = 0.1
const COARSE_SHARE = 0.02

/**
 * @param owner the record that holds the points
 * @param values of the line, for build
 * @param factorOf dB per unit of the points, by the values: 1 for a loss, the length for a loss per length
 */
export function fromPoints(
  input: ModelInput,
  owner: Owner,
  points: readonly Point[],
  values: Values,
  factorOf: (values: Values) => number,
): Computed | null {
  const asked = formatScaled(input.hz, 'frequency')
  const found = interpolate(points, input.hz)
  const first = points[0]
  const last = points.at(-1)
  if (found === null || !first || !last) {
    const lowest = formatScaled(first?.hz ?? 0, 'frequency')
    const highest = formatScaled(last?.hz ?? 0, 'frequency')
    return owner.say(
      'outside-table',
      'points',
      `${owner.name}: ${asked} lies outside the points, which reach from ${lowest} to ${highest}; a table is never continued.`,
      `Add a point at ${asked} or beyond.`,
    )
  }
  const factor = factorOf(values)
  const differs = found.differs * factor
  if (differs > COARSE_DB && differs > COARSE_SHARE * found.value * factor) {
    owner.say(
      'coarse-table',
      'points',
      `${owner.name}: the points around ${asked} lie far apart; a power law through them differs from the straight line by ${differs.toFixed(2)} dB.`,
      `Add a point near ${asked}.`,
    )
  }
  return { values, build: (changed) => pieceOf(points, first.hz, last.hz, changed, factorOf(changed)) }
}

function pieceOf(points: readonly Point[], from: number, to: number, values: Values, factor: number) {
  const attenuation = (hz: Float64Array) => interpolateOver(points, hz).map((value) => value * factor)
  return knownPiece({ from, to, attenuation, line: lineOf(values) })
}
