import { generateKeyBetween } from 'fractional-indexing'
import type { Budget, Scalar, SectionName } from '../../../../../lib/budget/schema'
import { ID } from '../../../../../lib/budget/schema'
import type { Operation, Place } from '../../../../../lib/sheet/change'

/** The name of a place in the budget: one string, for maps, for `data-place` and for finding a cell again after a rerender. */
export function placeKey(place: { section: string; id: string | null; field: string | null }): string {
  return `${place.section}/${place.id ?? ''}/${place.field ?? ''}`
}

/** Sets one field. Places of lane values are written through their own operation. */
export function setField(section: 'head' | SectionName, id: string | null, field: string, value: Scalar): Operation {
  if (section === 'head') return { op: 'set', section, id: null, field, value }
  if (id === null) throw new Error(`A field of '${section}' needs a record's id.`)
  return { op: 'set', section, id, field, value }
}

/** A new record's id: short enough to read in a trail, random enough that two people never make the same. */
export function newId(prefix: string, random: () => string = () => crypto.randomUUID()): string {
  const id = `${prefix}-${random().replaceAll('-', '').slice(0, 12)}`
  if (!ID.test(id)) throw new Error(`'${id}' is not an id.`)
  return id
}

type Ordered = { readonly order: string; readonly removed: boolean }

/** Records that are in the budget, in order; ties are broken by id, as everywhere. */
export function inOrder<T extends Ordered>(records: Readonly<Record<string, T>>): readonly (readonly [string, T])[] {
  return Object.entries(records)
    .filter(([, record]) => !record.removed)
    .sort(byOrder)
}

export function byOrder(a: readonly [string, Ordered], b: readonly [string, Ordered]): number {
  return compare(a[1].order, b[1].order) || compare(a[0], b[0])
}

const compare = (a: string, b: string) => (a < b ? -1 : a > b ? 1 : 0)

/** An order key after the last record of a section, removed ones included, so that a restored record keeps its place. */
export function orderAtEnd(records: Readonly<Record<string, Ordered>>): string {
  const last = Object.entries(records).sort(byOrder).at(-1)
  return generateKeyBetween(last?.[1].order ?? null, null)
}

/** Where an operation writes, for marking what is not yet saved. */
export function placesOf(operation: Operation): readonly Place[] {
  switch (operation.op) {
    case 'set':
      return [{ section: operation.section, id: operation.id, field: operation.field } as Place]
    case 'note':
      return [{ section: operation.section, id: operation.id, field: operation.field }]
    case 'lane':
      return [{ section: 'laneValues', id: operation.line, field: `${operation.lane}/${operation.field}` }]
    case 'add':
      return Object.keys(operation.values).map((field) => ({ section: operation.section, id: operation.id, field }))
  }
}

export type ChannelRow = { readonly kind: 'line' | 'plane'; readonly id: string; readonly order: string }

/** Lines and planes share one order: the channel. `keep` stays in although removed (a cell of it is being typed in). */
export function channelRows(budget: Budget, keep: ReadonlySet<string> = new Set()): readonly ChannelRow[] {
  const rows: ChannelRow[] = []
  for (const [section, kind] of [
    ['lines', 'line'],
    ['planes', 'plane'],
  ] as const) {
    for (const [id, record] of Object.entries(budget[section])) {
      if (!record.removed || keep.has(`${section}/${id}`)) rows.push({ kind, id, order: record.order })
    }
  }
  return rows.sort((a, b) => compare(a.order, b.order) || compare(a.id, b.id))
}
