import type { SignallingEvaluation } from '../../../../../lib/budget/evaluation'
import { TIME, typedValue } from '../../../../../lib/budget/quantities'
import type { Head } from '../../../../../lib/budget/schema'
import { kneeFrequency, spectrumOf } from '../../../../../lib/channel/signalling'
import { shortFrequency } from './cascadeFacts'

/** An edge from 20 to 80 % is so much of the whole straight edge. */
const MIDDLE = 0.6

/** Where the power of random data lies. */
export type Power = {
  /** Density over that at 0 Hz, for each frequency asked for. */
  readonly density: readonly number[]
  readonly words: string
}

/**
 * The spectrum of random data at the link's symbol rate with the transmitter's edge, at rising frequencies in Hz.
 * @returns null where the symbol rate is not known
 */
export function powerOf(signalling: SignallingEvaluation, head: Head, hz: readonly number[]): Power | null {
  const { symbolRate, nyquist } = signalling
  if (symbolRate === null || nyquist === null) return null
  const typed = typedValue(TIME, head.edgeTime)
  const whole = (typed ?? 0) / MIDDLE
  const tooLong = whole * symbolRate > 1
  const signal = { symbolRate, edge: tooLong ? 0 : whole }
  const { density } = spectrumOf(signal, Float64Array.from(hz))
  const below = spectrumOf(signal, Float64Array.of(nyquist)).below[0] ?? 0
  return { density: Array.from(density), words: `${shareWords(below)} ${edgeWords(head.edgeTime, typed, tooLong)}` }
}

const shareWords = (below: number) => `${(100 * below).toFixed(1)} % of the power of random data lies below Nyquist.`

function edgeWords(edgeTime: string | null, typed: number | null, tooLong: boolean): string {
  if (typed === null) return 'The edge of the transmitter is not given; steps are taken.'
  const knee = `its knee lies at ${shortFrequency(kneeFrequency(typed, '20-80'))}`
  return tooLong
    ? `An edge of ${edgeTime} is longer than a symbol; steps are taken, and ${knee}.`
    : `The edge takes ${edgeTime} from 20 to 80 %; ${knee}.`
}
