import { parameterSpread, type Varied, variedOf } from './builds'
import type { Findings } from './findings'
import type { LineItem } from './lineItem'
import type { Computed, Piece } from './models/piece'
import { both, type Spread, spreadOf, type ToleranceDb, toleranceDb, toleranceOf } from './tolerance'

/** What random builds vary: the tolerance in dB, what moving in frequency added, and parameters inside the model. */
export type Random = ToleranceDb & {
  readonly spreadDb: number
  readonly varied: readonly Varied[]
  /** By what the corner multiplies what the model says. */
  readonly times: number
}

export const NOT_RANDOM: Random = { minusDb: 0, plusDb: 0, meaning: 'limit', spreadDb: 0, varied: [], times: 1 }

type Found = {
  readonly db: number
  readonly spreadDb: number
  readonly computed: Computed | null
  readonly piece: Piece | null
}

/**
 * What is typed as ±, else how far the model may be off; and what varies from build to build inside the model.
 * @param grown dB in the corner
 * @returns null after writing down what cannot be read or computed
 */
export function variationOf(
  item: LineItem,
  fields: Findings<'lines'>,
  { computed, piece, spreadDb, db }: Found,
  grown: number,
  hz: number,
  reference: number | null,
): { readonly spread: Spread; readonly random: Random } | null {
  const stated = toleranceDb(toleranceOf(item.line, item.lossClass), grown, piece?.uncertainty ?? 0)
  if (typeof stated === 'string') {
    sayUnreadable(fields, item, stated)
    return null
  }
  const spread = spreadOf(stated, spreadDb)
  const random: Random = { ...stated, spreadDb, varied: [], times: db === 0 ? 1 : grown / db }
  if (computed === null || reference === null) {
    if (item.line.varies !== null) sayVariesUnused(fields)
    return { spread, random }
  }
  const varied = variedOf(fields, computed)
  if (varied === null) return null
  if (varied.length === 0) return { spread, random }
  const parameters = parameterSpread(computed, varied, hz, reference)
  if (parameters === null) {
    return fields.say(
      'varies-beyond-model',
      'varies',
      `${fields.name}: at the ends of what varies its model gives no number.`,
      'Type smaller limits, or state a tolerance in dB.',
    )
  }
  return { spread: both(spread, scaled(parameters, random.times)), random: { ...random, varied } }
}

function scaled(spread: Spread, times: number): Spread {
  return {
    lowExtreme: spread.lowExtreme * times,
    highExtreme: spread.highExtreme * times,
    lowThreeSigma: spread.lowThreeSigma * times,
    highThreeSigma: spread.highThreeSigma * times,
  }
}

function sayVariesUnused(fields: Findings<'lines'>): void {
  fields.say(
    'varies-not-used',
    'varies',
    `${fields.name}: it says what varies, and its number is not computed from such values.`,
    'State a tolerance in dB or %, or choose a model that computes the line.',
  )
}

function sayUnreadable(fields: Findings<'lines'>, item: LineItem, field: 'toleranceMinus' | 'tolerancePlus'): void {
  fields.say(
    'unreadable-value',
    field,
    `${fields.name}: the tolerance '${item.line[field] ?? item.lossClass?.[field] ?? ''}' cannot be read.`,
    'Type it in dB or in %, such as 0.2 dB or 6 %.',
  )
}
