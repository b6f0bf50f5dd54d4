import type { Budget, Scalar, SectionName } from '../../../../../lib/budget/schema'
import type { Operation } from '../../../../../lib/sheet/change'
import { newId } from '../../../../../lib/sheet/ids'
import { compareRows, orderBetween } from '../../../../../lib/sheet/order'

type Ordered = { readonly order: string; readonly removed: boolean }
export type Entry<T> = readonly [id: string, record: T]

/** Records that are in the budget, in order; ties are broken by id, as everywhere. */
export function inOrder<T extends Ordered>(records: Readonly<Record<string, T>>): readonly Entry<T>[] {
  return sorted(records).filter(([, record]) => !record.removed)
}

/** Records that were taken out and can be put back. */
export function removedOnes<T extends Ordered>(records: Readonly<Record<string, T>>): readonly Entry<T>[] {
  return sorted(records).filter(([, record]) => record.removed)
}

function sorted<T extends Ordered>(records: Readonly<Record<string, T>>): readonly Entry<T>[] {
  return Object.entries(records).sort(([a, left], [b, right]) =>
    compareRows({ id: a, order: left.order }, { id: b, order: right.order }),
  )
}

/** Sets one field of a record, or of the head (id null). */
export function setField(section: 'head' | SectionName, id: string | null, field: string, value: Scalar): Operation {
  if (section === 'head') return { op: 'set', section, id: null, field, value }
  if (id === null) throw new Error(`A field of '${section}' needs a record's id.`)
  return { op: 'set', section, id, field, value }
}

/** Adds a record at the end of a section other than the channel's; removed ones keep their place. */
export function addRecord(
  budget: Budget,
  section: Exclude<SectionName, 'lines' | 'planes'>,
  values: Readonly<Record<string, Scalar>>,
): { readonly operations: readonly Operation[]; readonly id: string } {
  const id = newId()
  const last = sorted<Ordered>(budget[section]).at(-1)
  const order = orderBetween(last?.[1].order ?? null, null)
  return { operations: [{ op: 'add', section, id, values: { ...values, order } }], id }
}
