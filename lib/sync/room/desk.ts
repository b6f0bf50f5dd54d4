import { createHash } from 'node:crypto'
import * as Y from 'yjs'
import type { Operation } from '../../sheet/change'
import { applyEdit } from '../../sheet/edits'
import { createDoc } from '../../sheet/seed'
import type { Refusal } from '../gate/refusal'
import { NO_UPDATE } from './queued'

/**
 * Where edits by submit() are made: a document that follows everything accepted, written under one client id per person,
 * whose clock therefore goes on. Made when it is first needed, let go when the shadow goes back.
 */
export class Desk {
  private doc: Y.Doc | null = null

  /** @param state the shadow's state, to begin from */
  constructor(private readonly state: () => Uint8Array) {}

  /** @returns the update that the operations make, not yet gated */
  draft(operations: readonly Operation[], clientId: number): Uint8Array | Refusal {
    const doc = this.open()
    const own = doc.clientID
    doc.clientID = clientId
    try {
      const edit = applyEdit(doc, operations)
      if (edit.ok) return edit.update ?? NO_UPDATE
      return { code: 'bad-value', reason: `Operation ${edit.index + 1}: ${edit.reason}` }
    } finally {
      doc.clientID = own
    }
  }

  follow(update: Uint8Array): void {
    if (this.doc) Y.applyUpdate(this.doc, update)
  }

  /** What was accepted after some edit does not stand any more, or a draft was refused. */
  drop(): void {
    this.doc?.destroy()
    this.doc = null
  }

  private open(): Y.Doc {
    if (this.doc) return this.doc
    this.doc = createDoc()
    Y.applyUpdate(this.doc, this.state())
    return this.doc
  }
}

/**
 * The client id of a person's edits by submit() in a budget: the first of a fixed sequence that the person may use. It is the
 * same after a restart because its binding stands in the journal.
 */
export function submitClientId(budget: string, person: string, mayUse: (clientId: number) => boolean): number {
  for (let attempt = 0; ; attempt++) {
    const digest = createHash('sha256')
      .update(JSON.stringify(['submit', budget, person, attempt]))
      .digest()
    const clientId = digest.readUInt32BE(0)
    if (mayUse(clientId)) return clientId
  }
}
