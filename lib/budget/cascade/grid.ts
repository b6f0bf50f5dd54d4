import type { Piece } from '../models/piece'

/** Hz: the fitted loss begins here (physics: the usual start of a fitting band, IEEE 802.3 clauses 85 and 92). */
const LOWEST = 0.05e9

/** A band that ends a hair before what is asked for still reaches it. */
const EDGE = 1e-6

/** Whether a sweep says something about all of a range; nobody is asked for less than 0.05 GHz, where it begins. */
export function reaches(hz: Float64Array, from: number, to: number): boolean {
  const first = hz[0] ?? Number.POSITIVE_INFINITY
  const last = hz[hz.length - 1] ?? 0
  return first <= Math.max(from, LOWEST) * (1 + EDGE) && last >= to * (1 - EDGE)
}

/** The band that all pieces of a cascade hold over. */
export type Band = { readonly from: number; readonly to: number }

/**
 * From 0.05 GHz to the symbol rate, or less where the data of a piece begin later or end earlier.
 * @param wanted Hz that a limit curve reaches to beyond the symbol rate; 0 without
 * @returns null where nothing is left
 */
export function bandOf(pieces: readonly Piece[], symbolRate: number | null, wanted: number): Band | null {
  if (symbolRate === null) return null
  let from = LOWEST
  let to = Math.max(symbolRate, wanted)
  for (const piece of pieces) {
    from = Math.max(from, piece.from)
    to = Math.min(to, piece.to)
  }
  return to > from ? { from, to } : null
}

const grids = new Map<string, Float64Array>()
const KEPT = 16

/** Equally spaced frequencies over the band; the same array for the same band, so that what was computed on it is found again. */
export function gridOf({ from, to }: Band, points: number): Float64Array {
  const key = `${from}|${to}|${points}`
  const known = grids.get(key)
  if (known) return known
  if (grids.size >= KEPT) grids.clear()
  const hz = new Float64Array(points)
  for (let k = 0; k < points; k++) hz[k] = k === points - 1 ? to : from + ((to - from) * k) / (points - 1)
  grids.set(key, hz)
  return hz
}
