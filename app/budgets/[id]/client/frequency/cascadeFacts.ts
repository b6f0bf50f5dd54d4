import type { AllowanceEvaluation, ChannelEvaluation } from '../../../../../lib/budget/evaluation'
import type { Term } from '../../../../words/beside'
import { decibels, frequencyWords } from '../../../../words/decibels'

const NO_REFLECTION = 'unknown: not every line has reflection data'
const db = (value: number) => `${decibels(value)} dB`
const known = (value: number | null) => (value === null ? 'unknown' : db(value))

/** What the cascade says beside the sum, figure by figure as it was evaluated. */
export function cascadeFacts(allowance: AllowanceEvaluation, channel: ChannelEvaluation): readonly Term[] {
  const { atHz, nominalDb } = allowance
  const { coveredDb, reflectingDb, lossDb, fittedDb, fromHz, toHz } = channel
  const facts: Term[] = [
    {
      term: 'in the cascade',
      value: `${decibels(coveredDb)} of ${nominalDb === null ? 'a whole that is not known yet' : db(nominalDb)}, ${decibels(reflectingDb)} of it with reflection data`,
    },
    { term: 'band', value: `${shortFrequency(fromHz)} to ${shortFrequency(toHz)}` },
    {
      term: atHz === null ? 'loss' : `loss at ${frequencyWords(atHz)}`,
      value: `cascade ${known(lossDb)}, fitted ${known(fittedDb)}, sum of the same lines ${db(coveredDb)}`,
    },
    { term: 'deviation from the fit', value: deviationWords(channel) },
    { term: 'return loss', value: returnLossWords(channel) },
  ]
  const curve = curveWords(channel)
  return curve === null ? facts : [...facts, { term: 'limit curve', value: curve }]
}

function deviationWords({ deviation, fit, withoutBand, withoutReflection }: ChannelEvaluation): string {
  if (deviation !== null)
    return `rms ${db(deviation.rmsDb)}, at most ${db(deviation.maxDb)}, ripple ${db(deviation.rippleDb)}`
  if (withoutBand.length + withoutReflection.length > 0) return NO_REFLECTION
  return fit === null ? 'unknown: the loss cannot be fitted over the band' : 'unknown'
}

export function returnLossWords({ returnLoss }: ChannelEvaluation): string {
  if (returnLoss === null) return NO_REFLECTION
  const { whole, atNyquistDb, worstDb, worstAtHz } = returnLoss
  const worst = worstDb === null ? 'nothing comes back' : `worst ${db(worstDb)} at ${shortFrequency(worstAtHz)}`
  const below = whole ? 'up to Nyquist' : 'as far as the data reach, which is not from 0.05 GHz to Nyquist'
  return `${atNyquistDb === null ? '' : `${db(atNyquistDb)} at Nyquist, `}${worst} ${below}`
}

/** @returns null where there is no curve */
export function curveWords({ curve }: ChannelEvaluation): string | null {
  if (curve === null) return null
  const { missed, whole } = curve
  if (missed === null)
    return whole ? 'kept over its whole range' : 'not missed by the lines that have data; with all of them unknown'
  const rest = whole ? '' : '; not every line has data there, so more may be missed'
  const [from, to, at] = [missed.fromHz, missed.toHz, missed.worstAtHz].map(shortFrequency)
  return `missed from ${from} to ${to}, most at ${at}, by ${db(missed.worstDb)}${rest}`
}

/** Frequencies of a grid, to be read: four figures. */
export function shortFrequency(hz: number): string {
  return frequencyWords(Number(hz.toPrecision(4)))
}
