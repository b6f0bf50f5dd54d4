import { isQuantity, parseQuantity } from '../../channel/units'
import type { Findings } from '../findings'
import type { Computed, Values } from '../models/piece'
import { type FieldMeta, fieldMeta, SECTIONS } from '../schema'
import type { Varied } from './varied'

/** Why a text cannot be read, and what to do. */
type Refusal = { readonly what: string; readonly todo: string }

/**
 * What varies in a computed line: what its field 'varies' says, such as 'width 10 %; dk 3 %; stub 0.1 mm', fields that the
 * number rests on, each with a limit to both sides in its unit or in % of the value; and what other fields of the line say, such
 * as the tolerance of a drill, where the text does not name it.
 * @returns null after writing down what is wrong
 */
export function variedOf(fields: Findings<'lines'>, { values, varies }: Computed): readonly Varied[] | null {
  const said = parseVaries(fields.record.varies ?? '', values)
  if ('what' in said) return fields.say('unreadable-value', 'varies', `${fields.name}: ${said.what}`, said.todo)
  const implied = Object.entries(varies ?? {})
    .filter(([field]) => !said.some((one) => one.field === field))
    .map(([field, tolerance]) => withBounds(field, values[field] ?? Number.NaN, tolerance))
  // What varies by nothing does not vary.
  return [...said, ...implied].filter(({ tolerance }) => tolerance > 0)
}

function parseVaries(text: string, values: Values): readonly Varied[] | Refusal {
  const all: Varied[] = []
  for (const part of text.split(/[;\n]/)) {
    if (part.trim() === '') continue
    const one = parseOne(part.trim(), values)
    if ('what' in one) return one
    if (all.some(({ field }) => field === one.field)) {
      return { what: `'${one.field}' is said to vary twice.`, todo: 'Leave one of the two.' }
    }
    all.push(one)
  }
  return all
}

function parseOne(part: string, values: Values): Varied | Refusal {
  const [, name = '', amount = ''] = /^([a-z][a-z ]*?)\s*((?:±|\+\/-)?\s*[\d.,+\-−–].*)$/i.exec(part) ?? []
  if (name === '') {
    return {
      what: `'${part}' does not say what varies and by how much.`,
      todo: "Type it like 'width 10 %; dk 3 %; stub 0.1 mm'.",
    }
  }
  const known = Object.keys(values)
  const field = known.find((key) => key.toLowerCase() === name.replaceAll(' ', '').toLowerCase())
  const nominal = field === undefined ? undefined : values[field]
  if (field === undefined || nominal === undefined) {
    const todo =
      known.length === 0 ? 'Clear what varies.' : `What can vary here: ${known.toSorted(compareWords).join(', ')}.`
    return { what: `'${name}' is nothing that this number rests on.`, todo }
  }
  return toleranceOf(field, nominal, amount.replace(/^(?:±|\+\/-)\s*/, ''))
}

function toleranceOf(field: string, nominal: number, amount: string): Varied | Refusal {
  const read = parseQuantity(amount, [...(metaOf(field)?.dimensions ?? []), 'ratio'])
  if (!isQuantity(read))
    return { what: `by how much '${field}' varies, '${amount}', cannot be read.`, todo: read.reason }
  if (read.value < 0) {
    return { what: `'${field}' cannot vary by less than nothing.`, todo: 'Type the limit without a sign.' }
  }
  if (read.unit !== '%') return withBounds(field, nominal, read.value)
  if (read.value > 1) {
    return { what: `'${field}' cannot vary by more than all of it, '${amount}'.`, todo: 'Type 100 % or less.' }
  }
  if (nominal === 0 && read.value > 0) {
    return { what: `'${field}' is 0, and a share of it is nothing.`, todo: 'Type by how much it varies in its unit.' }
  }
  return withBounds(field, nominal, read.value * Math.abs(nominal))
}

/** A value cannot vary past what its field allows. */
function withBounds(field: string, nominal: number, tolerance: number): Varied {
  const { min, max } = metaOf(field) ?? { min: Number.NEGATIVE_INFINITY, max: Number.POSITIVE_INFINITY }
  return { field, nominal, tolerance, min: Math.min(min, nominal), max: Math.max(max, nominal) }
}

function metaOf(field: string): Extract<FieldMeta, { kind: 'quantity' }> | null {
  const schemas: Readonly<Record<string, object>> = SECTIONS.lines.shape
  const schema = Object.hasOwn(schemas, field) ? schemas[field] : undefined
  const meta = schema && fieldMeta.get(schema as never)
  return meta?.kind === 'quantity' ? meta : null
}

const compareWords = (a: string, b: string) => a.localeCompare(b, 'en')
