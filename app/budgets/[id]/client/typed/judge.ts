import type { Scalar, SectionName } from '../../../../../lib/budget/schema'
import { withUnit } from '../../../../../lib/channel/units'
import { metaOf, refuseValue } from '../../../../../lib/sheet/layout'

/** What a person typed, as the value to keep, or a sentence that says what to do. */
export type Judged = { readonly value: Scalar } | { readonly reason: string }

export function isRefused(judged: Judged): judged is { readonly reason: string } {
  return 'reason' in judged
}

/**
 * Reads what was typed into one field. Empty means 'no value'. A bare number in a field with a unit gets that unit, so
 * that what is kept can be read alone. The schema has the last word, with the same sentence that the server would answer.
 */
export function judgeTyped(section: 'head' | SectionName, field: string, typed: string): Judged {
  const meta = metaOf(section, field)
  if (!meta) return { reason: `There is no field '${field}' here.` }
  const text = typed.trim()
  if (meta.kind === 'note') return judged(section, field, typed)
  if (text === '') return meta.kind === 'set' ? judged(section, field, '') : { value: null }
  switch (meta.kind) {
    case 'quantity':
      return judged(section, field, withUnit(text, meta.dimensions, meta.unit))
    case 'integer':
      return /^\d{1,12}$/.test(text)
        ? judged(section, field, Number(text), `Type a whole number between ${meta.min} and ${meta.max}.`)
        : { reason: `Type a whole number between ${meta.min} and ${meta.max}.` }
    case 'flag':
      return judged(section, field, text === 'yes')
    default:
      return judged(section, field, text)
  }
}

function judged(section: 'head' | SectionName, field: string, value: Scalar, words?: string): Judged {
  const reason = refuseValue(section, field, value)
  return reason === null ? { value } : { reason: words ?? reason }
}
