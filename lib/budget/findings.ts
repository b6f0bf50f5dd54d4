import { isQuantity } from '../channel/units'
import type { FlagCode, FlagDraft } from './flags'
import { type Reader, unitsOf } from './quantities'
import { fieldWords, nameOf } from './record'
import type { Line, LossClass, RecordOf } from './schema'

type Section = 'lines' | 'lossClasses'

type TextField<S extends Section> = {
  [F in keyof RecordOf<S>]: RecordOf<S>[F] extends string | null ? (null extends RecordOf<S>[F] ? F : never) : never
}[keyof RecordOf<S>] &
  string

/** Reads the fields that a line's number rests on and writes down, as flags of the line, what is wrong with them. */
export class Findings<S extends Section> {
  private constructor(
    private readonly section: S,
    readonly record: RecordOf<S>,
    private readonly line: string,
    /** How messages name what they are about. */
    readonly name: string,
    readonly drafts: FlagDraft[],
  ) {}

  static ofLine(id: string, line: Line, drafts: FlagDraft[]): Findings<'lines'> {
    return new Findings('lines', line, id, nameOf('lines', id, line), drafts)
  }

  /** The fields of the line's loss class: what is wrong there is wrong with the line. */
  static ofClass(line: Findings<'lines'>, id: string, lossClass: LossClass): Findings<'lossClasses'> {
    const name = `${line.name}, by its loss class ${nameOf('lossClasses', id, lossClass)}`
    return new Findings('lossClasses', lossClass, line.line, name, line.drafts)
  }

  /** The value of a field that the number cannot do without; null after writing down why there is none. */
  need(field: TextField<S>, reader: Reader): number | null {
    const text = this.record[field] as string | null
    if (text !== null) return this.read(field, text, reader)
    return this.say(
      'field-missing',
      field,
      `${this.name}: the ${fieldWords(this.section, field)} is not given.`,
      `Type it with its unit: ${unitsOf(reader)}.`,
    )
  }

  /** The value of a field that may be empty; 'unreadable' after writing down that it cannot be read. */
  may(field: TextField<S>, reader: Reader): number | null | 'unreadable' {
    const text = this.record[field] as string | null
    return text === null ? null : (this.read(field, text, reader) ?? 'unreadable')
  }

  /** @param field of the record; on a loss class the flag hangs at the line's choice of it */
  say(code: FlagCode, field: keyof RecordOf<S> & string, message: string, todo: string): null {
    const at = this.section === 'lines' ? field : 'lossClass'
    this.drafts.push({ code, section: 'lines', id: this.line, field: at, message, todo })
    return null
  }

  private read(field: TextField<S>, text: string, reader: Reader): number | null {
    const result = reader.read(text)
    if (isQuantity(result)) return result.value
    const what = `${this.name}: the ${fieldWords(this.section, field)}, '${text}', cannot be read.`
    return this.say('unreadable-value', field, what, result.reason)
  }
}

/** The findings of a line or of its loss class, for what both have: a frequency, points. */
export type Owner = Pick<Findings<'lines'>, 'name'> & {
  say(code: FlagCode, field: 'at' | 'points', message: string, todo: string): null
}
