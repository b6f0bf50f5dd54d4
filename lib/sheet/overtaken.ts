import * as Y from 'yjs'
import type { Scalar } from '../budget/schema'
import type { Place } from './change'
import { isSection, ROOTS } from './layout'

export type JudgedWrites = {
  /** Writes that do not show, because another one won: what was written, and what is kept. */
  readonly overtaken: readonly (Place & { readonly written: Scalar; readonly kept: Scalar })[]
  /** Writes that show, and replaced a value that their author had not seen. */
  readonly unseen: readonly Place[]
}

/**
 * Finds out what became of the field writes of an update, after it was applied. Of several writes of one field in one update
 * the last one counts. Notes are not judged: text merges.
 * @param before the document's state vector from before the update; structs that it already had are not judged
 */
export function judgeWrites(update: Uint8Array, doc: Y.Doc, before: ReadonlyMap<number, number>): JudgedWrites {
  const roots = new Map(ROOTS.map((name): [unknown, string] => [doc.getMap(name), name]))
  const written = new Map<Y.Item, Y.Item>()
  const last = new Map<Y.AbstractType<unknown>, Map<string, Y.Item>>()
  for (const struct of Y.decodeUpdate(update).structs) {
    if (!(struct instanceof Y.Item) || struct.id.clock < (before.get(struct.id.client) ?? 0)) continue
    const item = Y.getItem(doc.store, struct.id)
    if (!(item instanceof Y.Item) || item.parentSub === null) continue
    const parent = item.parent as Y.AbstractType<unknown>
    const ofParent = last.get(parent) ?? new Map<string, Y.Item>()
    last.set(parent, ofParent.set(item.parentSub, item))
    written.set(item, struct)
  }

  const overtaken: (Place & { written: Scalar; kept: Scalar })[] = []
  const unseen: Place[] = []
  for (const [parent, ofParent] of last) {
    for (const [key, item] of ofParent) {
      const place = placeOf(roots, parent, key)
      const current = parent._map.get(key)
      const sent = written.get(item)
      if (place === null || current === undefined || sent === undefined) continue
      if (current === item) {
        if (replacedUnseen(item, written)) unseen.push(place)
      } else {
        overtaken.push({ ...place, written: scalarOf(sent), kept: scalarOf(current) })
      }
    }
  }
  return { overtaken, unseen }
}

/** Whether the first of the update's writes in this item's chain stands behind a value that it does not name as its origin. */
function replacedUnseen(item: Y.Item, written: ReadonlyMap<Y.Item, Y.Item>): boolean {
  let first = item
  while (first.left !== null && written.has(first.left)) first = first.left
  if (first.left === null) return false
  return first.origin === null || !Y.compareIDs(first.origin, first.left.lastId)
}

function placeOf(roots: ReadonlyMap<unknown, string>, parent: Y.AbstractType<unknown>, key: string): Place | null {
  const root = roots.get(parent)
  if (root === 'head') return { section: 'head', id: null, field: key }
  if (root === 'laneValues') {
    const [line = '', ...rest] = key.split('/')
    return { section: 'laneValues', id: line, field: rest.join('/') }
  }
  const section = roots.get(parent._item?.parent)
  const id = parent._item?.parentSub
  return section !== undefined && isSection(section) && id ? { section, id, field: key } : null
}

function scalarOf(item: Y.Item): Scalar {
  const [value] = item.content.getContent()
  return value === null || typeof value === 'string' || typeof value === 'number' || typeof value === 'boolean'
    ? value
    : null
}
