import { DELAY_PER_LENGTH, LENGTH, NUMBER, typedValue } from './quantities'
import type { Line } from './schema'

const LIGHT = 299_792_458

/** Slowest in common use where neither delay nor Dk is typed: FR-4 and solid PTFE with its shield (no source). */
const SLOWEST_DK: Readonly<Partial<Record<NonNullable<Line['kind']>, number>>> = { trace: 4.7, cable: 2.3, package: 4 }

/**
 * Delay of the length that a line declares: by its delay per length, by its Dk, else at the slowest that its kind has.
 * @returns s, or null where no length is typed or the kind has none
 */
export function declaredDelay(line: Line): number | null {
  const length = typedValue(LENGTH, line.length)
  if (length === null || length === 0) return null
  const delay = typedValue(DELAY_PER_LENGTH, line.delay)
  if (delay !== null) return delay * length
  const dk = typedValue(NUMBER, line.dk) ?? (line.kind === null ? undefined : SLOWEST_DK[line.kind])
  return dk === undefined ? null : (length * Math.sqrt(dk)) / LIGHT
}
