import { type LimitCurve, pieceAt } from './piece'

/** What arithmetic alone may move a frequency past the end of a piece, relative. */
const EDGE = 1e-9

/**
 * Limit at a frequency, dB. Where two pieces meet, both hold there and the stricter counts.
 * @param hz in Hz
 * @returns null outside every piece: a curve is not continued
 */
export function limitAt(curve: LimitCurve, hz: number): number | null {
  let strictest: number | null = null
  for (const piece of curve.pieces) {
    if (hz < piece.fromHz * (1 - EDGE) || hz > piece.toHz * (1 + EDGE)) continue
    const limit = pieceAt(piece, hz)
    if (strictest === null || limit < strictest) strictest = limit
  }
  return strictest
}
