import type { Scalar } from '../../budget/schema'
import type { Operation, Place } from '../change'
import type { RefusedRecord } from '../outbox'
import { placesOf } from '../place'
import type { EditResult, RefusedEdit } from './types'

type Actions = { edit(operations: readonly Operation[]): EditResult; dismiss(editId: string): void }

/** Shows refused records to the screen; one record gives the same object each time. */
export function refusedEdits(actions: Actions): (records: readonly RefusedRecord[]) => readonly RefusedEdit[] {
  const shown = new WeakMap<RefusedRecord, RefusedEdit>()
  const byId = new Map<string, RefusedEdit>()
  let last: readonly RefusedEdit[] = []
  return (records) => {
    const next = records.map((record) => {
      const edit = shown.get(record) ?? byId.get(record.editId) ?? show(record, actions)
      shown.set(record, edit)
      return edit
    })
    byId.clear()
    for (const edit of next) byId.set(edit.id, edit)
    if (next.length !== last.length || next.some((edit, index) => edit !== last[index])) last = next
    return last
  }
}

function show(record: RefusedRecord, actions: Actions): RefusedEdit {
  return {
    id: record.editId,
    code: record.code,
    reason: record.reason,
    time: record.time,
    parts: record.deed.operations.flatMap(partsOf),
    enterAgain() {
      const result = actions.edit(record.deed.operations)
      if (result.ok) actions.dismiss(record.editId)
      return result
    },
    dismiss: () => actions.dismiss(record.editId),
  }
}

function partsOf(operation: Operation): { place: Place; typed: string }[] {
  return placesOf(operation).map((place) => ({ place, typed: typedText(typedValue(operation, place)) }))
}

function typedValue(operation: Operation, place: Place): Scalar {
  if (operation.op === 'add') return operation.values[place.field] ?? null
  return operation.op === 'note' ? operation.text : operation.value
}

function typedText(value: Scalar): string {
  if (typeof value === 'boolean') return value ? 'yes' : 'no'
  return value === null ? '' : String(value)
}
