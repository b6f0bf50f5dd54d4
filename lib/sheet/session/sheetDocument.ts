import * as Y from 'yjs'
import { createMirror, type Mirror } from '../mirror'
import type { BrowserStorage, OutboxRecord } from '../outbox'
import { createDoc } from '../seed'
import { createUndo, type Undo } from '../undo'

/** Origin of what a document starts with: the cache, and edits that are still in the outbox. */
export const KEPT = Symbol('kept')
/** Origin of another tab's edit that the server has acknowledged to this one. */
export const ACKNOWLEDGED = Symbol('acknowledged')

/** Beyond so many cached updates they are put together into one. */
const MANY_UPDATES = 200

export type SheetDocument = { readonly doc: Y.Doc; readonly mirror: Mirror; readonly undo: Undo }

/** Makes a document of the cache and of the unsent edits that were made in it. */
export async function openDocument(
  storage: BrowserStorage,
  unsent: () => readonly OutboxRecord[],
): Promise<SheetDocument> {
  // Without the cache everything comes from the server again.
  const { updates, through } = await storage.updates().catch(() => ({ updates: [], through: 0 }))
  const doc = createDoc()
  doc.transact(() => {
    for (const update of updates) Y.applyUpdate(doc, update)
  }, KEPT)
  if (updates.length > MANY_UPDATES) await storage.compact(through, Y.encodeStateAsUpdate(doc))
  doc.transact(() => {
    for (const record of unsent()) Y.applyUpdate(doc, record.update)
  }, KEPT)
  return { doc, mirror: createMirror(doc), undo: createUndo(doc) }
}

/** False as long as nothing has come from the server and nothing was in the cache. */
export function isLoaded(doc: Y.Doc): boolean {
  return doc.getMap('head').has('schemaVersion')
}

export function closeDocument({ doc, mirror, undo }: SheetDocument): void {
  undo.destroy()
  mirror.destroy()
  doc.destroy()
}
