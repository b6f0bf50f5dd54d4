import { type AppliedEdit, applyEdit } from '../edits'
import { newId } from '../ids'
import { type Batch, type Fit, fitDeed, type OutboxRecord, type RefusedRecord } from '../outbox'
import type { SheetDocument } from './sheetDocument'

type Now = { readonly epoch: number; readonly generation: number }

/**
 * Does an edit of an older document again in this one: what still fits becomes a new edit, the rest goes to the refused
 * list with what was typed.
 * @returns the batch that puts both in the place of the old record
 */
export function doAgain(record: OutboxRecord, { doc, mirror, undo }: SheetDocument, now: Now): Batch {
  const { conflicts, fits } = fitDeed(mirror.json, record.deed, record.epoch === now.epoch)
  const applied = applyEdit(doc, fits)
  const refuse = conflicts.length > 0 ? [conflicted(record, conflicts)] : []
  const batch: Batch = { ifGeneration: now.generation, ifRecord: record.editId, remove: [record.editId] }
  if (!applied.ok) {
    const { editId, deed, time } = record
    return { ...batch, refuse: [{ editId, deed, time, code: 'conflict', reason: applied.reason }] }
  }
  undo.remember(applied)
  const add = applied.update === null ? [] : [again(record, applied, applied.update, doc.clientID, now)]
  return { ...batch, add, refuse }
}

function again(record: OutboxRecord, edit: AppliedEdit, update: Uint8Array, clientId: number, now: Now): OutboxRecord {
  const { operations, bases } = edit
  const deed = { kind: record.deed.kind, operations, bases }
  return { ...now, editId: newId(), clientId, update, deed, time: record.time }
}

function conflicted(record: OutboxRecord, conflicts: Fit['conflicts']): RefusedRecord {
  const [first] = conflicts
  const reason =
    conflicts.length > 1 || first === undefined
      ? `${conflicts.length} of its fields were changed by others since, or their row is gone.`
      : first.reason
  return {
    editId: newId(),
    deed: {
      kind: record.deed.kind,
      operations: conflicts.map((each) => each.operation),
      bases: conflicts.map((each) => each.base),
    },
    code: 'conflict',
    reason,
    time: record.time,
  }
}
