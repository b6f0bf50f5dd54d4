import { formatQuantity } from '../units'

/** One piece of a limit curve. The terms are in dB with f in GHz, as standards print them; the ends are in Hz. */
export type LimitPiece = { readonly fromHz: number; readonly toHz: number } & Readonly<Record<Term, number>>

/** Limit over frequency, by rising frequency; between two pieces there may be a gap, in which there is no limit. */
export type LimitCurve = {
  readonly pieces: readonly LimitPiece[]
  /** Lowest and highest frequency of the curve in Hz. */
  readonly from: number
  readonly to: number
}

/** The terms in the order in which they are written, with what stands behind the coefficient. */
export const TERMS = {
  constant: '',
  root: ' sqrt(f)',
  linear: ' f',
  square: ' f^2',
  cube: ' f^3',
  inverseRoot: ' / sqrt(f)',
} as const
export type Term = keyof typeof TERMS

/** Value of one piece in dB, whether or not hz lies within it. @param hz above 0 */
export function pieceAt(piece: LimitPiece, hz: number): number {
  const f = hz / 1e9
  const root = Math.sqrt(f)
  // A term that is not there must not make 0 × ∞ at the lowest frequency.
  const inverse = piece.inverseRoot === 0 ? 0 : piece.inverseRoot / root
  const { constant, linear, square, cube } = piece
  return constant + piece.root * root + f * (linear + f * (square + f * cube)) + inverse
}

/** A frequency as a reason shows it: '12.8906 GHz'. @param hz in Hz */
export function shownHz(hz: number): string {
  return formatQuantity(hz, 'frequency', 'GHz', 6)
}
