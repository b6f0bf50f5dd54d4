import type { Context } from '../context'
import type { LineItem } from '../lineItem'
import { livingRecord } from '../record'

/**
 * What an overlap line does between two planes. It subtracts where both lines that contain the part are counted there; where
 * one of them lies outside, the part is counted once and nothing is subtracted; without two lines it has no meaning.
 */
export function overlapIn(
  context: Context,
  item: LineItem,
  between: ReadonlySet<string>,
): 'subtracts' | 'outside' | 'unnamed' {
  const { overlapA, overlapB } = item.line
  if (overlapA === null || overlapB === null || overlapA === overlapB) return 'unnamed'
  for (const id of [overlapA, overlapB]) {
    const named = livingRecord(context.budget, 'lines', id)
    if (named === null || named.kind === 'overlap' || named.kind === 'reserve') return 'unnamed'
  }
  return between.has(overlapA) && between.has(overlapB) ? 'subtracts' : 'outside'
}
