import type { AllowanceEvaluation } from '../../lib/budget/evaluation'
import type { Box, Flag, Piece, Point, WasLevel } from './geometry'
import { px } from './path'
import { along, lowestLevel } from './pieces'
import { workWidth } from './text'
import type { Was } from './was'

const SIZE = 12

/** The level before another person's change, from the changed line on, and that person's words beside the pennant. */
export function wasLevelOf(
  was: Was | null,
  pieces: readonly Piece[],
  allowance: AllowanceEvaluation | null,
  room: { readonly scale: number; readonly plot: Box; readonly flags: readonly Flag[]; readonly narrow: boolean },
): WasLevel | null {
  const at = pieces.findIndex((piece) => piece.id === was?.line)
  const changed = pieces[at]
  if (!was || !changed || allowance === null || allowance.marginDb === null) return null
  const lower = (allowance.marginDb - was.marginDb) * room.scale
  const points = [changed.from, ...pieces.slice(at).map(({ to }) => ({ x: to.x, y: to.y + lower }))]
  return {
    points,
    words: was.words.split('\n'),
    wordsAt: room.narrow ? null : wordsAt(was, changed, pieces, room),
    before: new Map(pieces.slice(at).map((piece) => [piece.id, before(piece, piece === changed, lower)])),
  }
}

/** The changed line turns about its beginning, the ones behind it move as they are. */
function before({ from, to }: Piece, changed: boolean, lower: number): string {
  const drop = to.y - from.y
  if (!changed || Math.abs(drop) < 0.5) return `translateY(${px(lower)}px)`
  return `translateY(${px(from.y)}px) scaleY(${((drop + lower) / drop).toFixed(3)}) translateY(${px(-from.y)}px)`
}

function wordsAt(
  was: Was,
  changed: Piece,
  pieces: readonly Piece[],
  room: { readonly plot: Box; readonly flags: readonly Flag[] },
): Point | null {
  const lines = was.words.split('\n')
  const width = Math.max(...lines.map((line) => workWidth(line, SIZE)))
  const flag = room.flags.find((one) => one.line === changed.id)
  const x = flag ? flag.x + 42 : changed.from.x + 8
  const y = flag ? flag.y + 10 : room.plot.y + room.plot.height - 30
  const right = room.plot.x + room.plot.width
  if (x + width > right) return null
  const under = Math.max(lowestLevel(pieces, x, x + width), along(changed.from, changed.to, changed.from.x))
  return y - SIZE > under + 6 ? { x, y } : null
}
