import type { Present } from '../../lib/sheet/wire'
import type { Box, Flag, Piece } from './geometry'
import { along, highestLevel } from './pieces'
import { overlaps } from './text'

const WIDTH = 34
const HEIGHT = 20

/** The other people, each as a pennant on a staff at the line where he or she is; under the level where there is air. */
export function flagsOf(present: readonly Present[], pieces: readonly Piece[], plot: Box, surfaceY: number): Flag[] {
  const taken: Box[] = []
  return present.flatMap((person) => {
    const piece = pieces.find((one) => person.cell?.section === 'lines' && one.id === person.cell.id)
    if (!piece || person.me) return []
    const right = plot.x + plot.width - WIDTH
    const wanted = piece.from.x + (piece.to.x - piece.from.x) * (piece.to.x - piece.from.x > 80 ? 0.28 : 0.5)
    let x = Math.min(wanted, right)
    const foot = () => along(piece.from, piece.to, Math.min(Math.max(x, piece.from.x), piece.to.x))
    const below = surfaceY - 16 - HEIGHT
    const above = () => Math.max(plot.y, highestLevel(pieces, x, x + WIDTH) - 70)
    let y = below > foot() + 14 ? below : above()
    while (taken.some((other) => overlaps({ x, y, width: WIDTH, height: HEIGHT }, other, 2)) && y > plot.y) {
      y -= HEIGHT + 4
      if (y < foot() + 14 && y + HEIGHT > foot() - 14) {
        x = Math.min(x + WIDTH / 2, right)
        y = above()
        break
      }
    }
    taken.push({ x, y, width: WIDTH, height: HEIGHT })
    const level = foot()
    const staff =
      y > level
        ? ([
            { x, y: level },
            { x, y: y + HEIGHT },
          ] as const)
        : ([
            { x, y },
            { x, y: level },
          ] as const)
    return [{ person, line: piece.id, x, y, staff }]
  })
}
