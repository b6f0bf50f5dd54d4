import { BANG, type Cursor } from './cursor'
import { Decimal } from './decimal'
import { Unreadable } from './unreadable'

/** As many numbers as a file may have: 160 MB of them, ten times a 16-port file of 4,000 points. */
const MOST_NUMBERS = 20_000_000

/** Takes one number after the other from where a cursor stands. */
export class Numbers {
  private readonly decimal = new Decimal()
  private count = 0

  constructor(private readonly cursor: Cursor) {}

  /** @param shift see {@link Decimal.read}. @returns a finite number; the cursor stands behind it then */
  take(shift: number): number {
    const { cursor, decimal } = this
    const value = decimal.read(cursor.bytes, cursor.at, shift)
    const behind = cursor.bytes[decimal.end] as number
    if (value - value !== 0 || (behind > 32 && behind !== BANG)) throw notANumber(cursor)
    if (++this.count > MOST_NUMBERS)
      throw new Unreadable(cursor.line, 'The file has more than 20 million numbers; save it with fewer frequencies.')
    cursor.at = decimal.end
    return value
  }
}

function notANumber(cursor: Cursor): Unreadable {
  const shown = cursor.shown()
  const advice = /^[-+.\d]*,[-+.,\d]*…?$/.test(shown)
    ? 'write a decimal point and put blanks between numbers'
    : /^[-+]?(nan|inf)/i.test(shown)
      ? 'take this frequency out or measure it again'
      : 'see whether the file is a whole Touchstone file'
  return new Unreadable(cursor.line, `'${shown}' is not a finite number; ${advice}.`)
}
