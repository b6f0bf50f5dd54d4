import type { Box } from './geometry'

/**
 * Widths of text in em, rounded up from the two families' advance widths: a drawing is laid out before any browser has set
 * its words, on the server as well.
 */
const WORK_EM = 0.49
const LEVEL_EM = 0.61

/** @param size px */
export const workWidth = (text: string, size: number): number => text.length * WORK_EM * size
export const levelWidth = (text: string, size: number): number => text.length * LEVEL_EM * size

export function overlaps(a: Box, b: Box, air = 0): boolean {
  return (
    a.x < b.x + b.width + air && b.x < a.x + a.width + air && a.y < b.y + b.height + air && b.y < a.y + a.height + air
  )
}
