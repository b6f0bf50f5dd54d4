import type { Evaluation } from '../../lib/budget/evaluation'
import type { Budget } from '../../lib/budget/schema'
import { decibels } from '../words/decibels'
import { headline, judgedWords } from '../words/judged'
import { BASIS_WORD, planeWords } from '../words/terms'
import type { LevelGeometry, Piece } from './geometry'

/** The picture in words, for who cannot see it; the rows of the worksheet hold the same numbers one by one. */
export function describeLevels(
  geometry: LevelGeometry,
  evaluation: Evaluation,
  budget: Budget,
  allowanceId: string,
): string {
  const allowance = evaluation.allowances.find((one) => one.id === allowanceId)
  const lines = geometry.pieces.filter((piece) => piece.place === 'inside')
  const largest = lines.reduce<Piece | null>(
    (most, piece) => (piece.countedDb !== null && piece.countedDb > (most?.countedDb ?? 0) ? piece : most),
    null,
  )
  const largestWords = largest ? ` The largest is ${pieceWords(largest)}.` : ''
  if (!allowance) return `${lines.length} lines and no allowance to hold them against.${largestWords}`
  const name = (id: string | null) => {
    const plane = id === null ? undefined : budget.planes[id]
    return plane ? planeWords(plane) : 'a plane that is missing'
  }
  const { sentence } = headline(allowance)
  return (
    `The level from ${name(allowance.from)} to ${name(allowance.to)} over ${lines.length} lines: ` +
    `${allowance.words} (${judgedWords(allowance, budget)}). ${sentence}.${largestWords}`
  )
}

/** One line in words: '6 Backplane stripline L14, 9.20 dB, estimate'. */
export function pieceWords(piece: Piece): string {
  const value =
    piece.countedDb === null
      ? 'no number yet'
      : piece.countedDb < 0
        ? `${decibels(-piece.countedDb)} dB taken off as overlap`
        : `${decibels(piece.countedDb)} dB`
  const grade = piece.grade === 'nominal' ? '' : `, ${piece.grade}`
  const outside = piece.place === 'inside' ? '' : ', outside the allowance'
  return `${piece.number} ${piece.name}, ${value}, ${BASIS_WORD[piece.basis ?? 'unsaid']}${grade}${outside}`
}
