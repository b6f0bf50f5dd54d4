import * as Y from 'yjs'
import type { Scalar, SectionName } from '../../../lib/budget/schema'
import { emptyRecord, fieldsOf, isNote, ROOTS } from '../../../lib/sheet/layout'

/** A sheet laid out by hand, entry by entry: no code of lib/sheet but the list of its fields. */
export function handMadeSheet(clientId: number): Y.Doc {
  const doc = new Y.Doc()
  doc.clientID = clientId
  doc.transact(() => {
    for (const root of ROOTS) doc.getMap(root)
    for (const field of fieldsOf('head')) doc.getMap('head').set(field, field === 'schemaVersion' ? 1 : null)
    doc.getMap('head').set('name', 'Backplane, 32 lanes')
    putRecord(doc, 'assemblies', 'board', { order: 'a0', name: 'Board' })
    putRecord(doc, 'lines', 'trace', { order: 'a0', name: 'Trace', assembly: 'board', loss: '5 dB' })
    putRecord(doc, 'lines', 'cable', { order: 'a1', name: 'Cable' })
    doc.getMap('laneValues').set('trace/1/length', '3 in')
  })
  return doc
}

export function putRecord(doc: Y.Doc, section: SectionName, id: string, values: Record<string, Scalar>): void {
  const record = new Y.Map<unknown>()
  for (const [field, empty] of Object.entries(emptyRecord(section)))
    record.set(field, isNote(section, field) ? new Y.Text(String(values[field] ?? '')) : (values[field] ?? empty))
  doc.getMap(section).set(id, record)
}

export function recordOf(doc: Y.Doc, section: SectionName, id: string): Y.Map<unknown> {
  const record = doc.getMap(section).get(id)
  if (!(record instanceof Y.Map)) throw new Error(`no record ${section}/${id}`)
  return record
}

export function noteOf(doc: Y.Doc, section: SectionName, id: string): Y.Text {
  const note = recordOf(doc, section, id).get('note')
  if (!(note instanceof Y.Text)) throw new Error(`no note in ${section}/${id}`)
  return note
}

/** Another page's copy under a client id of its own. */
export function copyOf(doc: Y.Doc, clientId: number): Y.Doc {
  const copy = new Y.Doc()
  copy.clientID = clientId
  Y.applyUpdate(copy, Y.encodeStateAsUpdate(doc))
  return copy
}

/** What one transaction would send. */
export function editOf(doc: Y.Doc, change: (doc: Y.Doc) => void): Uint8Array {
  const updates: Uint8Array[] = []
  const keep = (update: Uint8Array) => updates.push(update)
  doc.on('update', keep)
  doc.transact(() => change(doc))
  doc.off('update', keep)
  const update = updates[0]
  if (!update || updates.length !== 1) throw new Error(`one update expected, ${updates.length} came`)
  return update
}
