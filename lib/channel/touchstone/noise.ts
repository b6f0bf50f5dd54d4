import { Growing } from './growing'
import type { Numbers } from './numbers'
import { NOISE_ROW } from './rows'
import { Unreadable } from './unreadable'
import type { Warnings } from './warnings'

/** Noise data of a two-port: Hz, least noise figure in dB, |Γopt|, its angle in degrees, Rn. */
export class NoiseRows {
  private readonly values = new Growing()

  /**
   * @param exponent power of ten from the file's unit to Hz
   * @param ohm what Rn is divided by in the file: the reference in version 1, 1 in version 2
   */
  constructor(
    private readonly exponent: number,
    private readonly ohm: number,
  ) {}

  begin(hz: number): void {
    this.values.push(hz)
  }

  take(numbers: Numbers): void {
    const place = this.values.length % NOISE_ROW
    const value = numbers.take(place === 0 ? this.exponent : 0)
    this.values.push(place === NOISE_ROW - 1 ? value * this.ohm : value)
  }

  /** @param line on which the data end; @param expected rows by [Number of Noise Frequencies], null where it is not there */
  finish(line: number, expected: number | null, warnings: Warnings): Float64Array {
    if (this.values.length % NOISE_ROW !== 0)
      throw new Unreadable(
        line,
        'The noise data end inside a row; each has five numbers. See whether the file is whole.',
      )
    const rows = this.values.length / NOISE_ROW
    if (expected !== null && expected !== rows)
      warnings.add(line, `[Number of Noise Frequencies] is ${expected}, but there are ${rows}.`)
    return this.values.all()
  }
}
