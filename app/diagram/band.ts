import type { SpanLine } from './span'

export type BandAt = { readonly up: number; readonly down: number }

/**
 * The grouped tolerance after each line: linear inside a correlation group, root of the squares between groups. The last
 * one is the evaluation's own figure and the others are scaled with it, because only the evaluation knows what ± means.
 * @param endDb three standard deviations of the whole sum, or null where the evaluation gives none
 * @returns dB less and dB more than the level, at the start and after each line
 */
export function groupedBand(lines: readonly SpanLine[], endDb: number | null): BandAt[] {
  const up = new Map<string, number>()
  const down = new Map<string, number>()
  const raw: BandAt[] = [{ up: 0, down: 0 }]
  for (const line of lines) {
    const counted = line.countedDb
    const edges = [line.lowDb, line.highDb].filter((edge): edge is number => edge !== null)
    if (counted !== null && edges.length > 0) {
      add(up, line.group, Math.max(0, counted - Math.min(...edges)))
      add(down, line.group, Math.max(0, Math.max(...edges) - counted))
    }
    raw.push({ up: rootOfSquares(up), down: rootOfSquares(down) })
  }
  const last = raw[raw.length - 1] ?? { up: 0, down: 0 }
  const widest = Math.max(last.up, last.down)
  const factor = endDb === null || widest === 0 ? 1 : endDb / widest
  return raw.map((at) => ({ up: at.up * factor, down: at.down * factor }))
}

function add(sums: Map<string, number>, group: string, db: number): void {
  sums.set(group, (sums.get(group) ?? 0) + db)
}

function rootOfSquares(sums: ReadonlyMap<string, number>): number {
  return Math.hypot(...sums.values())
}
