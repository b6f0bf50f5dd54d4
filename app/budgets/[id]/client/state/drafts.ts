/**
 * What people have typed and not committed, by place. It lies outside the components, so that a cell in edit keeps its text
 * when its row moves, and when the session is made anew after a refusal.
 */
export type Draft = {
  readonly text: string
  /** What the cell showed when the typing began: another person may change it meanwhile. */
  readonly base: string
  /** Why it was not taken, or null while typing goes on. */
  readonly reason: string | null
}

export type Drafts = {
  get(key: string): Draft | null
  /** Null ends the edit. */
  set(key: string, draft: Draft | null): void
  subscribe(key: string, heard: () => void): () => void
  /** Whether a cell of this record ('section/id') is being typed in. */
  within(record: string): boolean
}

export function createDrafts(): Drafts {
  const drafts = new Map<string, Draft>()
  const listeners = new Map<string, Set<() => void>>()
  return {
    get: (key) => drafts.get(key) ?? null,
    set(key, draft) {
      if (draft) drafts.set(key, draft)
      else drafts.delete(key)
      for (const heard of [...(listeners.get(key) ?? [])]) heard()
    },
    subscribe(key, heard) {
      const heards = listeners.get(key) ?? new Set()
      listeners.set(key, heards.add(heard))
      return () => {
        heards.delete(heard)
        if (heards.size === 0) listeners.delete(key)
      }
    },
    within: (record) => [...drafts.keys()].some((key) => key.startsWith(`${record}/`)),
  }
}
