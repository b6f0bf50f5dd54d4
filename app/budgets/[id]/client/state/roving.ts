/**
 * Which cell of the rows the Tab key reaches: one at a time, named by record and field and not by its position, so that
 * nobody's cell changes when another person adds or moves a row.
 */
export type Roving = {
  get(): string | null
  set(key: string | null): void
  subscribe(heard: () => void): () => void
}

export function createRoving(): Roving {
  let current: string | null = null
  const listeners = new Set<() => void>()
  return {
    get: () => current,
    set(key) {
      if (key === current) return
      current = key
      for (const heard of [...listeners]) heard()
    },
    subscribe(heard) {
      listeners.add(heard)
      return () => listeners.delete(heard)
    },
  }
}
