import { twoTermAttenuation } from '../../channel/lines'
import { FREQUENCY, LENGTH, LOSS_PER_LENGTH } from '../quantities'
import { atFrequency } from './atFrequency'
import { refuseImpossible } from './copperGuard'
import { knownPiece, lineOf, ownLine } from './knownPiece'
import type { Model, ModelInput } from './model'
import type { Computed } from './piece'
import { fittedTerms, termsLoss } from './terms'

/** Length times an attenuation: √f and f terms over their band where they are given, else a number at a frequency. */
export const perLength: Model = (input) => {
  const { fields, line } = input
  const length = fields.need('length', LENGTH)
  if (line.rootTerm !== null || line.linearTerm !== null) return twoTerms(input, length)
  const attenuation = fields.need('lossPerLength', LOSS_PER_LENGTH)
  const at = fields.need('at', FREQUENCY)
  if (length === null || attenuation === null || at === null) return null
  if (refuseImpossible(input, fields, 'lossPerLength', attenuation, at)) return null
  return atFrequency(input, fields, attenuation * length, at)
}

function twoTerms(input: ModelInput, length: number | null): Computed | null {
  const terms = fittedTerms(input)
  const own = ownLine(input.fields)
  if (length === null || terms === null || own === null) return null
  const { from, to } = terms
  const { rootTerm = 0, linearTerm = 0 } = terms.values
  if (refuseImpossible(input, input.fields, 'rootTerm', twoTermAttenuation(rootTerm, linearTerm, input.hz), input.hz))
    return null
  return {
    values: { length, ...terms.values, ...own },
    build: (values) =>
      knownPiece({ from, to, attenuation: termsLoss(values, input.surroundings), line: lineOf(values) }),
  }
}
