import type { Network } from '../../../channel/networks/network'
import type { Model, ModelInput } from '../model'
import type { Computed, Piece } from '../piece'
import { aloneOf } from './alone'
import { longUniform } from './longUniform'
import { perLengthOf } from './perLength'
import { sayQuality } from './quality'
import { insertionAt, sampled } from './samples'
import { twoPortOf } from './twoPortOf'

/** A measured or simulated network in an attached file: taken as a discrete, as a long uniform line, or as loss per length. */
export const network: Model = (input) => {
  const { fields, line } = input
  if (line.taken === null) {
    return fields.say(
      'field-missing',
      'taken',
      `${fields.name}: whether its file is a discrete or a long uniform line is not said.`,
      'Choose how it counts: a discrete by its loss at the frequency, a long uniform line by its fitted loss.',
    )
  }
  if (line.taken === 'per-length') return perLengthOf(input)
  const file = twoPortOf(input, 'evidence')
  const own = file && withoutFixtures(input, file)
  if (own === null) return null
  sayQuality(input, 'evidence', own)
  const piece = line.taken === 'discrete' ? discrete(own) : longUniform(input, own)
  return piece && ({ values: {}, build: () => piece } satisfies Computed)
}

/** The part alone, where the line names a measurement of its two fixtures back to back. */
function withoutFixtures(input: ModelInput, file: Network): Network | null {
  const { fields, line } = input
  if (line.fixture === null) return file
  const fixtures = twoPortOf(input, 'fixture')
  if (fixtures === null) return null
  const { device, differ } = aloneOf(file, fixtures)
  if ('reason' in device) {
    return fields.say(
      'fixtures-not-removed',
      'fixture',
      `${fields.name}: its fixtures could not be removed.`,
      device.reason,
    )
  }
  if (differ !== null) {
    const { thru, near, far } = differ
    fields.say(
      'fixtures-differ',
      'fixture',
      `${fields.name}: its fixtures measure ${near.toFixed(1)} and ${far.toFixed(1)} Ω and their thru ${thru.toFixed(1)} Ω; the removal corrects for it.`,
      'Measure a thru on the same board, if there is one.',
    )
  }
  return device
}

/** Counts −20 log10|S21| in the budget's reference; beside it what the file says in its own. */
function discrete(own: Network): Piece {
  return {
    from: own.hz[0] ?? 0,
    to: own.hz.at(-1) ?? 0,
    reflects: true,
    twoPort: (hz, reference) => sampled(own, hz, reference),
    attenuation: null,
    uncertainty: 0,
    beside: (hz) => [{ what: 'native', db: insertionAt(own, hz) }],
    measured: own,
  }
}
