import type { Judged } from '../allowance/judge'
import { overlapIn } from '../allowance/overlap'
import type { Context } from '../context'
import type { FlagDraft } from '../flags'
import type { LineItem } from '../lineItem'
import { nameOf, recordOf } from '../record'
import type { Check } from './check'
import { lineFlag } from './lineFlag'

/** Overlap and reserve lines. */
export const special: Check = function* ({ context, judged, lines }) {
  for (const item of context.items) {
    if (item.line.kind !== 'overlap') continue
    yield* overlaps(context, item, judged)
    const own = lines.get(item.id)?.loss.nominalDb ?? null
    for (const named of [item.line.overlapA, item.line.overlapB]) {
      const whole = named === null ? null : (lines.get(named)?.loss.nominalDb ?? null)
      if (own === null || whole === null || own <= whole) continue
      yield lineFlag(
        item,
        'overlap-too-large',
        'loss',
        `is larger than the line ${nameOf('lines', named, recordOf(context.budget, 'lines', named))} that contains it.`,
        'Correct the overlap, or name the right lines.',
      )
    }
  }
  for (const { span, conditions, allowance, evaluation } of judged) {
    for (const item of span.items) {
      const clash = item.line.kind === 'reserve' ? clashOf(item, conditions, allowance.judgedCorner !== null) : null
      if (clash === null) continue
      yield lineFlag(
        item,
        'reserve-and-corner',
        'purpose',
        `holds back decibels for ${item.line.purpose}, and ${evaluation.name === '' ? 'an allowance' : `'${evaluation.name}'`} is judged ${clash}, which contains it already.`,
        'Take the reserve out, or judge without.',
      )
    }
  }
}

function* overlaps(context: Context, item: LineItem, judged: readonly Judged[]): Generator<FlagDraft> {
  if (overlapIn(context, item, new Set()) === 'unnamed') {
    yield lineFlag(
      item,
      'overlap-unnamed',
      item.line.overlapA === null ? 'overlapA' : 'overlapB',
      'does not name two different lines of the channel that both contain the part.',
      'Name both lines.',
    )
    return
  }
  for (const { span, evaluation } of judged) {
    const between = new Set(span.items.map(({ id }) => id))
    if (!between.has(item.id) || overlapIn(context, item, between) === 'subtracts') continue
    yield lineFlag(
      item,
      'overlap-outside-planes',
      'overlapA',
      `names a line outside the planes of ${evaluation.name === '' ? 'an allowance' : `'${evaluation.name}'`}; the part is counted once there, so nothing is subtracted.`,
      'Name two lines between the planes, or move the overlap.',
    )
  }
}

function clashOf(item: LineItem, conditions: Judged['conditions'], corner: boolean): string | null {
  const { purpose } = item.line
  if (purpose === 'temperature' && corner && conditions.corner?.temperature != null)
    return `at ${conditions.corner.name}`
  if ((purpose === 'process' || purpose === 'measurement') && conditions.statistic !== 'nominal') {
    return conditions.statistic === 'worst' ? 'at the worst case of all tolerances' : 'with the tolerances (RSS)'
  }
  return null
}
