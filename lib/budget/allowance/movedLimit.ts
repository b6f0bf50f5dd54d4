import { type LimitCurve, limitAt } from '../../channel/limits'
import { holdsAt } from '../../channel/lines'
import { formatScaled } from '../../channel/units'

/** A limit at the frequency that it is used at, or why there is none, as a half sentence. */
export type MovedLimit = { readonly limitDb: number; readonly by: 'stated' | 'curve' } | { readonly reason: string }

/**
 * Moves a limit to another frequency along its own curve, never otherwise:
 * limit(usedAt) = curve(usedAt) + (limit − curve(at)).
 * The published point and the published curve may lie some 0.1 dB apart; the distance is kept, so that a limit that is not
 * moved stays what it is. Where two pieces of the curve meet, the stricter value is taken at both frequencies. Without a
 * curve a stated limit holds within ±2 % of its frequency, as every stated number does. (Common practice, no source.)
 * @param limitDb limit in dB at atHz
 * @param curve null where the allowance has none
 */
export function movedLimit(limitDb: number, atHz: number, curve: LimitCurve | null, usedAtHz: number): MovedLimit {
  if (usedAtHz === atHz) return { limitDb, by: 'stated' }
  if (curve === null) {
    if (holdsAt(atHz, usedAtHz)) return { limitDb, by: 'stated' }
    return { reason: `it is used at ${shown(usedAtHz)} and has no limit curve to be moved along from ${shown(atHz)}` }
  }
  const stated = limitAt(curve, atHz)
  if (stated === null) return { reason: outside(curve, atHz, 'stated') }
  const used = limitAt(curve, usedAtHz)
  if (used === null) return { reason: outside(curve, usedAtHz, 'used') }
  const moved = used + (limitDb - stated)
  if (moved < 0) return { reason: `moved along its curve to ${shown(usedAtHz)} its limit is below 0 dB` }
  return { limitDb: moved, by: 'curve' }
}

function outside({ from, to }: LimitCurve, hz: number, how: 'stated' | 'used'): string {
  const within = hz > from && hz < to ? 'has a gap there' : `runs from ${shown(from)} to ${shown(to)}`
  return `it is ${how} at ${shown(hz)} and its limit curve ${within}, so it cannot be moved`
}

const shown = (hz: number) => formatScaled(hz, 'frequency')
