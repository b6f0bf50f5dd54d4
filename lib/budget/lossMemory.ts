import type { LineItem } from './lineItem'
import { type Asked, type LineLoss, lineLoss } from './lineLoss'

type Kept = {
  readonly line: object
  readonly lossClass: object | null
  readonly corner: object | null
  readonly asked: Asked
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
 */
export function rememberedLoss(item: LineItem, asked: Asked): LineLoss {
  const key = `${item.id}/${item.lane ?? ''}/${asked.hz}`
  const entries = kept.get(key) ?? []
  for (const entry of entries) if (matches(entry, item, asked)) return entry.result
  const result = lineLoss(item, asked)
  if (size >= MOST) {
    kept.clear()
    size = 0
  }
  const newest = {
    line: { ...item.line },
    lossClass: item.lossClass && { ...item.lossClass },
    corner: asked.corner && { ...asked.corner },
    asked,
    result,
  }
  const others = size === 0 ? [] : entries.slice(0, PER_KEY - 1)
  kept.set(key, [newest, ...others])
  size += others.length < entries.length ? 0 : 1
  return result
}

/** Forgets everything: for measuring, and for showing that remembering changes nothing. */
export function forgetLosses(): void {
  kept.clear()
  size = 0
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
  const [one, other] = [a as Record<string, unknown>, b as Record<string, unknown>]
  for (const field in one) if (one[field] !== other[field]) return false
  return true
}
