export type Moved = {
  /** dB at the new frequency. */
  readonly db: number
  /** dB that each of the two laws lies away from it; 0 where the number was not moved or only a little. */
  readonly spreadDb: number
  readonly by: 'stated' | 'moved'
}

const HOLDS = 0.02
const EDGE = 1e-9

/** A stated number holds within ±2 % of its frequency. */
export function holdsAt(statedHz: number, hz: number): boolean {
  return Math.abs(hz / statedHz - 1) <= HOLDS + EDGE
}

/**
 * Attenuation of a uniform line at another frequency. Conductor loss grows with √f, dielectric loss with f, and every
 * uniform line lies between the two; the mean of both is taken. Their half difference is the spread: it is left out for a
 * ratio of 0.9 to 1.1 (under 0.03 of the loss), given for 0.67 to 1.5, and no number is moved further.
 * @param db loss at statedHz
 * @returns null where the ratio is too far
 */
export function moveUniformLoss(db: number, statedHz: number, hz: number): Moved | null {
  if (holdsAt(statedHz, hz)) return { db, spreadDb: 0, by: 'stated' }
  const ratio = hz / statedHz
  if (ratio < 0.67 - EDGE || ratio > 1.5 + EDGE) return null
  const rootLaw = db * Math.sqrt(ratio)
  const linearLaw = db * ratio
  const little = ratio >= 0.9 - EDGE && ratio <= 1.1 + EDGE
  return { db: (rootLaw + linearLaw) / 2, spreadDb: little ? 0 : Math.abs(linearLaw - rootLaw) / 2, by: 'moved' }
}

/** A discrete never moves: its loss may have any shape over frequency. */
export function discreteLoss(db: number, statedHz: number, hz: number): Moved | null {
  return holdsAt(statedHz, hz) ? { db, spreadDb: 0, by: 'stated' } : null
}
