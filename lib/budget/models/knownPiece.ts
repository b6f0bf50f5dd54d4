import { type KnownLine, knownLineTwoPort, matchedTwoPort } from '../../channel/lines/knownAttenuation'
import type { Findings } from '../findings'
import { DELAY_PER_LENGTH, RESISTANCE } from '../quantities'
import type { Piece, Values } from './piece'

/** What is known of a piece by its attenuation over a band; impedance, delay and length too where they were typed. */
export type Known = {
  readonly from: number
  readonly to: number
  /** dB of the whole piece. */
  readonly attenuation: (hz: Float64Array) => Float64Array
  readonly line: KnownLine | null
}

/** With impedance and delay a line that reflects, else a matched one without delay. */
export function knownPiece({ from, to, attenuation, line }: Known): Piece {
  return {
    from,
    to,
    attenuation,
    reflects: line !== null,
    twoPort: (hz, reference) =>
      line === null ? matchedTwoPort(attenuation(hz)) : knownLineTwoPort(line, attenuation(hz), hz, reference),
    uncertainty: 0,
  }
}

/**
 * The line's own impedance and delay, for its values.
 * @returns no entries where not both are typed; null after writing down what cannot be read
 */
export function ownLine(fields: Findings<'lines'>): Values | null {
  const impedance = fields.may('impedance', RESISTANCE)
  const delay = fields.may('delay', DELAY_PER_LENGTH)
  if (impedance === 'unreadable' || delay === 'unreadable') return null
  return impedance === null || delay === null ? {} : { impedance, delay }
}

/** The line that the values describe; null where they lack impedance, delay or length. */
export function lineOf({ impedance, delay, length }: Values): KnownLine | null {
  if (impedance === undefined || delay === undefined || length === undefined) return null
  return { impedance, delay, length }
}
