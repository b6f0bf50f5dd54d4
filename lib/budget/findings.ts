import { isQuantity } from '../channel/units'
import type { FlagCode, FlagDraft } from './flags'
import { type Reader, unitsOf } from './quantities'
import { fieldWords, nameOf } from './record'
import type { RecordOf, SectionName } from './schema'

type QuantityField<S extends SectionName> = {
  [F in keyof RecordOf<S>]: string extends RecordOf<S>[F] ? F : never
}[keyof RecordOf<S>] &
  string

/** Reads the fields of one record and writes down what is wrong with them. */
export class Findings<S extends SectionName> {
  readonly name: string
  constructor(
    readonly section: S,
    readonly id: string,
    readonly record: RecordOf<S>,
    readonly drafts: FlagDraft[],
  ) {
    this.name = nameOf(section, id, record)
  }

  /** The value of a field that the number cannot do without; null after writing down why there is none. */
  need(field: QuantityField<S>, reader: Reader): number | null {
    const text = this.record[field] as string | null
    if (text !== null) return this.read(field, text, reader)
    this.say(
      'field-missing',
      field,
      `${this.name}: ${fieldWords(this.section, field)} is not given.`,
      `Type it with its unit: ${unitsOf(reader)}.`,
    )
    return null
  }

  /** The value of a field that may be empty; 'unreadable' after writing down that it cannot be read. */
  may(field: QuantityField<S>, reader: Reader): number | null | 'unreadable' {
    const text = this.record[field] as string | null
    return text === null ? null : (this.read(field, text, reader) ?? 'unreadable')
  }

  say(code: FlagCode, field: string | null, message: string, todo: string): null {
    this.drafts.push({ code, section: this.section, id: this.id, field, message, todo })
    return null
  }

  private read(field: string, text: string, reader: Reader): number | null {
    const result = reader.read(text)
    if (isQuantity(result)) return result.value
    return this.say(
      'unreadable-value',
      field,
      `${this.name}: ${fieldWords(this.section, field)} '${text}' cannot be read.`,
      result.reason,
    )
  }
}
