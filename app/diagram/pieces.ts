import type { Piece, Point } from './geometry'
import type { SpanLine } from './span'
import type { Vertical } from './vertical'
import { shareWidth } from './widths'

export type Horizontal = { readonly left: number; readonly right: number; readonly stub: number }

/** Where each line begins and ends across the page: inside between the staffs, outside in the stubs beside them. */
export function horizontalEdges(lines: readonly SpanLine[], room: Horizontal): [number, number][] {
  const count = (place: SpanLine['place']) => lines.filter((line) => line.place === place).length
  const stubWidth = { before: room.stub / Math.max(count('before'), 1), after: room.stub / Math.max(count('after'), 1) }
  const inside = lines.filter((line) => line.place === 'inside')
  const widths = shareWidth(
    inside.map((line) => line.lengthM),
    room.right - room.left,
  )
  const next = { before: room.left - room.stub, inside: room.left, after: room.right }
  let at = 0
  return lines.map((line) => {
    const width = line.place === 'inside' ? (widths[at++] ?? 0) : stubWidth[line.place]
    const from = next[line.place]
    next[line.place] = from + width
    return [from, from + width]
  })
}

/** Losses of the lines before each line, counted from the first plane; lines before that plane lie above 0. */
export function cumulate(lines: readonly SpanLine[]): [number, number][] {
  const before = lines.filter((line) => line.place === 'before')
  let db = -before.reduce((sum, line) => sum + (line.countedDb ?? 0), 0)
  return lines.map((line) => {
    const from = db
    db += line.countedDb ?? 0
    return [from, db]
  })
}

export function piecesOf(lines: readonly SpanLine[], edges: readonly [number, number][], vertical: Vertical): Piece[] {
  const levels = cumulate(lines)
  return lines.map((line, at) => {
    const [x0, x1] = edges[at] ?? [0, 0]
    const [fromDb, toDb] = levels[at] ?? [0, 0]
    return {
      id: line.id,
      number: line.number,
      name: line.name,
      place: line.place,
      countedDb: line.countedDb,
      from: { x: x0, y: vertical.y(fromDb) },
      to: { x: x1, y: vertical.y(toDb) },
      fromDb,
      toDb,
      basis: line.basis,
      grade: line.grade,
      owner: line.owner,
      overlap: line.overlap,
      assembly: line.assembly,
    }
  })
}

/** Height of the level at x: the highest (smallest y) over a stretch, for whatever wants to stand above it. */
export function highestLevel(pieces: readonly Piece[], x0: number, x1: number): number {
  let highest = Number.POSITIVE_INFINITY
  for (const { from, to } of pieces) {
    const left = Math.max(x0, from.x)
    const right = Math.min(x1, to.x)
    if (left > right) continue
    highest = Math.min(highest, along(from, to, left), along(from, to, right))
  }
  return highest
}

/** The lowest (largest y) over a stretch, for whatever hangs below the level. */
export function lowestLevel(pieces: readonly Piece[], x0: number, x1: number): number {
  let lowest = Number.NEGATIVE_INFINITY
  for (const { from, to } of pieces) {
    const left = Math.max(x0, from.x)
    const right = Math.min(x1, to.x)
    if (left > right) continue
    lowest = Math.max(lowest, along(from, to, left), along(from, to, right))
  }
  return lowest
}

export function along(from: Point, to: Point, x: number): number {
  if (to.x === from.x) return to.y
  return from.y + ((to.y - from.y) * (x - from.x)) / (to.x - from.x)
}
