import { fittedLoss } from '../../../channel/fitting'
import { propagationFromTwoLengths } from '../../../channel/fixtures'
import { LENGTH } from '../../quantities'
import { knownPiece } from '../knownPiece'
import type { ModelInput } from '../model'
import type { Computed, Piece } from '../piece'
import { bandWithin } from './longUniform'
import { sayQuality } from './quality'
import { twoPortOf } from './twoPortOf'

const DB_PER_NEPER = 20 / Math.LN10

/**
 * Loss per length from two lengths of one line (multiline method): what both have in common, connectors and launches, falls
 * out. Counts the fitted attenuation times the line's own length.
 */
export function perLengthOf(input: ModelInput): Computed | null {
  const { fields, symbolRate } = input
  const length = fields.need('length', LENGTH)
  const difference = fields.need('lengthDifference', LENGTH)
  const long = twoPortOf(input, 'evidence')
  const short = twoPortOf(input, 'shortEvidence')
  if (length === null || difference === null || long === null || short === null) return null
  sayQuality(input, 'evidence', long)
  sayQuality(input, 'shortEvidence', short)
  const found = propagationFromTwoLengths(long, short, difference)
  if ('reason' in found) {
    return fields.say(
      'not-fitted',
      'shortEvidence',
      `${fields.name}: no loss per length comes of its two files.`,
      found.reason,
    )
  }
  const perMetre = found.alpha.map((nepers) => nepers * DB_PER_NEPER)
  const fit = fittedLoss(found.hz, perMetre, { form: 'weighted', ...bandWithin(found.hz, symbolRate) })
  if ('reason' in fit) {
    return fields.say('not-fitted', 'evidence', `${fields.name}: its loss per length cannot be fitted.`, fit.reason)
  }
  const build = (metres: number): Piece => {
    const attenuation = (hz: Float64Array) => hz.map((at) => (fit.at(at) ?? Number.NaN) * metres)
    return knownPiece({ from: fit.hz[0] ?? 0, to: fit.hz.at(-1) ?? 0, attenuation, line: null })
  }
  return { values: { length }, build: (values) => build(values.length ?? length) }
}
