import { decibels } from '../words/decibels'
import type { Box, Label, Piece, Point } from './geometry'
import { along, highestLevel } from './pieces'
import { levelWidth, overlaps, workWidth } from './text'

export const FIGURE_SIZE = { small: 13, middle: 17, large: 20 } as const
const NAME_HEIGHT = 18
const WAVE_HEIGHT = 10
const LIFTS = [0, 16, 32, 48]

type Sky = {
  readonly plot: Box
  readonly narrow: boolean
  /** How far the tolerance reaches above the level, in px. */
  readonly air: (x: number) => number
  readonly selected: string | null
  readonly taken: readonly Box[]
}

/**
 * Numbers on the sky side of the level: the selected line and the largest losses first and larger. What does not fit is
 * left to the rows below. @returns the labels, and the room that they take
 */
export function labelsOf(pieces: readonly Piece[], sky: Sky): { labels: Label[]; boxes: Box[] } {
  const numbered = pieces.filter((piece) => piece.countedDb !== null)
  const whole = numbered.reduce((sum, piece) => sum + Math.abs(piece.countedDb ?? 0), 0)
  const most = sky.narrow ? 3 : pieces.length > 24 ? 6 : pieces.length
  const byLoss = [...numbered].sort((a, b) => Math.abs(b.countedDb ?? 0) - Math.abs(a.countedDb ?? 0))
  const chosen = byLoss.slice(0, most)
  const picked = numbered.find((piece) => piece.id === sky.selected)
  const queue = picked ? [picked, ...chosen.filter((piece) => piece !== picked)] : chosen

  const labels: Label[] = []
  const boxes: Box[] = [...sky.taken]
  for (const piece of queue) {
    const part = Math.abs(piece.countedDb ?? 0) / (whole || 1)
    const size = part >= 0.25 || piece === picked ? 'large' : part >= 0.1 ? 'middle' : 'small'
    const placed = place(piece, sky.narrow && size === 'large' ? 'middle' : size, pieces, sky, boxes)
    if (!placed) continue
    labels.push(placed.label)
    boxes.push(...placed.room)
  }
  return { labels, boxes: boxes.slice(sky.taken.length) }
}

function place(piece: Piece, size: Label['size'], pieces: readonly Piece[], sky: Sky, taken: readonly Box[]) {
  const figure = decibels(piece.countedDb ?? 0)
  const stretch = piece.to.x - piece.from.x
  const middle = (piece.from.x + piece.to.x) / 2
  const named = !sky.narrow && size !== 'small' && workWidth(piece.name, 14) <= Math.max(stretch * 1.3, 130)
  for (const name of named ? [piece.name, null] : [null]) {
    const width = Math.max(levelWidth(figure, FIGURE_SIZE[size]), name === null ? 0 : workWidth(name, 14))
    const typical = piece.grade === 'typical'
    const height = FIGURE_SIZE[size] + (name === null ? 0 : NAME_HEIGHT) + (typical ? WAVE_HEIGHT : 0)
    for (const lift of LIFTS) {
      for (const aside of [0, width * 0.5, -width * 0.5]) {
        const centre = middle + aside
        const left = centre - width / 2
        const above = highestLevel(pieces, left, left + width)
        const air = Math.max(sky.air(left), sky.air(centre), sky.air(left + width))
        const bottom = above - air - 8 - lift
        const box = { x: left, y: bottom - height, width, height }
        const stem = lift === 0 ? null : leader(piece, centre, bottom)
        const room = stem ? [box, strip(stem)] : [box]
        if (!inSky(box, sky.plot) || room.some((own) => taken.some((other) => overlaps(own, other, 3)))) continue
        const label: Label = {
          id: piece.id,
          x: centre,
          y: bottom - 2,
          figure,
          name,
          size,
          typical,
          leader: stem,
        }
        return { label, room }
      }
    }
  }
  return null
}

function inSky(box: Box, plot: Box): boolean {
  return box.y >= plot.y && box.x >= plot.x + 3 && box.x + box.width <= plot.x + plot.width - 3
}

/** What a leader takes of the sky, so that no later number stands on it. */
function strip([from, to]: readonly [Point, Point]): Box {
  return { x: Math.min(from.x, to.x) - 1, y: from.y, width: Math.abs(to.x - from.x) + 2, height: to.y - from.y }
}

function leader(piece: Piece, x: number, bottom: number): readonly [Point, Point] {
  const foot = Math.min(Math.max(x, piece.from.x), piece.to.x)
  return [
    { x, y: bottom + 2 },
    { x: foot, y: along(piece.from, piece.to, foot) - 5 },
  ]
}
