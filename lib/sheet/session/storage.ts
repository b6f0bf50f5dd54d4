import { type BrowserStorage, createMemory, openIndexedDb } from '../outbox'

/** The browser's storage of one budget for one person; where it offers none, one that is gone with the page (`durable` false). */
export async function openBrowserStorage(person: string, budget: string): Promise<BrowserStorage> {
  try {
    return await openIndexedDb(person, budget)
  } catch {
    return createMemory().open()
  }
}
