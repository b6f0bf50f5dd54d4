import { type FittedLoss, fittedLoss } from '../../../channel/fitting'
import { insertionLoss } from '../../../channel/networks'
import type { Network } from '../../../channel/networks/network'
import { formatScaled } from '../../../channel/units'
import type { ModelInput } from '../model'
import type { Piece } from '../piece'
import { insertionAt, insertionOver, sampled } from './samples'

/** Hz: where the band of a fit begins (design rule of the comparison of sum and cascade). */
const FIT_FROM = 0.05e9
/** Fitted and point value may differ by this much before it is said. */
const DIFFERS_DB = 0.2

/** A long uniform line counts its fitted loss, so that ripple of its ends' mismatch does not count by the accident of a phase. */
export function longUniform(input: ModelInput, own: Network): Piece | null {
  const { fields, reference, symbolRate } = input
  const lossDb = reference === null ? insertionLoss(own.s) : insertionOver(own, reference)
  const fit = fittedLoss(own.hz, lossDb, { form: 'weighted', ...bandWithin(own.hz, symbolRate) })
  if ('reason' in fit) {
    return fields.say(
      'not-fitted',
      'taken',
      `${fields.name}: its loss cannot be fitted over the band. ${fit.reason}`,
      "Attach a file with more points from 0.05 GHz to the symbol rate, or take it as a 'discrete'.",
    )
  }
  sayDifference(input, own, fit)
  const from = fit.hz[0] ?? 0
  const to = fit.hz.at(-1) ?? 0
  return {
    from,
    to,
    reflects: true,
    twoPort: (at, wanted) => sampled(own, at, wanted),
    attenuation: (at) => at.map((one) => fit.at(one) ?? Number.NaN),
    uncertainty: 0,
    beside: (at) => [{ what: 'point', db: insertionAt(own, at) }],
    measured: own,
  }
}

/** From 0.05 GHz to the symbol rate, out to the next point of the file at each end, so that the fit reaches both. */
export function bandWithin(
  hz: Float64Array,
  symbolRate: number | null,
): { readonly from: number; readonly to: number } {
  const reaches = symbolRate ?? Number.POSITIVE_INFINITY
  return {
    from: hz.findLast((f) => f <= FIT_FROM) ?? 0,
    to: hz.find((f) => f >= reaches) ?? Number.POSITIVE_INFINITY,
  }
}

function sayDifference({ fields, hz }: ModelInput, own: Network, fit: FittedLoss): void {
  const fitted = fit.at(hz)
  const point = insertionAt(own, hz)
  if (fitted === null || !(Math.abs(fitted - point) > DIFFERS_DB)) return
  fields.say(
    'fit-differs',
    'taken',
    `${fields.name}: at ${formatScaled(hz, 'frequency')} its file says ${point.toFixed(2)} dB and its fitted loss, which counts, ${fitted.toFixed(2)} dB.`,
    'Look at the ripple: mismatch of its ends, or a resonance that a fit must not hide.',
  )
}
