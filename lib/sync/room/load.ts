import * as Y from 'yjs'
import { GENESIS } from '../../records/journal/entry'
import type { Entry, Head, Journal, Row, Snapshot } from '../../records/journal/types'
import { verifyEntries } from '../../records/journal/verify'
import { createDoc } from '../../sheet/seed'

export type Loaded = {
  readonly doc: Y.Doc
  readonly head: Head & { readonly time: number }
  /** The newest entry that changed the budget; later ones are bindings. */
  readonly lastEdit: Entry
  /** The entry that the newest snapshot stands at; 0 without one. */
  readonly snapshotSeq: number
}
/** The journal holds the budget and it may not be served: `damaged` says why and what to do. */
export type Damaged = { readonly damaged: string }

/**
 * Makes a budget's document from its journal: snapshot and what follows, replayed in one transaction (write path, rule 8).
 * A snapshot that does not fit costs a longer replay and nothing else.
 * @returns null where the journal does not know the budget
 */
export async function loadDocument(journal: Journal, budget: string): Promise<Loaded | Damaged | null> {
  const snapshot = await journal.loadSnapshot(budget)
  if (snapshot) {
    const loaded = await loadFrom(journal, budget, snapshot)
    if (loaded && !('damaged' in loaded)) return loaded
  }
  return loadFrom(journal, budget, null)
}

async function loadFrom(journal: Journal, budget: string, snapshot: Snapshot | null): Promise<Loaded | Damaged | null> {
  const rows = await journal.rows(budget, snapshot?.seq ?? 0)
  const [newest] = await journal.latest(budget, { limit: 1 })
  if (!newest) return null
  const fault = faultOf(rows, snapshot)
  if (fault) return damaged(fault)
  const doc = createDoc()
  const trouble = replay(doc, snapshot, rows)
  if (trouble) {
    doc.destroy()
    return damaged(trouble)
  }
  const lastEdit = rows.findLast(({ entry }) => entry.kind !== 'bind')?.entry ?? (await lastEditOf(journal, budget))
  if (!lastEdit) return damaged('The journal has no entry that makes the budget.')
  const end = rows.at(-1)?.entry ?? newest
  return { doc, head: headOf(end), lastEdit, snapshotSeq: snapshot?.seq ?? 0 }
}

function faultOf(rows: readonly Row[], snapshot: Snapshot | null): string | null {
  const broken = verifyEntries(rows, snapshot ?? { seq: 0, hash: GENESIS })
  if (broken) return `The chain of entries breaks at entry ${broken.seq}: ${broken.what}.`
  const epochs = new Set(rows.map(({ entry }) => entry.epoch))
  if (epochs.size > 1) return 'The journal holds several lives of this budget, which this version cannot read.'
  return null
}

function replay(doc: Y.Doc, snapshot: Snapshot | null, rows: readonly Row[]): string | null {
  try {
    doc.transact(() => {
      if (snapshot) Y.applyUpdateV2(doc, snapshot.state)
      for (const { entry, update } of rows) if (entry.kind !== 'bind') Y.applyUpdate(doc, update)
    })
  } catch (cause) {
    return `The edits cannot be replayed: ${cause instanceof Error ? cause.message : String(cause)}.`
  }
  const { pendingStructs, pendingDs } = doc.store
  return pendingStructs || pendingDs ? 'Parts of the document are missing from the journal.' : null
}

/** The newest entry that is no binding; there is one unless the first is missing. */
async function lastEditOf(journal: Journal, budget: string): Promise<Entry | null> {
  const page = 100
  let before: number | undefined
  for (;;) {
    const entries = await journal.latest(budget, before === undefined ? { limit: page } : { before, limit: page })
    const found = entries.find(({ kind }) => kind !== 'bind')
    const last = entries.at(-1)
    if (found || !last || entries.length < page) return found ?? null
    before = last.seq
  }
}

function headOf({ epoch, seq, hash, time }: Entry): Loaded['head'] {
  return { epoch, seq, hash, time }
}

function damaged(what: string): Damaged {
  return { damaged: `${what} Restore records and journal from one backup, and keep the damaged files.` }
}
