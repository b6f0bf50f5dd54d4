import { formatScaled } from '../units'
import type { Cursor } from './cursor'
import { Growing } from './growing'
import type { Numbers } from './numbers'
import { Unreadable } from './unreadable'
import type { Warnings } from './warnings'

/** Numbers of a row of noise data. */
export const NOISE_ROW = 5

/**
 * The rows of network data: a frequency and the pairs of one matrix each, however they are broken into lines.
 * Of rows with the same frequency the first counts and the others are warned of; a frequency that falls is refused.
 */
export class Rows {
  readonly hz = new Growing()
  readonly pairs = new Growing()
  /** The line on which each row begins. */
  readonly lines = new Growing()
  /** Rows as the file has them, those that do not count among them. */
  count = 0
  private place = 0
  private begun = 0
  private repeated = false

  /**
   * @param size numbers of a row
   * @param exponent power of ten from the file's unit to Hz
   * @param noiseMayFollow on lines of five numbers, of which the first is no higher than the last frequency (version 1, two ports)
   */
  constructor(
    readonly size: number,
    private readonly exponent: number,
    private readonly noiseMayFollow: boolean,
    private readonly warnings: Warnings,
  ) {}

  /** Takes the numbers from the cursor to the end of the line. @returns null, or the frequency in Hz at which noise data begin instead */
  takeLine(numbers: Numbers, cursor: Cursor): number | null {
    const { pairs } = this
    do {
      if (this.place === 0) {
        const noise = this.beginRow(numbers.take(this.exponent), cursor)
        if (noise !== null) return noise
      } else {
        pairs.push(numbers.take(0))
        if (++this.place === this.size) this.endRow()
      }
    } while (cursor.more())
    return null
  }

  /** @throws Unreadable where the last row is not whole */
  finish(): void {
    if (this.place > 0)
      throw new Unreadable(
        this.begun,
        `The data end inside the row that begins here, with ${this.place} of its ${this.size} numbers; see whether the file is whole and the number of ports right.`,
      )
  }

  private beginRow(read: number, cursor: Cursor): number | null {
    const { line } = cursor
    if (read < 0) throw new Unreadable(line, `A frequency of ${formatScaled(read, 'frequency')} is impossible.`)
    const hz = read === 0 ? 0 : read
    const last = this.hz.length === 0 ? -1 : this.hz.at(this.hz.length - 1)
    if (hz <= last) {
      if (this.noiseMayFollow && cursor.words(NOISE_ROW) === NOISE_ROW - 1) return hz
      if (hz < last) throw this.falls(last, hz, line)
    }
    this.repeated = hz === last
    if (!this.repeated) {
      this.hz.push(hz)
      this.lines.push(line)
    }
    this.begun = line
    this.place = 1
    return null
  }

  private endRow(): void {
    this.place = 0
    this.count++
    if (!this.repeated) return
    const numbers = this.size - 1
    const row = this.pairs.length - numbers
    let same = true
    for (let k = 0; k < numbers; k++) same &&= this.pairs.at(row + k) === this.pairs.at(row - numbers + k)
    this.pairs.length = row
    const hz = this.hz.at(this.hz.length - 1)
    this.warnings.add(
      this.begun,
      () =>
        `${formatScaled(hz, 'frequency')} stands here again, with ${same ? 'the same' : 'other'} values; the first of the rows counts.`,
    )
  }

  private falls(from: number, to: number, line: number): Unreadable {
    const advice = this.noiseMayFollow
      ? 'sort the rows (noise data after them have five numbers a line)'
      : 'sort the rows, or give the file the ending that has its number of ports'
    return new Unreadable(
      line,
      `The frequency falls from ${formatScaled(from, 'frequency')} to ${formatScaled(to, 'frequency')}; ${advice}.`,
    )
  }
}
