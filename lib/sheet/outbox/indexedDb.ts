import { type DBSchema, type IDBPDatabase, type IDBPTransaction, openDB } from 'idb'
import { FIRST_META, type Meta, type OutboxRecord, type RefusedRecord } from './record'
import { type Batch, type BrowserStorage, reduce } from './storage'

interface Schema extends DBSchema {
  records: { key: number; value: OutboxRecord; indexes: { editId: string } }
  refused: { key: string; value: RefusedRecord }
  meta: { key: string; value: Meta }
  updates: { key: number; value: Uint8Array }
}
const STORES: ('records' | 'refused' | 'meta' | 'updates')[] = ['records', 'refused', 'meta', 'updates']
const VERSION = 1

/**
 * Opens what this browser keeps of one budget for one person. Tabs tell each other on a BroadcastChannel only that
 * something has changed, never what: the data goes through the database.
 * @throws DOMException where the browser offers no IndexedDB (some private windows)
 */
export async function openIndexedDb(person: string, budget: string): Promise<BrowserStorage> {
  const name = `halfbaud/${person}/${budget}`
  const db = await openDB<Schema>(name, VERSION, {
    upgrade(database) {
      database.createObjectStore('records', { autoIncrement: true }).createIndex('editId', 'editId', { unique: true })
      database.createObjectStore('refused', { keyPath: 'editId' })
      database.createObjectStore('meta')
      database.createObjectStore('updates', { autoIncrement: true })
    },
    // A newer page wants another layout: this tab lets go of the old one, and its edits stay stored.
    blocking: (_current, _blocked, event) => (event.target as IDBDatabase).close(),
  })
  const channel = new BroadcastChannel(name)
  return {
    durable: true,
    read: () => read(db),
    async updates() {
      const transaction = db.transaction('updates')
      const [keys, updates] = await Promise.all([transaction.store.getAllKeys(), transaction.store.getAll()])
      return { updates, through: keys.at(-1) ?? 0 }
    },
    async compact(through, update) {
      const { store, done } = db.transaction('updates', 'readwrite')
      await Promise.all([store.delete(IDBKeyRange.upperBound(through)), store.put(update, through), done])
    },
    async write(batch) {
      const stored = await write(db, batch)
      if (stored) channel.postMessage('look again')
      return stored
    },
    watch(listener) {
      channel.addEventListener('message', listener)
      return () => channel.removeEventListener('message', listener)
    },
    close() {
      channel.close()
      db.close()
    },
  }
}

async function read(db: IDBPDatabase<Schema>) {
  const transaction = db.transaction(['records', 'refused', 'meta'])
  const [records, refused, meta] = await Promise.all([
    transaction.objectStore('records').getAll(),
    transaction.objectStore('refused').getAll(),
    transaction.objectStore('meta').get('meta'),
  ])
  return { records, refused, meta: { ...FIRST_META, ...meta } }
}

async function write(db: IDBPDatabase<Schema>, batch: Batch): Promise<boolean> {
  const transaction = db.transaction(STORES, 'readwrite')
  const work = put(transaction, batch).catch((error: unknown) => {
    transaction.abort()
    throw error
  })
  const [stored] = await Promise.all([work, transaction.done])
  return stored
}

async function put(transaction: IDBPTransaction<Schema, typeof STORES, 'readwrite'>, batch: Batch): Promise<boolean> {
  const records = transaction.objectStore('records')
  const refused = transaction.objectStore('refused')
  const metaStore = transaction.objectStore('meta')
  const updates = transaction.objectStore('updates')
  const meta = { ...FIRST_META, ...(await metaStore.get('meta')) }
  const named = batch.ifRecord === undefined ? undefined : await records.index('editId').get(batch.ifRecord)
  const next = reduce({ meta, records: named ? [named] : [], refused: [] }, batch)
  if (next === null) return false
  if (batch.meta) await metaStore.put(next.meta, 'meta')
  for (const editId of batch.remove ?? []) {
    const key = await records.index('editId').getKey(editId)
    if (key !== undefined) await records.delete(key)
  }
  for (const record of batch.add ?? []) await records.add(record)
  for (const record of batch.refuse ?? []) await refused.put(record)
  for (const editId of batch.dismiss ?? []) await refused.delete(editId)
  if (batch.dropUpdates) await updates.clear()
  for (const update of batch.updates ?? []) await updates.add(update)
  return true
}
