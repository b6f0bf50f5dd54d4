import type { Conditions } from './corner'
import type { LineItem } from './lineItem'
import { type Asked, type LineLoss, lineLoss } from './lineLoss'
import type { Line, LossClass } from './schema'

type Kept = {
  readonly line: Line
  readonly lossClass: LossClass | null
  readonly asked: Asked
  readonly corner: Conditions | null
  readonly result: LineLoss
}

/** Results kept in all, and per line, lane and frequency: budgets may share ids. */
const MOST = 40_000
const PER_KEY = 4

const kept = new Map<string, Kept[]>()
let size = 0

/**
 * lineLoss, remembered by content: the values of the line and its loss class are compared, not their identity, because a
 * caller may change a budget in place or build it anew for every edit.
 * @param lane lane whose values the line has, or 0
 */
export function rememberedLoss(item: LineItem, lane: number, asked: Asked): LineLoss {
  const key = `${item.id}/${lane}/${asked.hz}`
  const entries = kept.get(key)
  const known = entries?.find((entry) => matches(entry, item, asked))
  if (known) return known.result
  const result = lineLoss(item, asked)
  if (size >= MOST) {
    kept.clear()
    size = 0
  }
  const entry = {
    line: { ...item.line },
    lossClass: item.lossClass && { ...item.lossClass },
    asked,
    corner: asked.corner && { ...asked.corner },
    result,
  }
  if (!entries || size === 0) kept.set(key, [entry])
  else if (entries.length < PER_KEY) entries.push(entry)
  else entries.splice(0, 1, ...entries.slice(1), entry)
  size++
  return result
}

function matches(entry: Kept, item: LineItem, asked: Asked): boolean {
  return (
    entry.asked.reference === asked.reference &&
    entry.asked.mistake === asked.mistake &&
    same(entry.line, item.line) &&
    same(entry.lossClass, item.lossClass) &&
    same(entry.corner, asked.corner)
  )
}

/** Whether two flat records hold the same values. Records of one kind have the same fields. */
function same(a: object | null, b: object | null): boolean {
  if (a === null || b === null) return a === b
  const other = b as Record<string, unknown>
  for (const [field, value] of Object.entries(a)) if (other[field] !== value) return false
  return true
}
