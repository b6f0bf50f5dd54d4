import * as Y from 'yjs'
import { ID, type SectionName } from '../../budget/schema'
import { fieldsOf, isNote, isSection } from '../../sheet/layout'
import { refuse } from './refusal'

/** Where an item stands in the layout. */
export type Spot =
  | { readonly at: 'field'; readonly section: 'head' | SectionName; readonly id: string | null; readonly field: string }
  | { readonly at: 'lane'; readonly key: string }
  | { readonly at: 'record'; readonly section: SectionName; readonly id: string }
  | { readonly at: 'note'; readonly section: SectionName; readonly id: string; readonly field: string }
  /** Characters of a note. */
  | { readonly at: 'text' }

/** What an item hangs under: a root by name, or another item's map or text. */
export type Parent = { readonly root: string } | { readonly spot: Spot }

/** The spot of an entry under a parent. @throws Refuse where the layout has no such place */
export function spotUnder(parent: Parent, key: string | null): Spot {
  if ('root' in parent) return underRoot(parent.root, key)
  if (parent.spot.at === 'record') return underRecord(parent.spot.section, parent.spot.id, key)
  if (parent.spot.at === 'note') {
    if (key !== null) refuse('outside-layout', 'A note has plain text and no attributes.')
    return { at: 'text' }
  }
  return refuse('outside-layout', 'A value has nothing below it.')
}

/** The spot of an item that stands in a document. */
export function spotInDocument(item: Y.Item): Spot {
  const type = item.parent
  if (!(type instanceof Y.AbstractType)) return refuse('outside-layout', 'The edit hangs on something that is gone.')
  const holder = type._item
  const parent: Parent = holder === null ? { root: Y.findRootTypeKey(type) } : { spot: spotInDocument(holder) }
  return spotUnder(parent, item.parentSub)
}

export function sameSpot(a: Spot, b: Spot): boolean {
  return JSON.stringify(a) === JSON.stringify(b)
}

function underRoot(root: string, key: string | null): Spot {
  if (key === null) return refuse('outside-layout', 'The sheet has no lists.')
  if (root === 'head') {
    if (!fieldsOf('head').includes(key)) refuse('outside-layout', `'${clip(key)}' is not a field of the head.`)
    return { at: 'field', section: 'head', id: null, field: key }
  }
  if (root === 'laneValues') return { at: 'lane', key }
  if (!isSection(root)) return refuse('outside-layout', `'${clip(root)}' is not a section of a budget.`)
  if (!ID.test(key)) refuse('outside-layout', 'An id has 1 to 40 small letters, digits and hyphens.')
  return { at: 'record', section: root, id: key }
}

function underRecord(section: SectionName, id: string, key: string | null): Spot {
  if (key === null) return refuse('outside-layout', 'The sheet has no lists.')
  if (!fieldsOf(section).includes(key)) refuse('outside-layout', `'${clip(key)}' is not a field of '${section}'.`)
  if (isNote(section, key)) return { at: 'note', section, id, field: key }
  return { at: 'field', section, id, field: key }
}

const clip = (text: string) => text.slice(0, 40)
