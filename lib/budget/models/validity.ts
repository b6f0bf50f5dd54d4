import type { Findings } from '../findings'
import type { Line } from '../schema'
import type { ModelInput } from './model'
import type { Values } from './piece'

/** Hz; the schema knows no higher frequency. A model without an upper end of its own ends here. */
export const HIGHEST = 3e11

/** One end or both of the range that a model holds in. */
export type Bound = {
  /** Where the flag hangs: the field that moves the figure most. */
  readonly field: keyof Line & string
  /** What is bounded, to stand in 'its … is 3.2'. */
  readonly what: string
  /** The figure, from the model's values with `hz` and `reference` added; NaN where something for it is not known. */
  readonly figure: (values: Values) => number
  readonly least: number
  readonly most: number
}

/** Rounding of units must not put a value that stands on a bound outside. */
const EDGE = 1e-9

/**
 * Whether the values lie in the model's range at the frequency asked for; what lies outside is written down.
 * @param values SI, of the model's fields
 */
export function holds(input: ModelInput, bounds: readonly Bound[], values: Values): boolean {
  const asked = { ...values, hz: input.hz, reference: input.reference ?? Number.NaN }
  const broken = bounds.filter((bound) => isBroken(bound, asked))
  for (const bound of broken) sayBroken(input.fields, bound, bound.figure(asked))
  return broken.length === 0
}

function isBroken({ figure, least, most }: Bound, values: Values): boolean {
  const value = figure(values)
  return value < least * (1 - EDGE) || value > most * (1 + EDGE)
}

function sayBroken(fields: Findings<'lines'>, { field, what, least, most }: Bound, value: number): void {
  const range =
    least === 0 ? `up to ${most}` : most === Number.POSITIVE_INFINITY ? `from ${least}` : `from ${least} to ${most}`
  fields.say(
    'outside-validity',
    field,
    `${fields.name}: its ${what} is ${Number(value.toPrecision(3))}; the model holds ${range}.`,
    'Check the value, or state the loss from a simulation or a measurement.',
  )
}
