/** A value that is replaced, never changed in place, with listeners: what React's useSyncExternalStore asks for. */
export type Store<T> = {
  get(): T
  /** Replaces the fields given, if any of them differs. */
  patch(part: Partial<T>): void
  subscribe(listener: () => void): () => void
}

export function createStore<T extends object>(first: T): Store<T> {
  let value = first
  const listeners = new Set<() => void>()
  return {
    get: () => value,
    patch(part) {
      const next = { ...value, ...part }
      if ((Object.keys(part) as (keyof T)[]).every((key) => Object.is(value[key], next[key]))) return
      value = next
      for (const listener of [...listeners]) listener()
    },
    subscribe(listener) {
      listeners.add(listener)
      return () => listeners.delete(listener)
    },
  }
}
