import { Comments } from './comments'
import type { Cursor } from './cursor'
import type { TouchstoneFile } from './file'
import { MOST_PORTS } from './fileName'
import { finished } from './finished'
import { Header, type Layout, layoutOf } from './header'
import { readKeyword, type Section } from './keywords'
import { elementsOf } from './matrices'
import { NoiseRows } from './noise'
import { Numbers } from './numbers'
import { EXPONENT, type Options, readOptions, resistance } from './options'
import { Rows } from './rows'
import { Unreadable } from './unreadable'
import { Warnings } from './warnings'

const NO_DATA = 'The file has no data; save it again with at least one frequency.'

/** One reading of a file from its beginning: what stands at the cursor goes to where it belongs. */
export class Scan {
  private readonly header = new Header()
  private readonly comments = new Comments()
  private readonly warnings = new Warnings()
  private readonly numbers: Numbers
  private section: Section = 'head'
  private data: { readonly layout: Layout; readonly rows: Rows } | null = null
  private noise: NoiseRows | null = null

  /**
   * @param named ports that the file's name says, null if none; @param nameIsVersion2 the name is of a file of version 2
   * @param late the option line, where an earlier reading found it behind the first data
   */
  constructor(
    private readonly cursor: Cursor,
    private readonly named: number | null,
    private readonly nameIsVersion2: boolean,
    late: Options | null,
  ) {
    this.numbers = new Numbers(cursor)
    this.header.options = late
    if (late) this.warnings.add(late.line, 'The option line stands behind the first data; it was used for all of them.')
  }

  comment(): void {
    this.cursor.at++
    const { from, to } = this.cursor.skipLine()
    this.comments.add(this.cursor.bytes, from, to)
  }

  /** @returns null, or the first option line where it stands behind data that would have needed it */
  optionLine(): Options | null {
    const { cursor, header } = this
    const { line } = cursor
    cursor.at++
    if (header.options === null) {
      header.options = readOptions(cursor)
      return this.data ? header.options : null
    }
    if (line !== header.options.line)
      this.warnings.add(line, 'Only the first option line counts; this one was left out.')
    cursor.skipLine()
    return null
  }

  /** @returns whether the file ends here */
  keyword(): boolean {
    const { line } = this.cursor
    this.section = readKeyword(this.cursor, this.header, this.warnings)
    if (this.section === 'end') return true
    if (this.section === 'noise') {
      if (this.data?.layout.ports !== 2 || this.noise)
        throw new Unreadable(line, '[Noise Data] may stand only once, behind the [Network Data] of two ports.')
      this.noise = new NoiseRows(EXPONENT[this.data.layout.options.unit], 1)
    } else if (this.data) throw new Unreadable(line, 'Behind [Network Data] only [Noise Data] and [End] may stand.')
    else if (this.section === 'network') this.begin(line)
    return false
  }

  /** Numbers of the data, or a word behind a keyword that takes several. */
  words(): void {
    const { header, cursor, data } = this
    if (this.section === 'network' && data) {
      const hz = data.rows.takeLine(this.numbers, cursor)
      if (hz !== null) this.beginNoiseOfVersion1(data.layout, hz)
    } else if (this.noise) this.noise.take(this.numbers)
    else if (this.section === 'reference' && header.reference) {
      header.reference.push(resistance(cursor.line, this.numbers.take(0)))
      this.checkRoom(header.reference, '[Reference]')
    } else if (this.section === 'modes' && header.modes) {
      header.modes.push(cursor.word())
      this.checkRoom(header.modes, '[Mixed-Mode Order]')
    } else this.beginVersion1()
  }

  /** @throws Unreadable where something is missing */
  file(): TouchstoneFile {
    const { header, data, warnings, cursor } = this
    if (!data) throw new Unreadable(null, NO_DATA)
    data.rows.finish()
    const { count } = data.rows
    if (count === 0) throw new Unreadable(null, NO_DATA)
    if (header.frequencies !== null && header.frequencies !== count)
      throw new Unreadable(
        cursor.line,
        `[Number of Frequencies] is ${header.frequencies}, but there are ${count}; see whether the file is whole.`,
      )
    const noise = this.noise?.finish(cursor.line, header.noiseFrequencies, warnings) ?? null
    if (header.options === null) warnings.add(null, 'There is no option line; it was taken to be # GHz S MA R 50.')
    if (header.keywordVersion !== null && this.section !== 'end')
      warnings.add(cursor.line, '[End] is missing at the end of the file.')
    return finished(data.layout, data.rows, noise, this.comments.text(), warnings)
  }

  private checkRoom(list: readonly unknown[], keyword: string): void {
    if (list.length > MOST_PORTS)
      throw new Unreadable(this.cursor.line, `${keyword} has more than ${MOST_PORTS} entries; write one for each port.`)
  }

  private begin(line: number): void {
    const { header, named, warnings } = this
    const layout = layoutOf(header, line)
    if (named !== null && named !== layout.ports)
      warnings.add(null, `The file's ending says ${named} ports, [Number of Ports] ${layout.ports}; the latter counts.`)
    if (header.keywordVersion !== null && header.frequencies === null)
      warnings.add(line, '[Number of Frequencies] is missing; whether the file is whole was not checked.')
    const size = 1 + 2 * elementsOf(layout.ports, layout.matrix)
    const noiseMayFollow = header.keywordVersion === null && layout.ports === 2
    this.data = { layout, rows: new Rows(size, EXPONENT[layout.options.unit], noiseMayFollow, warnings) }
  }

  private beginVersion1(): void {
    const { header, cursor } = this
    if (header.keywordVersion !== null)
      throw new Unreadable(
        cursor.line,
        `'${cursor.shown()}' stands before [Network Data]; write that keyword before the data.`,
      )
    if (this.nameIsVersion2)
      throw new Unreadable(
        cursor.line,
        'A .ts file begins with [Version] 2.0; give one of version 1 an ending such as .s4p.',
      )
    if (this.named === null)
      throw new Unreadable(null, 'The number of ports is unknown; give the file an ending such as .s2p or .s4p.')
    header.ports = this.named
    this.begin(cursor.line)
    this.section = 'network'
    this.words()
  }

  private beginNoiseOfVersion1(layout: Layout, hz: number): void {
    this.noise = new NoiseRows(EXPONENT[layout.options.unit], layout.resistances[0] as number)
    this.noise.begin(hz)
    this.section = 'noise'
  }
}
