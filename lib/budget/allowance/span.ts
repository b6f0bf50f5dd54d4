import type { Context } from '../context'
import type { FlagCode } from '../flags'
import type { LineItem } from '../lineItem'
import { livingRecord, nameOf, recordOf } from '../record'
import type { Allowance, PlaneCode } from '../schema'

export type SpanProblem = {
  readonly code: FlagCode
  readonly field: string
  /** A sentence without the allowance's name. */
  readonly reason: string
  readonly todo: string
}

/** What lies between the planes of an allowance. */
export type Span = {
  /** Planes found in the budget in channel order, else null. */
  readonly from: string | null
  readonly to: string | null
  readonly items: readonly LineItem[]
  readonly problems: readonly SpanProblem[]
}

export function spanOf(context: Context, allowance: Allowance): Span {
  const ends = (['from', 'to'] as const).map((end) => missingPlane(context, allowance, end))
  const missing = ends.filter((problem) => problem !== null)
  if (missing.length > 0) return { from: null, to: null, items: [], problems: missing }
  const [start, end] = [placeOf(context, allowance.from), placeOf(context, allowance.to)]
  if (end.row <= start.row) return { from: null, to: null, items: [], problems: [reversed(end.row === start.row)] }
  const items = context.items.slice(start.linesBefore, end.linesBefore)
  const differing = [
    differs(context, allowance.from, allowance.publishedFrom, 'from'),
    differs(context, allowance.to, allowance.publishedTo, 'to'),
  ].filter((problem) => problem !== null)
  return { from: allowance.from, to: allowance.to, items, problems: differing }
}

/** Where a plane stands among the rows, and how many lines come before it. */
function placeOf({ rows }: Context, plane: string | null): { readonly row: number; readonly linesBefore: number } {
  let linesBefore = 0
  for (const [row, one] of rows.entries()) {
    if ('plane' in one && one.plane === plane) return { row, linesBefore }
    if ('line' in one) linesBefore++
  }
  return { row: -1, linesBefore }
}

function missingPlane({ budget }: Context, allowance: Allowance, end: 'from' | 'to'): SpanProblem | null {
  const id = allowance[end]
  if (livingRecord(budget, 'planes', id)) return null
  const which = end === 'from' ? 'starts' : 'ends'
  const gone = recordOf(budget, 'planes', id)
  const how = gone
    ? `the plane ${nameOf('planes', id, gone)} that it ${which} at was taken out`
    : id === null
      ? `no plane is named that it ${which} at`
      : `the plane that it ${which} at does not exist`
  return { code: 'plane-missing', field: end, reason: how, todo: 'Choose a plane of this link.' }
}

function reversed(same: boolean): SpanProblem {
  return {
    code: 'planes-reversed',
    field: 'to',
    reason: same
      ? 'it starts and ends at the same plane'
      : 'the plane that it ends at comes before the plane that it starts at',
    todo: 'Exchange the two planes, or move them in the channel.',
  }
}

function differs(
  { budget }: Context,
  id: string | null,
  published: PlaneCode | null,
  end: 'from' | 'to',
): SpanProblem | null {
  const plane = livingRecord(budget, 'planes', id)
  if (published === null || plane === null || plane.code === published) return null
  const which = end === 'from' ? 'starts' : 'ends'
  const here = plane.code === null ? 'does not say which plane it is' : `is ${plane.code}`
  return {
    code: 'planes-differ',
    field: end,
    reason: `the limit was published with ${published} where it ${which}, and ${nameOf('planes', id, plane)} ${here}`,
    todo: 'Choose the plane that the limit was published for, or a limit for this plane; limits between different planes are not compared.',
  }
}
