import { latin1 } from './latin1'
import { LARGEST_POWER, POWER } from './powers'
import { scaled } from './scaled'

/** Digits that fit an integer of 32 bits, which is what makes the loop fast. */
const CHUNK = 9
/** Digits of which a double holds every integer. */
const EXACT_DIGITS = 15
const LARGEST_EXACT_POWER = 22
/** One chunk and what a double holds exactly. */
const MOST_DIGITS = CHUNK + EXACT_DIGITS
const LONGEST = 400
const POINT = 46
const MINUS = 45
const PLUS = 43
const ZERO = 48

/**
 * Reads decimal numbers out of bytes to the very bits that Number() gives their text, without making a string of them. Up to 15
 * digits take Clinger's exact path (PLDI 1990), up to 24 pairs of doubles, everything else Number() itself.
 */
export class Decimal {
  /** Where the number read last ends, or where it stopped being one. */
  end = 0

  /**
   * @param from index of the first character: a sign, a digit or a point
   * @param shift the value is multiplied by 10^shift before it is rounded, so that 0.3 GHz and 300 MHz are one number of Hz
   * @returns NaN where there is no number or one of more than 400 characters
   */
  read(bytes: Uint8Array, from: number, shift: number): number {
    const { length } = bytes
    let at = from
    let byte = bytes[at] as number
    const negative = byte === MINUS
    if (negative || byte === PLUS) byte = ++at < length ? (bytes[at] as number) : 0
    const first = at
    let point = -1
    let chunks = 0
    let chunk0 = 0
    let chunk1 = 0
    let chunk = 0
    let digits = 0
    while (byte === ZERO) byte = ++at < length ? (bytes[at] as number) : 0
    for (;;) {
      let digit = byte - ZERO
      while (digits < CHUNK && digit >= 0 && digit <= 9) {
        chunk = (chunk * 10 + digit) | 0
        digits++
        byte = ++at < length ? (bytes[at] as number) : 0
        digit = byte - ZERO
      }
      if (digit >= 0 && digit <= 9) {
        if (chunks === 0) chunk0 = chunk
        else if (chunks === 1) chunk1 = chunk
        chunks++
        chunk = 0
        digits = 0
      } else if (byte === POINT && point < 0) {
        point = at
        byte = ++at < length ? (bytes[at] as number) : 0
        if (digits === 0 && chunks === 0) while (byte === ZERO) byte = ++at < length ? (bytes[at] as number) : 0
      } else break
    }
    this.end = at
    const mantissaEnd = at
    if (at - first === (point < 0 ? 0 : 1)) return Number.NaN
    let exponent = shift - (point < 0 ? 0 : at - point - 1)
    let power = 0
    if (byte === 101 || byte === 69) {
      byte = ++at < length ? (bytes[at] as number) : 0
      const down = byte === MINUS
      if (down || byte === PLUS) byte = ++at < length ? (bytes[at] as number) : 0
      const firstOfPower = at
      while (byte >= ZERO && byte <= 57) {
        if (power < 1e6) power = power * 10 + (byte - ZERO)
        byte = ++at < length ? (bytes[at] as number) : 0
      }
      this.end = at
      if (at === firstOfPower) return Number.NaN
      if (down) power = -power
      exponent += power
    }
    if (at - from > LONGEST) return Number.NaN
    const all = chunks * CHUNK + digits
    if (all === 0) return negative ? -0 : 0
    const low = chunks < 2 ? chunk : chunk1 * (POWER[LARGEST_POWER + digits] as number) + chunk
    let value = Number.NaN
    if (all <= EXACT_DIGITS && exponent >= -LARGEST_EXACT_POWER && exponent <= LARGEST_EXACT_POWER) {
      const whole = chunks === 0 ? chunk : chunk0 * (POWER[LARGEST_POWER + digits] as number) + chunk
      value =
        exponent < 0
          ? whole / (POWER[LARGEST_POWER - exponent] as number)
          : whole * (POWER[LARGEST_POWER + exponent] as number)
    } else if (chunks === 0) value = scaled(chunk, 0, 0, exponent)
    else if (all <= MOST_DIGITS) value = scaled(chunk0, low, all - CHUNK, exponent)
    if (Number.isNaN(value)) value = Number(`${latin1(bytes, first, mantissaEnd)}e${power + shift}`)
    return negative ? -value : value
  }
}
