import type { Operation } from '../change'
import { applyEdit } from '../edits'
import { newId } from '../ids'
import type { Deed, OutboxRecord } from '../outbox'
import type { Undone } from '../undo'
import type { SheetDocument } from './sheetDocument'
import type { EditResult, SheetSession, SheetSnapshot } from './types'

/** The document to edit, with what its records are marked with. */
export type Editable = { readonly document: SheetDocument; readonly epoch: number; readonly generation: number }

type Context = {
  snapshot(): SheetSnapshot
  /** Null while nothing is loaded. */
  editable(): Editable | null
  /** Runs a change of the document without telling anybody before it is whole. */
  quietly<T>(change: () => T): T
  keep(record: OutboxRecord): void
  /** Something changed that is no record: what can be undone. */
  publish(): void
  now(): number
}

const refuse = (reason: string): EditResult => ({ ok: false, index: null, reason })

/** What a person does to the document, each as one record for the outbox. */
export function createEditing(context: Context): Pick<SheetSession, 'edit' | 'undo' | 'redo'> {
  /** Does something with the document, unless this person may not or there is none. */
  function withDocument(act: (to: Editable) => EditResult): EditResult {
    const { connection, role } = context.snapshot()
    if (connection.state === 'closed') return refuse(connection.words)
    if (role === 'viewer') return refuse('You may read this budget, not change it.')
    const to = context.editable()
    return to === null ? refuse('The worksheet is being loaded; try again.') : act(to)
  }

  function keep(kind: Deed['kind'], { document, epoch, generation }: Editable, done: Undone): EditResult {
    const { update, operations, bases } = done
    const { clientID: clientId } = document.doc
    const deed = { kind, operations, bases }
    context.keep({ editId: newId(), epoch, generation, clientId, update, deed, time: context.now() })
    return { ok: true }
  }

  function edit(operations: readonly Operation[], to: Editable): EditResult {
    const applied = context.quietly(() => applyEdit(to.document.doc, operations))
    if (!applied.ok) return applied
    to.document.undo.remember(applied)
    return applied.update === null ? { ok: true } : keep('edit', to, { ...applied, update: applied.update })
  }

  function step(kind: 'undo' | 'redo', to: Editable): EditResult {
    const { undo } = to.document
    const possible = kind === 'undo' ? undo.canUndo : undo.canRedo
    const undone = context.quietly(() => undo[kind]())
    if (undone !== null) return keep(kind, to, undone)
    context.publish()
    return refuse(possible ? 'Others have changed it since; nothing was taken back.' : `There is nothing to ${kind}.`)
  }

  return {
    edit: (operations) => withDocument((to) => edit(operations, to)),
    undo: () => withDocument((to) => step('undo', to)),
    redo: () => withDocument((to) => step('redo', to)),
  }
}
