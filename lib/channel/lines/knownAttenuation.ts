import { TWO_PORT } from '../networks/network'
import { lineTwoPort } from './lineTwoPort'

const DB_PER_NEPER = 20 / Math.LN10

/**
 * A piece of which only the loss is known: matched at both ends, without delay.
 * @param db loss at each frequency
 * @returns S11, S12, S21, S22, real and imaginary part side by side, 8 numbers a frequency
 */
export function matchedTwoPort(db: Float64Array): Float64Array {
  const s = new Float64Array(TWO_PORT * db.length)
  for (let i = 0; i < db.length; i++) {
    const at = TWO_PORT * i
    s[at + 2] = s[at + 4] = Math.exp(-(db[i] as number) / DB_PER_NEPER)
  }
  return s
}

export type KnownLine = {
  /** Ω. */
  readonly impedance: number
  /** s/m, taken as the same at all frequencies. */
  readonly delay: number
  /** m. */
  readonly length: number
}

/**
 * A uniform line of which the attenuation, a real impedance and a delay are known: γl = attenuation + jω·delay·length. The delay of a
 * real line falls a little with frequency; a constant one is what was typed.
 * @param db attenuation of the whole length at each frequency
 * @param reference Ω
 * @returns 8 numbers a frequency, as of lineTwoPort
 */
export function knownLineTwoPort(
  { impedance, delay, length }: KnownLine,
  db: Float64Array,
  hz: Float64Array,
  reference: number,
): Float64Array {
  const count = hz.length
  const zRe = new Float64Array(count).fill(impedance)
  // Over the whole line as one unit of length.
  const alpha = new Float64Array(count)
  const beta = new Float64Array(count)
  const radians = 2 * Math.PI * delay * length
  for (let i = 0; i < count; i++) {
    alpha[i] = (db[i] as number) / DB_PER_NEPER
    beta[i] = radians * (hz[i] as number)
  }
  return lineTwoPort({ alpha, beta, zRe, zIm: new Float64Array(count) }, 1, reference)
}
