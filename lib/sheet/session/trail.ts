import type { TrailEntry } from '../wire'

/** What a screen scrolls through at once; older entries come by HTTP. */
const KEPT_ENTRIES = 500

/** Puts new entries on top; an entry that is there already (sent again after a reconnect) is not doubled. */
export function addToTrail(trail: readonly TrailEntry[], entries: readonly TrailEntry[]): readonly TrailEntry[] {
  const known = new Set(trail.map((entry) => entry.seq))
  const fresh = entries.filter((entry) => !known.has(entry.seq))
  if (fresh.length === 0) return trail
  return [...fresh, ...trail].sort((a, b) => b.seq - a.seq).slice(0, KEPT_ENTRIES)
}
