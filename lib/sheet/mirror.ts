import * as Y from 'yjs'
import type { Budget, Scalar, SectionName } from '../budget/schema'
import type { Change, Place } from './change'
import { emptyRecord, fieldsOf, isNote, isSection, ROOTS } from './layout'
import { createDraft } from './mirrorDraft'
import { readBudget } from './seed'

export type Mirror = {
  /** The document as plain JSON. Never changed in place: what did not change keeps its identity. */
  readonly json: Budget
  /**
   * The changes since the last call, in the order in which they came.
   * @throws Error if the document has left the layout (a record or a key gone, a value that is no scalar): the mirror and
   * the document are of no further use then
   */
  take(): Change[]
  destroy(): void
}

/**
 * A plain JSON copy of a document that follows it, and says what each transaction changed. Before and after are read from
 * the copy and the document, at the paths that the transaction names: the old values of Yjs' events are wrong for what was
 * deleted or replaced. Make it when the document has its content, or empty; only later changes are told.
 */
export function createMirror(doc: Y.Doc): Mirror {
  const roots = new Map(ROOTS.map((name): [unknown, string] => [doc.getMap(name), name]))
  let json = readBudget(doc)
  let changes: Change[] = []
  let fault: string | null = null

  const follow = (transaction: Y.Transaction) => {
    if (fault !== null || transaction.changed.size === 0) return
    const draft = createDraft(json)
    try {
      for (const [type, keys] of transaction.changed) {
        const root = roots.get(type)
        if (root !== undefined && isSection(root)) followSection(root, type as Y.AbstractType<unknown>, keys)
        else if (root !== undefined) followRoot(root, type as Y.AbstractType<unknown>, keys)
        else followInside(type as Y.AbstractType<unknown>, keys)
      }
    } catch (error) {
      fault = error instanceof Error ? error.message : String(error)
    }
    json = draft.json

    function followRoot(root: string, type: Y.AbstractType<unknown>, keys: ReadonlySet<string | null>) {
      for (const key of keys) {
        const field = requireKey(key, root)
        const after = scalarIn(type, field, root)
        if (root === 'head') record({ section: 'head', id: null, field }, draft.setHead(field, after), after)
        else record(lanePlace(field), draft.setLane(field, after), after)
      }
    }

    function followSection(section: SectionName, type: Y.AbstractType<unknown>, keys: ReadonlySet<string | null>) {
      for (const key of keys) {
        const id = requireKey(key, section)
        const values = readRecord(section, id, type)
        if (draft.has(section, id)) throw new Error(`The record '${id}' in '${section}' was replaced or taken away.`)
        draft.add(section, id, values)
        const empty = emptyRecord(section)
        for (const field of fieldsOf(section)) {
          const after = values[field] ?? null
          if (after !== empty[field]) changes.push({ section, id, field, kind: 'add', before: null, after })
        }
      }
    }

    function followInside(type: Y.AbstractType<unknown>, keys: ReadonlySet<string | null>) {
      const item = type._item
      const parent = item?.parent as Y.AbstractType<unknown> | undefined
      const section = roots.get(parent)
      if (item && parent && section !== undefined && isSection(section)) {
        const id = requireKey(item.parentSub, section)
        for (const key of keys) {
          const field = requireKey(key, id)
          if (isNote(section, field)) throw new Error(`The note of '${id}' in '${section}' was replaced.`)
          const after = scalarIn(type, field, id)
          record({ section, id, field }, draft.setField(section, id, field, after), after)
        }
        return
      }
      const holder = parent?._item
      const outer = roots.get(holder?.parent)
      if (!item || !holder || outer === undefined || !isSection(outer)) return
      const id = requireKey(holder.parentSub, outer)
      const field = requireKey(item.parentSub, id)
      const after = noteText(type, id)
      const before = draft.setField(outer, id, field, after)
      if (before !== after) changes.push({ section: outer, id, field, kind: 'text', before, after })
    }

    function record(place: Place, before: Scalar, after: Scalar) {
      if (before !== after) changes.push({ ...place, kind: 'set', before, after })
    }
  }
  doc.on('afterTransaction', follow)

  return {
    get json() {
      return json
    },
    take() {
      if (fault !== null) throw new Error(fault)
      const taken = changes
      changes = []
      return taken
    },
    destroy: () => doc.off('afterTransaction', follow),
  }
}

function readRecord(section: SectionName, id: string, root: Y.AbstractType<unknown>): Record<string, Scalar> {
  const value = root instanceof Y.Map ? root.get(id) : undefined
  if (!(value instanceof Y.Map)) throw new Error(`'${id}' in '${section}' is not a record.`)
  const fields = fieldsOf(section)
  if ([...value.keys()].some((field) => !fields.includes(field))) {
    throw new Error(`The record '${id}' in '${section}' has a field that its section does not have.`)
  }
  return Object.fromEntries(
    fields.map((field) => [
      field,
      isNote(section, field) ? noteText(value.get(field), id) : scalarIn(value, field, id),
    ]),
  )
}

function noteText(value: unknown, id: string): string {
  if (!(value instanceof Y.Text)) throw new Error(`The note of '${id}' is not plain text.`)
  return value.toString()
}

function scalarIn(map: unknown, field: string, where: string): Scalar {
  const value: unknown = map instanceof Y.Map ? map.get(field) : undefined
  if (value === null || typeof value === 'string' || typeof value === 'number' || typeof value === 'boolean')
    return value
  throw new Error(`'${field}' of '${where}' holds no single value.`)
}

function requireKey(key: string | null, where: string): string {
  if (key === null) throw new Error(`'${where}' holds a list.`)
  return key
}

function lanePlace(key: string): Place {
  const [line = '', ...rest] = key.split('/')
  return { section: 'laneValues', id: line, field: rest.join('/') }
}
