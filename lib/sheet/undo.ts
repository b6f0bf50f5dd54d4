import * as Y from 'yjs'
import type { Scalar, SectionName } from '../budget/schema'
import type { Operation, Place } from './change'
import { type AppliedEdit, captureUpdate, type FieldWrite, TYPED, writeFieldIfStill } from './edits'
import { ROOTS } from './layout'

/** What an undo or redo did, to be sent like any edit. */
export type Undone = {
  readonly update: Uint8Array
  readonly operations: readonly Operation[]
  readonly bases: readonly Scalar[]
}

export type Undo = {
  /** Takes an edit of this person that was just made as the next step; what could be redone no longer can. */
  remember(edit: AppliedEdit): void
  /** Takes one step back. @returns null if there is none, or if others have changed all of it since */
  undo(): Undone | null
  redo(): Undone | null
  readonly canUndo: boolean
  readonly canRedo: boolean
  destroy(): void
}

type StackItem = Y.UndoManager['undoStack'][number]
type NotePlace = { readonly section: SectionName; readonly id: string; readonly field: 'note' }
type Step = {
  readonly writes: readonly FieldWrite[]
  readonly notes: readonly NotePlace[]
  readonly typed: StackItem | null
}

/**
 * Undo of one person's own edits, one committed edit a step. A field goes back to what it was before if it still holds what
 * this person put there; what somebody else wrote since stays. Yjs' own UndoManager takes back typing in notes, character
 * by character; it is not used for fields, because undoing a write that overtook another one removes the field's key.
 */
export function createUndo(doc: Y.Doc): Undo {
  const typing = new Y.UndoManager(
    ROOTS.map((root) => doc.getMap(root)),
    { trackedOrigins: new Set([TYPED]), captureTimeout: 0 },
  )
  const back: Step[] = []
  const forth: Step[] = []

  function take(from: Step[], to: Step[], direction: 'undo' | 'redo'): Undone | null {
    const step = from.pop()
    if (step === undefined) return null
    const before = step.notes.map((place) => noteAt(doc, place))
    let writes: FieldWrite[] = []
    let typed: StackItem | null = null
    const update = captureUpdate(doc, () => {
      writes = writeFieldIfStill(doc, step.writes.toReversed().map(inverse))
      typed = step.typed && takeTyped(step.typed, direction)
    })
    if (update === null) return null
    to.push({ writes, notes: step.notes, typed })
    const operations: Operation[] = writes.map(operationOf)
    const bases: Scalar[] = writes.map((write) => write.before)
    for (const [index, place] of step.notes.entries()) {
      const base = before[index] ?? ''
      const text = noteAt(doc, place)
      if (text === base) continue
      operations.push({ op: 'note', ...place, text, base })
      bases.push(base)
    }
    return { update, operations, bases }
  }

  /** The manager is given one step at a time: left alone it goes on to an older one where a step has nothing left to undo. */
  function takeTyped(item: StackItem, direction: 'undo' | 'redo'): StackItem | null {
    typing.undoStack = direction === 'undo' ? [item] : []
    typing.redoStack = direction === 'redo' ? [item] : []
    typing[direction]()
    const made = direction === 'undo' ? typing.redoStack.pop() : typing.undoStack.pop()
    typing.undoStack = []
    typing.redoStack = []
    return made ?? null
  }

  return {
    remember(edit) {
      const typed = typing.undoStack.pop() ?? null
      typing.undoStack = []
      if (edit.update === null) return
      const notes = edit.operations.flatMap((operation) =>
        operation.op === 'note' ? [{ section: operation.section, id: operation.id, field: operation.field }] : [],
      )
      back.push({ writes: edit.writes, notes, typed })
      forth.length = 0
    },
    undo: () => take(back, forth, 'undo'),
    redo: () => take(forth, back, 'redo'),
    get canUndo() {
      return back.length > 0
    },
    get canRedo() {
      return forth.length > 0
    },
    destroy: () => typing.destroy(),
  }
}

const inverse = (write: FieldWrite): FieldWrite => ({ place: write.place, before: write.after, after: write.before })

function noteAt(doc: Y.Doc, place: NotePlace): string {
  const record = doc.getMap(place.section).get(place.id)
  return record instanceof Y.Map ? String(record.get(place.field)) : ''
}

function operationOf({ place, after }: FieldWrite): Operation {
  if (place.section === 'laneValues') return laneOperation(place, after)
  return place.section === 'head'
    ? { op: 'set', section: 'head', id: null, field: place.field, value: after }
    : { op: 'set', section: place.section, id: place.id, field: place.field, value: after }
}

function laneOperation(place: Place & { section: 'laneValues' }, after: Scalar): Operation {
  const [lane = '', field = ''] = place.field.split('/')
  return { op: 'lane', line: place.id, lane: Number(lane), field, value: after === null ? null : String(after) }
}
