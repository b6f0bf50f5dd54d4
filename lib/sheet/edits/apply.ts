import * as Y from 'yjs'
import type { Scalar, SectionName } from '../../budget/schema'
import type { Operation, Place } from '../change'
import { placeKey, placesOf } from '../place'
import { recordMap } from '../seed'
import { type EditRefusal, laneKey, refuseEdit } from './judge'
import { mergedText, type NoteOperation, spliceBetween } from './noteText'

/** Origins of a local edit's transactions. Making a record is never undone; what is written into it may be. */
export const MADE = Symbol('made')
export const WRITTEN = Symbol('written')
export const TYPED = Symbol('typed')

/** A field that an edit has written, for undo: who put it there, and what stood there before. */
export type FieldWrite = { readonly place: Place; readonly before: Scalar; readonly after: Scalar }

export type AppliedEdit = {
  readonly ok: true
  /** The edit as one Yjs update, or null where everything already stood as asked. */
  readonly update: Uint8Array | null
  /** What was done: the operations without those that changed nothing. */
  readonly operations: readonly Operation[]
  /** For each of these operations the value that it was made on; null for an added record. */
  readonly bases: readonly Scalar[]
  readonly writes: readonly FieldWrite[]
}

/**
 * Makes one edit of the operations: all of them or none. The document is not touched if one is refused.
 * An added record is first made with every field and `removed: true`, and shown by a second transaction (write path,
 * rule 1); lane values likewise. The bytes of all transactions together are one update.
 * @throws Error if called while a transaction of the document is running: its bytes could not be told apart
 */
export function applyEdit(doc: Y.Doc, operations: readonly Operation[]): AppliedEdit | ({ ok: false } & EditRefusal) {
  const refusal = refuseEdit(doc, operations)
  if (refusal !== null) return { ok: false, ...refusal }

  const last = lastWrites(operations)
  const done: { operation: Operation; base: Scalar }[] = []
  const writes: FieldWrite[] = []
  const update = captureUpdate(doc, () => {
    doc.transact(() => {
      for (const operation of last) make(doc, operation)
    }, MADE)
    doc.transact(() => {
      for (const operation of last) {
        const write = writeField(doc, operation)
        if (write === null) continue
        done.push({ operation, base: operation.op === 'add' ? null : write.before })
        writes.push(write)
      }
    }, WRITTEN)
    doc.transact(() => {
      for (const operation of operations) {
        if (operation.op !== 'note') continue
        const typed = type(doc, operation)
        if (typed !== null) done.push(typed)
      }
    }, TYPED)
  })
  return {
    ok: true,
    update,
    operations: done.map((each) => each.operation),
    bases: done.map((each) => each.base),
    writes,
  }
}

/** Without the writes of a field that a later write in the same edit replaces: only the last one is ever seen. */
function lastWrites(operations: readonly Operation[]): Operation[] {
  const later = new Set<string>()
  const kept = operations.toReversed().filter((operation) => {
    if (operation.op !== 'set' && operation.op !== 'lane') return true
    const key = placesOf(operation).map(placeKey).join()
    return !later.has(key) && later.add(key)
  })
  return kept.reverse()
}

/** Runs changes of the document and returns them as one update, or null if there were none. */
export function captureUpdate(doc: Y.Doc, change: () => void): Uint8Array | null {
  if (doc._transaction !== null || doc._transactionCleanups.length > 0) {
    throw new Error('An edit cannot be made inside a transaction or an observer of the document; make it afterwards.')
  }
  const updates: Uint8Array[] = []
  const keep = (update: Uint8Array) => updates.push(update)
  doc.on('update', keep)
  try {
    change()
  } finally {
    doc.off('update', keep)
  }
  return updates.length === 0 ? null : Y.mergeUpdates(updates)
}

/** Writes each field that still holds its `before`, as one transaction; returns what it wrote. */
export function writeFieldIfStill(doc: Y.Doc, writes: readonly FieldWrite[]): FieldWrite[] {
  const done: FieldWrite[] = []
  doc.transact(() => {
    for (const write of writes) {
      const { map, key } = entryAt(doc, write.place)
      if (map.get(key) !== write.before) continue
      map.set(key, write.after)
      done.push(write)
    }
  }, WRITTEN)
  return done
}

function make(doc: Y.Doc, operation: Operation): void {
  if (operation.op === 'add') {
    const { section, id, values } = operation
    doc.getMap(section).set(id, recordMap(section, { ...values, removed: true }))
  }
  if (operation.op === 'lane' && operation.value !== null) {
    const lanes = doc.getMap('laneValues')
    const key = laneKey(operation.line, operation.lane, operation.field)
    if (!lanes.has(key)) lanes.set(key, null)
  }
}

function writeField(doc: Y.Doc, operation: Operation): FieldWrite | null {
  if (operation.op === 'note') return null
  if (operation.op === 'add') {
    return setField(doc, { section: operation.section, id: operation.id, field: 'removed' }, false)
  }
  if (operation.op === 'lane') {
    const field = `${operation.lane}/${operation.field}`
    return setField(doc, { section: 'laneValues', id: operation.line, field }, operation.value)
  }
  const { section, id, field, value } = operation
  return section === 'head'
    ? setField(doc, { section, id: null, field }, value)
    : setField(doc, { section, id, field }, value)
}

function setField(doc: Y.Doc, place: Place, after: Scalar): FieldWrite | null {
  const { map, key } = entryAt(doc, place)
  const before = map.get(key) as Scalar | undefined
  if ((before ?? null) === after) return null
  map.set(key, after)
  return { place, before: before ?? null, after }
}

/** The map entry that holds a field. @throws Error if there is no such record */
function entryAt(doc: Y.Doc, place: Place): { map: Y.Map<unknown>; key: string } {
  if (place.section === 'head') return { map: doc.getMap('head'), key: place.field }
  if (place.section === 'laneValues') return { map: doc.getMap('laneValues'), key: `${place.id}/${place.field}` }
  return { map: recordAt(doc, place.section, place.id), key: place.field }
}

function recordAt(doc: Y.Doc, section: SectionName, id: string): Y.Map<unknown> {
  const record = doc.getMap(section).get(id)
  if (!(record instanceof Y.Map)) throw new Error(`There is no record '${id}' in '${section}'.`)
  return record
}

/** @returns what was typed and the text before, or null if the note already read so */
function type(doc: Y.Doc, operation: NoteOperation): { operation: NoteOperation; base: string } | null {
  const note = noteAt(doc, operation)
  const base = note.toString()
  const text = mergedText(operation, base)
  if (text === base) return null
  const { at, remove, insert } = spliceBetween(base, text)
  if (remove > 0) note.delete(at, remove)
  if (insert !== '') note.insert(at, insert)
  return { operation: { ...operation, text, base }, base }
}

function noteAt(doc: Y.Doc, operation: NoteOperation): Y.Text {
  const note = recordAt(doc, operation.section, operation.id).get(operation.field)
  if (!(note instanceof Y.Text)) throw new Error(`'${operation.field}' of '${operation.id}' is not a note.`)
  return note
}
