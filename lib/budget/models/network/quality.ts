import { tooCoarse } from '../../../channel/networks'
import type { Network } from '../../../channel/networks/network'
import { passivity } from '../../../channel/quality'
import { formatScaled } from '../../../channel/units'
import type { ModelInput } from '../model'

/** Says what is wrong with a two-port that a number rests on: it gives out more than it takes in, its points lie too far apart. */
export function sayQuality({ fields, hz }: ModelInput, field: 'evidence' | 'shortEvidence', own: Network): void {
  const passive = passivity(own)
  if (passive.grade === 'poor' || passive.grade === 'inconclusive') {
    fields.say(
      'not-passive',
      field,
      `${fields.name}: its file gives out more than it takes in: the largest singular value of S is ${passive.largest.value.toFixed(4)} at ${formatScaled(passive.largest.hz, 'frequency')} (IEEE 370 passivity ${passive.percent.toFixed(1)} %, ${passive.grade}).`,
      'Measure or simulate it again; look at the calibration and at what was removed.',
    )
  }
  const coarse = tooCoarse(own.hz, own.s)
  if (coarse === null) return
  const [from, to] = [coarse.fromHz, coarse.toHz].map((at) => formatScaled(at, 'frequency'))
  fields.say(
    'coarse-file',
    field,
    `${fields.name}: between two points of its file, ${from} and ${to}, the phase turns by ${((coarse.turn * 180) / Math.PI).toFixed(0)}°, too far to say what lies between.`,
    `Take the data at closer frequencies, at least around ${formatScaled(hz, 'frequency')}.`,
  )
}
