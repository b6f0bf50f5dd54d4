import { FIRST_META } from './record'
import { type Batch, type BrowserStorage, reduce, type Stored } from './storage'

/** A storage that lasts as long as this object: for a browser that keeps nothing, and for tests. Each handle is a tab. */
export function createMemory(): { open(): BrowserStorage } {
  let stored: Stored = { meta: FIRST_META, records: [], refused: [] }
  let cache: { key: number; update: Uint8Array }[] = []
  let nextKey = 1
  const tabs = new Set<{ listeners: Set<() => void> }>()

  function keep(batch: Batch): boolean {
    const next = reduce(stored, structuredClone(batch))
    if (next === null) return false
    stored = next
    if (batch.dropUpdates) cache = []
    for (const update of batch.updates ?? []) cache.push({ key: nextKey++, update })
    return true
  }

  return {
    open() {
      const tab = { listeners: new Set<() => void>() }
      tabs.add(tab)
      return {
        durable: false,
        read: async () => stored,
        updates: async () => ({ updates: cache.map((row) => row.update), through: cache.at(-1)?.key ?? 0 }),
        async compact(through, update) {
          cache = [{ key: through, update }, ...cache.filter((row) => row.key > through)]
        },
        async write(batch) {
          if (!keep(batch)) return false
          for (const other of tabs) if (other !== tab) for (const listener of other.listeners) listener()
          return true
        },
        watch(listener) {
          tab.listeners.add(listener)
          return () => tab.listeners.delete(listener)
        },
        close: () => void tabs.delete(tab),
      }
    },
  }
}
