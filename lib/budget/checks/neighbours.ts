import type { FlagDraft } from '../flags'
import type { LineItem } from '../lineItem'
import { nameOf } from '../record'
import type { Check } from './check'
import { COVER_RULES, type CoverRule, type End } from './coverRules'

/** What two neighbours both count, or neither. Reserve and overlap are no pieces of the channel; planes do not part neighbours. */
export const neighbours: Check = ({ context }) => {
  const found: FlagDraft[] = []
  let left: LineItem | null = null
  for (const item of context.items) {
    if (item.line.kind === 'reserve' || item.line.kind === 'overlap') continue
    if (left !== null) for (const draft of remembered(left, item)) found.push(draft)
    left = item
  }
  return found
}

/** Joints kept; more than a worksheet has, for several worksheets. */
const MOST = 20_000

/** Content of the left line → of the right one, and what was found between them. */
const kept = new Map<string, { readonly right: string; readonly drafts: readonly FlagDraft[] }>()

function remembered(left: LineItem, right: LineItem): readonly FlagDraft[] {
  const known = kept.get(left.content)
  if (known?.right === right.content) return known.drafts
  if (kept.size >= MOST) kept.clear()
  const drafts = [...atJoint(left, right)]
  kept.set(left.content, { right: right.content, drafts })
  return drafts
}

function* atJoint(left: LineItem, right: LineItem): Generator<FlagDraft> {
  const ends: [End, LineItem][] = [
    [endOf(left, 'b'), left],
    [endOf(right, 'a'), right],
  ]
  const said = new Set<string>()
  for (const rule of COVER_RULES) {
    for (const [index, [own, item]] of ends.entries()) {
      const [other, neighbour] = ends[1 - index] ?? [own, item]
      const draft = judged(rule, own, item, other, neighbour)
      if (draft === null || said.has(`${draft.code} ${rule.item}`)) continue
      said.add(`${draft.code} ${rule.item}`)
      yield draft
    }
  }
}

function judged(rule: CoverRule, own: End, item: LineItem, other: End, neighbour: LineItem): FlagDraft | null {
  const { kind } = item.line
  if (kind === null || own.covers === null || !rule.kinds.includes(kind)) return null
  const [name, beside] = [nameOf('lines', item.id, item.line), nameOf('lines', neighbour.id, neighbour.line)]
  const common = { section: 'lines', id: item.id, field: 'covers' } as const
  const neighbourCounts = rule.neighbourCounts(other)
  if (own.covers.has(rule.code(own))) {
    if (!neighbourCounts) return null
    return {
      ...common,
      code: 'counted-twice',
      message: `${name} includes the ${rule.item}, and ${beside} beside it counts it again.`,
      todo: 'Take it out of one of the two: change what the number covers together with the number, or remove the other line.',
    }
  }
  const missed = neighbour.line.kind !== null && rule.missedBeside.includes(neighbour.line.kind)
  if (neighbourCounts || !missed) return null
  return {
    ...common,
    code: 'nobody-counts',
    message: `Nobody counts the ${rule.item} between ${name} and ${beside}.`,
    todo: rule.ifMissed,
  }
}

function endOf({ line }: LineItem, facing: 'a' | 'b'): End {
  return { line, facing, covers: line.covers === null ? null : new Set(line.covers.split(' ').filter(Boolean)) }
}
