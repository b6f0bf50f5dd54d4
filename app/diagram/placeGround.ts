import type { Budget } from '../../lib/budget/schema'
import { texturesOf } from '../marks/texture'
import { decibels } from '../words/decibels'
import type { Glyph, Piece, Run } from './geometry'
import { workWidth } from './text'

const NAME_SIZE = 13
/** Under this depth of ground there is no room for names below the glyphs, px. */
const DEEP = 48

/** The assemblies under the signal: neighbouring lines of one assembly are one stretch of ground. */
export function runsOf(pieces: readonly Piece[], budget: Budget, surfaceY: number, bottom: number): Run[] {
  const textures = texturesOf(
    budget.assemblies,
    pieces.map((piece) => piece.assembly),
  )
  const stretches: Piece[][] = []
  for (const piece of pieces) {
    const last = stretches[stretches.length - 1]
    if (last && last[0]?.assembly === piece.assembly) last.push(piece)
    else stretches.push([piece])
  }
  const deep = bottom - surfaceY >= DEEP
  return stretches.map((stretch) => {
    const assembly = stretch[0]?.assembly ?? null
    const x = stretch[0]?.from.x ?? 0
    const width = (stretch[stretch.length - 1]?.to.x ?? x) - x
    const name = (assembly !== null && budget.assemblies[assembly]?.name) || 'no assembly'
    const knownDb = stretch.reduce((sum, piece) => sum + (piece.countedDb ?? 0), 0)
    const unknown = stretch.some((piece) => piece.countedDb === null)
    return {
      assembly,
      name,
      texture: (assembly !== null && textures.get(assembly)) || 'plain',
      x,
      y: surfaceY,
      width,
      height: bottom - surfaceY,
      knownDb,
      label: deep ? runLabel(name, `${decibels(knownDb)} dB${unknown ? ' known' : ''}`, width) : null,
    }
  })
}

function runLabel(name: string, figure: string, width: number): string | null {
  const fits = (text: string) => workWidth(text, NAME_SIZE) <= width - 16
  return [`${name} ${figure}`, name].find(fits) ?? null
}

/** Whose line it is, and its number, along the surface; crowded lines lose the number first, then the glyph. */
export function glyphsOf(pieces: readonly Piece[], y: number, room: { left: number; right: number }): Glyph[] {
  const glyphs: Glyph[] = []
  let free = room.left
  for (const piece of pieces) {
    const middle = (piece.from.x + piece.to.x) / 2
    const width = piece.to.x - piece.from.x
    const digits = workWidth(String(piece.number), NAME_SIZE)
    const withNumber = 22 + digits
    const fits = middle - withNumber / 2 >= free - 2 && middle + withNumber / 2 <= room.right
    if (fits && width >= withNumber - 3) {
      glyphs.push({ id: piece.id, x: middle - (digits + 3) / 2, y, number: piece.number, owner: piece.owner })
      free = middle + withNumber / 2
    } else if (middle - 8 >= free) {
      glyphs.push({ id: piece.id, x: middle, y, number: null, owner: piece.owner })
      free = middle + 8
    }
  }
  return glyphs
}
