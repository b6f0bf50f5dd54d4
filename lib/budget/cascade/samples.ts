import { TWO_PORT } from '../../channel/networks/network'
import type { LineItem } from '../lineItem'
import type { LineLoss } from '../lineLoss'
import type { Piece } from '../models/piece'
import { TIME, typedValue } from '../quantities'

/** Two-ports kept: of 2,000 frequencies each takes 128 kB. */
const MOST = 256
const kept = new Map<string, { readonly hz: Float64Array; readonly s: Float64Array }>()

/**
 * A line's two-port over the grid, with what its corner multiplies and what skew inside the pair takes; remembered by content.
 * @param content a name of everything that the line's loss rests on
 */
export function samplesOf(
  item: LineItem,
  loss: LineLoss,
  piece: Piece,
  content: string,
  hz: Float64Array,
  reference: number,
): Float64Array {
  // A corner's factor also follows from the frequency that the loss was asked at.
  const name = `${content}|${loss.factor}`
  const known = kept.get(name)
  if (known && known.hz === hz) return known.s
  if (kept.size >= MOST) kept.clear()
  const s = piece.twoPort(hz, reference)
  if (loss.factor !== 1) multiply(s, hz, piece, loss.factor)
  const skew = typedValue(TIME, item.line.skew)
  if (skew) skewed(s, hz, skew)
  kept.set(name, { hz, s })
  return s
}

/** A corner that multiplies the loss in dB takes more from what passes; what is reflected stays. */
function multiply(s: Float64Array, hz: Float64Array, piece: Piece, factor: number): void {
  const attenuation = piece.attenuation?.(hz) ?? null
  for (let i = 0; i < hz.length; i++) {
    const at = TWO_PORT * i
    const own =
      attenuation === null ? -20 * Math.log10(Math.hypot(s[at + 4] as number, s[at + 5] as number)) : attenuation[i]
    through(s, at, 10 ** ((-(factor - 1) * (own as number)) / 20))
  }
}

/** Two halves of a pair that arrive Δt apart add up to cos(π f Δt) of the differential signal. */
function skewed(s: Float64Array, hz: Float64Array, skew: number): void {
  for (let i = 0; i < hz.length; i++) through(s, TWO_PORT * i, Math.cos(Math.PI * (hz[i] as number) * skew))
}

function through(s: Float64Array, at: number, factor: number): void {
  for (let k = at + 2; k < at + 6; k++) s[k] = (s[k] as number) * factor
}

/** Forgets everything: for measuring. */
export function forgetSamples(): void {
  kept.clear()
}
