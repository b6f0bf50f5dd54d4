import { isQuantity, parseQuantity, withUnit } from '../units'
import { parseTerms } from './parseTerms'
import { type LimitCurve, type LimitPiece, pieceAt, shownHz } from './piece'

const EXAMPLE = '0.05..6 GHz: 0.8 + 5.49 sqrt(f) + 1.16 f'
const PIECE = /^(.*?)(?:\.{2,3}|…|–|\bto\b)([^:]*):(.*)$/

/**
 * Reads a limit curve as typed: '0.05..6 GHz: 0.8 + 5.49 sqrt(f) + 1.16 f', f in GHz and the result in dB, one piece from
 * the next by a semicolon or a new line, in any order. Terms: a constant, sqrt(f), f, f^2, f^3 and / sqrt(f), each once.
 * @returns the curve by rising frequency, or a sentence that says which piece is wrong and what to do
 */
export function parseCurve(text: string): LimitCurve | { readonly reason: string } {
  const typed = text.split(/[;\n\r]+/).flatMap((piece) => (piece.trim() === '' ? [] : [piece.trim()]))
  const pieces: LimitPiece[] = []
  for (const [index, one] of typed.entries()) {
    const piece = parsePiece(one)
    const problem = typeof piece === 'string' ? piece : overlap(pieces, piece)
    if (problem !== null) return { reason: `Piece ${index + 1} ('${one}'): ${problem}` }
    if (typeof piece !== 'string') pieces.push(piece)
  }
  pieces.sort((a, b) => a.fromHz - b.fromHz)
  const [first, last] = [pieces[0], pieces.at(-1)]
  if (!first || !last) return { reason: `Type at least one piece, such as '${EXAMPLE}'.` }
  return { pieces, from: first.fromHz, to: last.toHz }
}

function parsePiece(text: string): LimitPiece | string {
  const [, low, high, formula] = PIECE.exec(text) ?? []
  if (low === undefined || high === undefined || formula === undefined) {
    return `type the range, a colon and the limit, such as '${EXAMPLE}'.`
  }
  const to = parseQuantity(high, 'frequency')
  if (!isQuantity(to)) return to.reason
  const from = parseQuantity(withUnit(low, 'frequency', to.unit), 'frequency')
  if (!isQuantity(from)) return from.reason
  if (from.value <= 0) return 'the lowest frequency must be above zero.'
  if (from.value >= to.value) return 'the range must rise: the lower frequency first.'
  const terms = parseTerms(formula)
  if (typeof terms === 'string') return terms
  const piece = { fromHz: from.value, toHz: to.value, ...terms }
  return belowZero(piece) ?? piece
}

/** A loss is positive: a limit below zero at an end is a slip of sign or of unit. */
function belowZero(piece: LimitPiece): string | null {
  for (const hz of [piece.fromHz, piece.toHz]) {
    const limit = pieceAt(piece, hz)
    if (limit < 0) {
      return `gives ${Number(limit.toPrecision(4))} dB at ${shownHz(hz)}; a loss limit is positive, and f is in GHz.`
    }
  }
  return null
}

function overlap(before: readonly LimitPiece[], piece: LimitPiece): string | null {
  const other = before.find(({ fromHz, toHz }) => fromHz < piece.toHz && piece.fromHz < toHz)
  if (!other) return null
  return `overlaps the piece from ${shownHz(other.fromHz)} to ${shownHz(other.toHz)}; two pieces may only meet.`
}
