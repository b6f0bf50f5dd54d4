import { fixtureImpedances, removeFixtures } from '../../../channel/fixtures'
import { tooCoarse } from '../../../channel/networks'
import type { Network } from '../../../channel/networks/network'
import type { Refusal } from '../../../channel/networks/refusal'
import { passivity } from '../../../channel/quality'
import { formatScaled } from '../../../channel/units'
import type { Model, ModelInput } from '../model'
import type { Computed, Piece } from '../piece'
import { longUniform } from './longUniform'
import { perLengthOf } from './perLength'
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
  sayQuality(input, own)
  const piece = line.taken === 'discrete' ? discrete(own) : longUniform(input, own)
  return piece && ({ values: {}, build: () => piece } satisfies Computed)
}

/** The part alone, where the line names a measurement of its two fixtures back to back. */
function withoutFixtures(input: ModelInput, file: Network): Network | null {
  const { fields, line } = input
  if (line.fixture === null) return file
  const fixtures = twoPortOf(input, 'fixture')
  if (fixtures === null) return null
  const removed = alone(input, file, fixtures)
  if (!('reason' in removed)) return removed
  return fields.say(
    'fixtures-not-removed',
    'fixture',
    `${fields.name}: its fixtures could not be removed.`,
    removed.reason,
  )
}

/** Fixtures whose impedance differs by more than this from that of their thru are corrected for it. */
const DIFFERS = 0.03

function alone({ fields }: ModelInput, file: Network, fixtures: Network): Network | Refusal {
  const found = fixtureImpedances(file, fixtures)
  if ('reason' in found) return found
  const { thru, near, far } = found
  const impedanceCorrection = Math.max(Math.abs(near / thru - 1), Math.abs(far / thru - 1)) > DIFFERS
  if (impedanceCorrection) {
    fields.say(
      'fixtures-differ',
      'fixture',
      `${fields.name}: its fixtures measure ${near.toFixed(1)} and ${far.toFixed(1)} Ω and their thru ${thru.toFixed(1)} Ω; the removal corrects for it.`,
      'Measure a thru on the same board, if there is one.',
    )
  }
  return removeFixtures(file, fixtures, { impedanceCorrection })
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

function sayQuality({ fields, hz }: ModelInput, own: Network): void {
  const passive = passivity(own)
  if (passive.grade === 'poor' || passive.grade === 'inconclusive') {
    fields.say(
      'not-passive',
      'evidence',
      `${fields.name}: its file gives out more than it takes in: the largest singular value of S is ${passive.largest.value.toFixed(4)} at ${formatScaled(passive.largest.hz, 'frequency')} (IEEE 370 passivity ${passive.percent.toFixed(1)} %, ${passive.grade}).`,
      'Measure or simulate it again; look at the calibration and at what was removed.',
    )
  }
  const coarse = tooCoarse(own.hz, own.s)
  if (coarse === null) return
  const [from, to] = [coarse.fromHz, coarse.toHz].map((at) => formatScaled(at, 'frequency'))
  fields.say(
    'coarse-file',
    'evidence',
    `${fields.name}: between two points of its file, ${from} and ${to}, the phase turns by ${((coarse.turn * 180) / Math.PI).toFixed(0)}°, too far to say what lies between.`,
    `Take the data at closer frequencies, at least around ${formatScaled(hz, 'frequency')}.`,
  )
}
