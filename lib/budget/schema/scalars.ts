import { z } from 'zod'
import { DIMENSIONS, type Dimension, isQuantity, parseQuantity } from '../../channel/units'

/**
 * The kinds of value a field of a budget may hold. Every value is one scalar (string, boolean, null or finite number),
 * because one field is one entry of the shared document. A quantity is kept as typed, with its unit.
 */
export type FieldMeta =
  | { kind: 'quantity'; dimensions: readonly Dimension[]; unit: string; min: number; max: number; what: string }
  | { kind: 'text'; maxLength: number; what: string }
  | { kind: 'choice'; choices: readonly string[]; what: string }
  | { kind: 'set'; choices: readonly string[]; what: string }
  | { kind: 'flag'; what: string }
  | { kind: 'integer'; min: number; max: number; what: string }
  | { kind: 'reference'; section: string; what: string }
  | { kind: 'order'; what: string }
  | { kind: 'note'; maxLength: number; what: string }

/** What each field is, for screens, the gate and the documentation; keyed by the field's schema object. */
export const fieldMeta = new WeakMap<z.ZodType, FieldMeta>()

function described<T extends z.ZodType>(schema: T, meta: FieldMeta): T {
  const named = schema.meta({ description: meta.what }) as T
  fieldMeta.set(named, meta)
  return named
}

/** A lone surrogate cannot be written as UTF-8, so it could never be hashed or exported. */
const wellFormed = (text: string) =>
  !/[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/.test(text)

const optional = <T extends z.ZodType>(schema: T) => schema.nullable().default(null as never)

/** One value of each dimension, for messages and for the generated JSON Schema. */
export const SAMPLES: Readonly<Record<Dimension, string>> = {
  length: '5 in',
  frequency: '26.5625 GHz',
  bitRate: '106.25 Gb/s',
  symbolRate: '53.125 GBd',
  time: '2 ps',
  loss: '1.35 dB',
  lossPerLength: '0.95 dB/in',
  delayPerLength: '170 ps/in',
  capacitance: '120 fF',
  inductance: '60 pH',
  resistance: '100 Ω',
  temperature: '25 °C',
  ratio: '6 %',
  perKelvin: '0.12 %/K',
  number: '3.6',
}

type Bounds = { min: number; max: number; unit?: string }

/** A number with its unit, as typed; bounds are in SI units of the first dimension. */
export function quantity(dimensions: Dimension | readonly Dimension[], bounds: Bounds, what: string) {
  const list = typeof dimensions === 'string' ? [dimensions] : dimensions
  const first = list[0] as Dimension
  const unit = bounds.unit ?? Object.keys(DIMENSIONS[first].units)[0] ?? ''
  const schema = z
    .string(`Write the number and its unit as text, such as "${SAMPLES[first]}".`)
    .max(40, 'Write the number and its unit in at most 40 characters.')
    .check((ctx) => {
      const result = parseQuantity(ctx.value, list)
      const issue = isQuantity(result) ? outOfBounds(result.value, result.dimension, list, bounds) : result.reason
      if (issue) ctx.issues.push({ code: 'custom', message: issue, input: ctx.value })
    })
  return described(optional(schema), {
    kind: 'quantity',
    dimensions: list,
    unit,
    min: bounds.min,
    max: bounds.max,
    what,
  })
}

function outOfBounds(value: number, dimension: Dimension, list: readonly Dimension[], bounds: Bounds): string | null {
  if (dimension !== list[0]) return value < 0 || value > 10 ? 'Type a share between 0 % and 1000 %.' : null
  if (value < 0 && bounds.min >= 0 && (dimension === 'loss' || dimension === 'lossPerLength')) {
    return 'A loss is typed as a positive number of decibels; leave the minus sign out.'
  }
  if (value < bounds.min || value > bounds.max) {
    const si = DIMENSIONS[dimension].si
    return `Type a value between ${readable(bounds.min)} and ${readable(bounds.max)} ${si}.`
  }
  return null
}

const readable = (value: number) => String(Number(value.toPrecision(6)))

function plainText(maxLength: number) {
  return z
    .string('Write text between quotation marks.')
    .max(maxLength, `Write at most ${maxLength} characters.`)
    .refine(wellFormed, 'The text has half of a character pair in it; type it again.')
}

export function text(maxLength: number, what: string) {
  return described(optional(plainText(maxLength)), {
    kind: 'text',
    maxLength,
    what,
  })
}

export function choice<const T extends readonly [string, ...string[]]>(choices: T, what: string) {
  return described(optional(z.enum(choices, `Write one of: ${choices.join(', ')}.`)), { kind: 'choice', choices, what })
}

/** Several of a closed list, kept as one string: the codes in list order, separated by one space; '' is 'none of them'. */
export function setOf(choices: readonly string[], what: string) {
  const schema = z
    .string('Write the codes as one text, with a space between.')
    .max(400, 'Write each code once.')
    .refine(
      (value) => value === sortedSet(value.split(' ').filter(Boolean), choices),
      `List the codes in this order, one space between: ${choices.join(' ')}.`,
    )
  return described(optional(schema), { kind: 'set', choices, what })
}

export function sortedSet(codes: readonly string[], choices: readonly string[]): string {
  return choices.filter((code) => codes.includes(code)).join(' ')
}

export function flag(what: string) {
  return described(optional(z.boolean('Write true or false.')), { kind: 'flag', what })
}

/** 'removed' is a field like any other; nothing is ever deleted from a budget. */
export const removed = described(z.boolean('Write true or false.').default(false), {
  kind: 'flag',
  what: 'Taken out of the budget; kept for the trail.',
})

export function integer(min: number, max: number, what: string) {
  const asked = `Write a whole number from ${min} to ${max}, without quotation marks.`
  return described(optional(z.number(asked).int(asked).min(min, asked).max(max, asked)), {
    kind: 'integer',
    min,
    max,
    what,
  })
}

export const ID = /^[a-z0-9][a-z0-9-]{0,39}$/
export const identifier = z.string().regex(ID, 'An id has 1 to 40 small letters, digits and hyphens.')

export function reference(section: string, what: string) {
  const asked = `Name an id of '${section}'.`
  return described(optional(z.string(asked).regex(ID, asked)), { kind: 'reference', section, what })
}

/** A position between two others: a fractional index, so that two people can insert at once. Ties are broken by id. */
export const order = described(
  z
    .string("Write a key for the position, such as 'a0'.")
    .max(128, 'Write at most 128 characters.')
    .regex(/^[A-Za-z][0-9A-Za-z]+$/, "An order key starts with a letter, such as 'a0'."),
  { kind: 'order', what: 'Position in the channel, as a fractional index.' },
)

/** Plain text that several people may type in at once. */
export const note = described(plainText(4000).default(''), {
  kind: 'note',
  maxLength: 4000,
  what: 'Free text.',
})
