import type { ShareUse } from '../../lib/budget/evaluation'
import { decibels, plainDecibels } from '../words/decibels'
import type { Box, Piece, Point, Shelf } from './geometry'
import { lowestLevel } from './pieces'
import { overlaps, workWidth } from './text'
import type { Vertical } from './vertical'

/**
 * Shares as shelves, counted from where the signal enters, so that one overrun is not charged to the next owner. A share
 * of a discipline, or of an assembly that the signal meets twice, has no one stretch to stand under and is left to the rows.
 */
export function shelvesOf(
  shares: readonly ShareUse[],
  pieces: readonly Piece[],
  vertical: Vertical,
  narrow: boolean,
): Shelf[] {
  const taken: Box[] = []
  return shares.flatMap((share) => {
    const stretch = stretchOf(share, pieces)
    const first = stretch[0]
    const last = stretch[stretch.length - 1]
    if (!first || !last) return []
    const y = vertical.y(first.fromDb + share.shareDb)
    const words = shareWords(share)
    const wordsAt = narrow ? null : roomFor(words, { x: first.from.x + 5, y: y + 4 }, pieces, vertical.surfaceY, taken)
    const excess = -share.freeDb
    return [
      {
        id: share.id,
        from: { x: first.from.x, y },
        to: { x: last.to.x, y },
        words,
        wordsAt,
        post:
          excess > 0.005
            ? ([
                { x: last.to.x - 2, y },
                { x: last.to.x - 2, y: vertical.y(first.fromDb + share.usedDb) },
              ] as const)
            : null,
      },
    ]
  })
}

function stretchOf(share: ShareUse, pieces: readonly Piece[]): readonly Piece[] {
  const { kind, ref } = share.of
  if (kind === 'discipline') return []
  const at = pieces.flatMap((piece, index) => ((kind === 'line' ? piece.id : piece.assembly) === ref ? [index] : []))
  const [first, last] = [at[0], at[at.length - 1]]
  if (first === undefined || last === undefined || last - first + 1 !== at.length) return []
  return pieces.slice(first, last + 1)
}

function shareWords(share: ShareUse): readonly [string, string] {
  const given = `share ${plainDecibels(share.shareDb)}`
  const left = share.freeDb
  if (left < -0.005) return [given, `${decibels(share.usedDb)} used, ${decibels(-left)} past it`]
  if (share.undecidedLines.length > 0) return [given, `${decibels(share.usedDb)} used so far, ${decibels(left)} left`]
  return [given, left < 0.005 ? 'all used' : `${decibels(left)} left`]
}

/** Under the shelf, where neither the level nor the surface nor another share's words are in the way. */
function roomFor(
  words: readonly [string, string],
  at: Point,
  pieces: readonly Piece[],
  surfaceY: number,
  taken: Box[],
) {
  const width = Math.max(...words.map((word) => workWidth(word, 12)))
  const box = { x: at.x, y: at.y, width, height: 30 }
  const under = lowestLevel(pieces, box.x, box.x + width)
  if (box.y < under + 4 || box.y + box.height > surfaceY - 4 || taken.some((other) => overlaps(box, other, 4)))
    return null
  taken.push(box)
  return { x: at.x, y: at.y + 11 }
}
