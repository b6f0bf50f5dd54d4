import { holdsAt } from '../../channel/lines'
import { FREQUENCY, LENGTH, LOSS, LOSS_PER_LENGTH } from '../quantities'
import { atFrequency } from './atFrequency'
import { knownPiece, lineOf, ownLine } from './knownPiece'
import type { Model, ModelInput, ModelLoss } from './model'
import type { Computed, Values } from './piece'
import { fittedTerms, termsLoss } from './terms'

/**
 * A cable: its bulk by √f, f and f² terms over their band or by a number per length, and the loss of its two ends. The ends are
 * discretes stated at one frequency and are never moved: with ends the piece holds within ±2 % of that frequency only, without them
 * over the whole band of the terms. It reflects where impedance and delay are typed and there are no ends.
 */
export const cable: Model = (input) => {
  const { fields, line } = input
  const length = fields.need('length', LENGTH)
  const ends = endsOf(input)
  if (line.rootTerm !== null || line.linearTerm !== null || line.squareTerm !== null)
    return byTerms(input, length, ends)
  const perLength = fields.need('lossPerLength', LOSS_PER_LENGTH)
  const at = fields.need('at', FREQUENCY)
  if (length === null || ends === null || perLength === null || at === null) return null
  return byNumber(input, perLength * length, at, ends)
}

/** A stated number holds within ±2 % of its frequency. */
const HOLDS = 0.02

/** What the ends lose together where they are typed, and the frequency that it is typed at. */
type Ends = { readonly values: Values; readonly at: number | null }

/** Both ends or neither; null after writing down what lacks, or that they are asked for too far from their frequency. */
function endsOf(input: ModelInput): Ends | null {
  const { fields, line, hz } = input
  if (line.endLossA === null && line.endLossB === null) return { values: {}, at: null }
  const endLossA = fields.need('endLossA', LOSS)
  const endLossB = fields.need('endLossB', LOSS)
  const at = fields.need('at', FREQUENCY)
  if (endLossA === null || endLossB === null || at === null) return null
  if (holdsAt(at, hz)) return { values: { endLossA, endLossB }, at }
  return fields.say(
    'frequency-too-far',
    'at',
    `${fields.name}: the loss of its ends holds at ${line.at}; discretes are never moved to another frequency.`,
    'Give the loss of the ends at the frequency asked for, or make a line of each end.',
  )
}

function byTerms(input: ModelInput, length: number | null, ends: Ends | null): Computed | null {
  const { fields, line, surroundings } = input
  const terms = fittedTerms(input)
  const squareTerm = line.squareTerm === null ? 0 : fields.need('squareTerm', LOSS_PER_LENGTH)
  const own = ownLine(fields)
  if (length === null || ends === null || terms === null || squareTerm === null || own === null) return null
  const from = ends.at === null ? terms.from : Math.max(terms.from, ends.at * (1 - HOLDS))
  const to = ends.at === null ? terms.to : Math.min(terms.to, ends.at * (1 + HOLDS))
  return {
    values: { length, ...terms.values, squareTerm, ...ends.values, ...own },
    build: (values) => {
      const bulk = termsLoss(values, surroundings)
      const { endLossA = 0, endLossB = 0 } = values
      const attenuation = (hz: Float64Array) => bulk(hz).map((db) => db + endLossA + endLossB)
      return knownPiece({ from, to, attenuation, line: ends.at === null ? lineOf(values) : null })
    },
  }
}

/** A number per length holds at a frequency; the bulk moves as any uniform line, the ends stand at it. */
function byNumber(input: ModelInput, bulk: number, at: number, { values }: Ends): ModelLoss | null {
  const moved = atFrequency(input, input.fields, bulk, at)
  return moved && { ...moved, db: moved.db + (values.endLossA ?? 0) + (values.endLossB ?? 0) }
}
