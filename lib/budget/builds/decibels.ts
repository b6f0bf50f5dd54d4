import type { Piece } from '../models/piece'

/**
 * What a piece counts at one frequency, in dB: a uniform line its attenuation in its own impedance, a discrete −20 log10|S21|
 * in the reference. NaN where the model gives no number.
 * @param reference Ω, differential
 */
export function decibelsOf(piece: Piece, hz: number, reference: number): number {
  const at = Float64Array.of(hz)
  if (piece.attenuation !== null) return piece.attenuation(at)[0] ?? Number.NaN
  const s = piece.twoPort(at, reference)
  return -20 * Math.log10(Math.hypot(s[4] ?? Number.NaN, s[5] ?? Number.NaN))
}
