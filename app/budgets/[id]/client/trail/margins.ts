import type { TrailEntry } from '../../../../../lib/sheet/wire'

/** One step of the margin: what it was after an entry. */
export type Step = {
  readonly seq: number
  readonly time: number
  readonly personName: string
  /** dB; null where it was undecided: the line is broken there. */
  readonly marginDb: number | null
  readonly verdict: string
}

/**
 * The margin of an allowance over the trail, oldest first. Entries without an effect on it leave it as it was and make no
 * step. @param entries newest first
 */
export function marginSteps(entries: readonly TrailEntry[], allowance: string): readonly Step[] {
  return [...entries].reverse().flatMap((entry) => {
    const after = entry.effects.find((effect) => effect.allowance === allowance)?.after
    if (!after) return []
    const { seq, time, personName } = entry
    return [{ seq, time, personName, marginDb: after.marginDb, verdict: after.verdict }]
  })
}

/** Against 0.3 / 0.1 < 3. */
const ROUNDING = 1e-9

/** At most five round numbers between two others, for an axis in dB. */
export function roundTicks(low: number, high: number): readonly number[] {
  const step = [0.1, 0.2, 0.5, 1, 2, 5, 10, 20, 50].find((each) => (high - low) / each <= 5) ?? 100
  const first = Math.ceil(low / step - ROUNDING)
  const count = Math.floor(high / step + ROUNDING) - first + 1
  return Array.from({ length: Math.max(count, 0) }, (_, index) => Number(((first + index) * step).toFixed(1)))
}
