import { tooCoarse } from '../../../channel/networks'
import type { Network } from '../../../channel/networks/network'
import { causality, passivity, reciprocity } from '../../../channel/quality'
import { formatScaled } from '../../../channel/units'
import type { ModelInput } from '../model'
import { rememberedOf } from './remembered'

const facts = rememberedOf<ReturnType<typeof factsOf>>()

function factsOf(own: Network) {
  return {
    passive: passivity(own),
    reciprocal: reciprocity(own),
    causal: causality(own),
    coarse: tooCoarse(own.hz, own.s),
  }
}

/** Says what is wrong with a two-port that a number rests on: it gives out more than it takes in, differs in its
 * directions, answers before it is asked, or its points lie too far apart. */
export function sayQuality({ fields, hz }: ModelInput, field: 'evidence' | 'shortEvidence', own: Network): void {
  const { passive, reciprocal, causal, coarse } = facts(own, '', () => factsOf(own))
  if (passive.grade === 'poor' || passive.grade === 'inconclusive') {
    fields.say(
      'not-passive',
      field,
      `${fields.name}: its file gives out more than it takes in: the largest singular value of S is ${passive.largest.value.toFixed(4)} at ${formatScaled(passive.largest.hz, 'frequency')} (IEEE 370 passivity ${passive.percent.toFixed(1)} %, ${passive.grade}).`,
      'Measure or simulate it again; look at the calibration and at what was removed.',
    )
  }
  if (reciprocal?.grade === 'poor') {
    fields.say(
      'not-reciprocal',
      field,
      `${fields.name}: its file loses differently in its two directions (IEEE 370 reciprocity ${reciprocal.percent.toFixed(1)} %, poor), which copper and dielectric do not.`,
      'Look at the calibration, and whether the ports of one end are exchanged.',
    )
  }
  if (causal?.grade === 'poor') {
    fields.say(
      'not-causal',
      field,
      `${fields.name}: the phase of its file mostly turns backwards (IEEE 370 causality ${causal.percent.toFixed(1)} %, poor). Noise at fine steps of frequency does this too.`,
      'Ask how the file was made: whether delay was taken out, or the time turned round.',
    )
  }
  if (coarse === null) return
  const [from, to] = [coarse.fromHz, coarse.toHz].map((at) => formatScaled(at, 'frequency'))
  fields.say(
    'coarse-file',
    field,
    `${fields.name}: between two points of its file, ${from} and ${to}, the phase turns by ${((coarse.turn * 180) / Math.PI).toFixed(0)}°, too far to say what lies between.`,
    `Take the data at closer frequencies, at least around ${formatScaled(hz, 'frequency')}.`,
  )
}
