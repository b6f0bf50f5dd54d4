import * as Y from 'yjs'
import { judgeContent } from './contents'
import { gap, refuse } from './refusal'
import { type Parent, type Spot, sameSpot, spotInDocument, spotUnder } from './spot'

type Struct = Y.Item | Y.GC
type MadeSpot = Extract<Spot, { at: 'record' | 'note' }>

/**
 * Judges the items that an edit brings, each at its spot. They are of one client id and follow each other without a hole,
 * so each hangs on earlier ones or on what the shadow holds. @throws Refuse
 * @returns the keys of the lane values that are written
 */
export function judgeItems(shadow: Y.Doc, structs: readonly Struct[]): string[] {
  const lanes: string[] = []
  const spots: (Spot | null)[] = []
  const made = new Set<string>()
  for (const struct of structs) {
    // Collected content has no place; what would hang on it is refused.
    const spot = struct instanceof Y.Item ? spotOf(shadow, struct, structs, spots) : null
    if (spot && struct instanceof Y.Item) {
      if (spot.at === 'record' || spot.at === 'note') judgeMade(shadow, spot, struct, made)
      judgeContent(spot, struct.content)
      if (spot.at === 'lane') lanes.push(spot.key)
    }
    spots.push(spot)
  }
  return lanes
}

/** Records and notes are made once and never replaced. */
function judgeMade(shadow: Y.Doc, spot: MadeSpot, item: Y.Item, made: Set<string>): void {
  const path = (at: string) => `${spot.section}/${spot.id}/${at}`
  const stands = !made.has(path('record')) && shadow.share.get(spot.section)?._map.has(spot.id) === true
  if (item.origin !== null || stands || made.has(path(spot.at)))
    refuse('outside-layout', `'${spot.id}' exists already in '${spot.section}'; change its fields.`)
  made.add(path(spot.at))
}

function spotOf(shadow: Y.Doc, item: Y.Item, structs: readonly Struct[], spots: readonly (Spot | null)[]): Spot {
  const find = (id: Y.ID) => neighbour(shadow, item, id, structs, spots)
  const left = item.origin && find(item.origin)
  const right = item.rightOrigin && find(item.rightOrigin)
  if (left && right && !sameSpot(left, right)) refuse('outside-layout', 'The neighbours of an item stand apart.')
  if (right && right.at !== 'text') refuse('outside-layout', 'Only text has a right neighbour.')
  return left ?? right ?? spotUnder(parentOf(item, find), item.parentSub)
}

function parentOf(item: Y.Item, find: (id: Y.ID) => Spot): Parent {
  // Before integration Yjs keeps a root's name or the id of the holding item here.
  const parent: unknown = item.parent
  if (typeof parent === 'string') return { root: parent }
  if (parent instanceof Y.ID) return { spot: find(parent) }
  return refuse('malformed', 'The edit has an item without a place.')
}

/** The spot of an item that another one names. @throws Refuse, as a gap where it is not known */
function neighbour(
  shadow: Y.Doc,
  item: Y.Item,
  id: Y.ID,
  structs: readonly Struct[],
  spots: readonly (Spot | null)[],
): Spot {
  const known = Y.getState(shadow.store, id.client)
  if (id.clock < known) {
    const struct: Struct = Y.getItem(shadow.store, id)
    return struct instanceof Y.Item ? spotInDocument(struct) : hangsOnNothing()
  }
  if (id.client !== item.id.client) gap(id.client, known)
  if (id.clock >= item.id.clock) refuse('malformed', 'An item hangs on a later one.')
  return spots[indexAt(structs, id.clock)] ?? hangsOnNothing()
}

function hangsOnNothing(): never {
  return refuse('outside-layout', 'The edit hangs on something that is gone.')
}

/** Index of the struct that holds this clock. */
function indexAt(structs: readonly Struct[], clock: number): number {
  let low = 0
  let high = structs.length - 1
  while (low < high) {
    const middle = (low + high + 1) >> 1
    if ((structs[middle]?.id.clock ?? Number.POSITIVE_INFINITY) <= clock) low = middle
    else high = middle - 1
  }
  return low
}
