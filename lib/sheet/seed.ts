import * as Y from 'yjs'
import type { Budget, Scalar, SectionName } from '../budget/schema'
import { fieldsOf, isNote, ROOTS, SECTION_NAMES } from './layout'

/** A document with the layout's roots and nothing in them. Garbage collection is on: history is the journal's. */
export function createDoc(): Y.Doc {
  const doc = new Y.Doc({ gc: true })
  for (const root of ROOTS) doc.getMap(root)
  return doc
}

/**
 * The update that makes a budget's document, to be written once, as entry 1 of an epoch: seeding twice would double it.
 * @param clientId the Yjs client id that the content gets; a random one if left out
 */
export function seedUpdate(budget: Budget, clientId?: number): Uint8Array {
  const doc = createDoc()
  if (clientId !== undefined) doc.clientID = clientId
  doc.transact(() => {
    const head: Readonly<Record<string, Scalar>> = budget.head
    const headRoot = doc.getMap('head')
    for (const field of fieldsOf('head')) headRoot.set(field, head[field] ?? null)
    for (const section of SECTION_NAMES) {
      const root = doc.getMap(section)
      const records: Readonly<Record<string, Readonly<Record<string, Scalar>>>> = budget[section]
      for (const [id, record] of Object.entries(records)) root.set(id, recordMap(section, record))
    }
    const lanes = doc.getMap('laneValues')
    for (const [key, value] of Object.entries(budget.laneValues)) lanes.set(key, value)
  })
  const update = Y.encodeStateAsUpdate(doc)
  doc.destroy()
  return update
}

/** A record as it lies in the document: every field of its section, null where empty, notes as text. */
export function recordMap(section: SectionName, values: Readonly<Record<string, Scalar>>): Y.Map<unknown> {
  return new Y.Map(
    fieldsOf(section).map((field): [string, unknown] => {
      const value = values[field] ?? null
      if (isNote(section, field)) return [field, new Y.Text(typeof value === 'string' ? value : '')]
      return [field, field === 'removed' ? value === true : value]
    }),
  )
}

/**
 * The document as plain JSON. The schema is not judged here: the gate has done that for every update in the document.
 * The order of keys is not the same in two documents with the same content; compare and hash the canonical form.
 */
export function readBudget(doc: Y.Doc): Budget {
  return Object.fromEntries(ROOTS.map((root) => [root, doc.getMap(root).toJSON()])) as unknown as Budget
}
