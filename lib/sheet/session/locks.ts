/** Something that only one tab may do at a time. */
export type Locks = {
  /** Calls `granted` once this tab may; it may until the returned function is called or the tab is gone. */
  hold(name: string, granted: () => void): () => void
}

/**
 * The browser's Web Locks. Pages that are not served over https (nor from localhost) have none: there every tab sends,
 * and the server stores an edit that it gets twice once.
 */
export function browserLocks(): Locks {
  if (typeof navigator === 'undefined' || !('locks' in navigator)) return noLocks
  return {
    hold(name, granted) {
      const stop = new AbortController()
      let release = () => stop.abort()
      navigator.locks
        .request(name, { signal: stop.signal }, () => {
          granted()
          return new Promise<void>((resolve) => {
            release = resolve
          })
        })
        .catch((error: unknown) => {
          if (!stop.signal.aborted) throw error
        })
      return () => release()
    },
  }
}

/** Grants everything at once. */
export const noLocks: Locks = {
  hold(_name, granted) {
    granted()
    return () => {}
  },
}
