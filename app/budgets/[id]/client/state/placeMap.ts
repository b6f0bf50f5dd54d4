/**
 * Something known of places, such as who stands there. A slip listens to its own place only: of two thousand cells on the
 * page, the two that an edit concerns are drawn again.
 */
export type PlaceMap<T> = {
  get(place: string): T | undefined
  /** Takes over a new state and tells the places where it differs. */
  replace(next: ReadonlyMap<string, T>): void
  subscribe(place: string, heard: () => void): () => void
}

export function createPlaceMap<T>(): PlaceMap<T> {
  let known: ReadonlyMap<string, T> = new Map()
  const listeners = new Map<string, Set<() => void>>()
  return {
    get: (place) => known.get(place),
    replace(next) {
      const before = known
      known = next
      for (const place of new Set([...before.keys(), ...next.keys()])) {
        if (before.get(place) === next.get(place)) continue
        for (const heard of [...(listeners.get(place) ?? [])]) heard()
      }
    },
    subscribe(place, heard) {
      const heards = listeners.get(place) ?? new Set()
      listeners.set(place, heards.add(heard))
      return () => {
        heards.delete(heard)
        if (heards.size === 0) listeners.delete(place)
      }
    },
  }
}
