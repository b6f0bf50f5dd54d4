import type { Line } from '../../schema'
import type { LaminateEntry } from './entry'

/**
 * The fields of a line computed from its cross-section that a laminate fills: its values, where they come from, and how far
 * the loss may be off, as a limit to both sides. A tolerance that the entry does not say leaves the line's own.
 */
export function lineFromLaminate({ dk, df, anchor, method, resin, basis, tolerance }: LaminateEntry): Partial<Line> {
  const values = { dk, df, anchor, method, resin, basis }
  if (tolerance === null) return values
  return { ...values, toleranceMinus: tolerance, tolerancePlus: tolerance, toleranceMeaning: 'limit' }
}
