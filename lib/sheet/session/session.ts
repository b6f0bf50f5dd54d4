import * as Y from 'yjs'
import { SCHEMA_VERSION } from '../../budget/schema'
import { CLOSE } from '../closeCodes'
import { type Batch, Outbox, type OutboxRecord } from '../outbox'
import { MESSAGE, type Welcome } from '../wire'
import { createCellSender } from './cell'
import { CONNECTING, closed, LIVE, offline } from './connectionWords'
import { doAgain } from './doAgain'
import { createEditing } from './editing'
import { type Link, type LinkEvents, openLink } from './link'
import { refusedEdits } from './refusedEdits'
import { NEW_EPOCH, Sender } from './sender'
import { ACKNOWLEDGED, closeDocument, isLoaded, openDocument, type SheetDocument } from './sheetDocument'
import { firstSnapshot, unsavedOf } from './snapshot'
import { createStore } from './store'
import { addToTrail } from './trail'
import type { SheetOptions, SheetSession, SheetSnapshot } from './types'

/** One generation: a document and its connection, thrown away together. */
type Open = SheetDocument & {
  readonly generation: number
  readonly link: Link
  welcomed: boolean
  synced: boolean
}

/**
 * Opens a budget for a person in this tab: loads what the browser keeps, then connects. Lives outside React; a screen
 * subscribes to it. After a refusal and in a new epoch it makes a new document by itself, and does again what still fits.
 */
export function openSheet(options: SheetOptions): SheetSession {
  const now = options.now ?? Date.now
  const store = createStore<SheetSnapshot>(firstSnapshot(options))
  let open: Open | null = null
  /** The generation that is open or being opened. */
  let target: number | null = null
  let destroyed = false
  let quiet = false
  let shownRecords: readonly OutboxRecord[] = []

  const outbox = new Outbox(options.storage, outboxChanged)
  const sender = new Sender(outbox, {
    send({ editId, epoch, clientId, update }) {
      return open?.link.send({ type: MESSAGE.edit, header: { editId, epoch, clientId }, update }) ?? false
    },
    accepted({ generation, update }) {
      // Another tab's edit is not sent to the connection that brought it.
      if (open?.generation === generation) Y.applyUpdate(open.doc, update, ACKNOWLEDGED)
    },
    renew,
    now,
  })
  const cell = createCellSender((header) => open?.link.send({ type: MESSAGE.cell, header }))
  const editing = createEditing({
    snapshot: store.get,
    editable() {
      const { epoch } = outbox.meta
      return open === null || epoch === null || !isLoaded(open.doc)
        ? null
        : { document: open, epoch, generation: open.generation }
    },
    quietly,
    keep(record) {
      outbox.commit({ add: [record] })
      publish()
    },
    publish,
    now,
  })
  const showRefused = refusedEdits({ edit: editing.edit, dismiss: (editId) => outbox.commit({ dismiss: [editId] }) })

  const release = options.locks.hold(`halfbaud/${options.person}/${options.budget}`, () => {
    sender.active = true
    doStaleAgain()
    sender.pump()
  })
  void outbox.look()

  function outboxChanged(): void {
    if (destroyed) return
    const { meta, records } = outbox
    store.patch({
      role: meta.role,
      lastAcknowledged: meta.acknowledged,
      refused: showRefused(outbox.refused),
      fault: outbox.fault,
      ...(records === shownRecords ? {} : unsavedOf(records)),
    })
    shownRecords = records
    if (meta.generation !== target) void reopen()
    sender.pump()
  }

  function renew(batch: Batch): void {
    const { generation } = outbox.meta
    outbox.commit({ ...batch, ifGeneration: generation, meta: { ...batch.meta, generation: generation + 1 } })
  }

  async function reopen(): Promise<void> {
    const { generation } = outbox.meta
    target = generation
    shut()
    await outbox.settled()
    const document = await openDocument(options.storage, () => outbox.records.filter((each) => !isStale(each)))
    if (destroyed || target !== generation) {
      closeDocument(document)
      return
    }
    const { doc } = document
    const link = openLink(options, doc, eventsOf(generation))
    open = { ...document, generation, link, welcomed: false, synced: false }
    doc.on('afterAllTransactions', publish)
    publish()
    doStaleAgain()
  }

  function shut(): void {
    sender.disconnected()
    if (open === null) return
    const closing = open
    open = null
    closing.link.close()
    closeDocument(closing)
  }

  /** An edit is several transactions; nobody may look, or edit, in between. */
  function quietly<T>(change: () => T): T {
    quiet = true
    try {
      return change()
    } finally {
      quiet = false
    }
  }

  function publish(): void {
    if (quiet || open === null || !isLoaded(open.doc)) return
    try {
      open.mirror.take()
    } catch (error) {
      store.patch({ fault: `The worksheet cannot be shown; reload the page. ${String(error)}` })
    }
    const { generation, mirror, undo } = open
    store.patch({ generation, budget: mirror.json, canUndo: undo.canUndo, canRedo: undo.canRedo })
  }

  function eventsOf(generation: number): LinkEvents {
    const ifOpen = (act: (current: Open) => void) => {
      if (open?.generation === generation) act(open)
    }
    const live = () =>
      ifOpen((current) => {
        if (!current.welcomed || !current.synced) return
        store.patch({ connection: LIVE })
        doStaleAgain()
        sender.connected()
        cell.repeat()
      })
    const gone = (patch: Partial<SheetSnapshot>) => {
      sender.disconnected()
      ifOpen((current) => {
        current.welcomed = false
        current.synced = false
      })
      store.patch({ ...patch, people: [] })
    }
    return {
      opened: () => ifOpen(hello),
      welcome: (message) =>
        ifOpen((current) => {
          if (!takeWelcome(message)) return
          current.welcomed = true
          live()
        }),
      synced: () =>
        ifOpen((current) => {
          current.synced = true
          live()
        }),
      received(update) {
        if (sender.active) outbox.commit({ ifGeneration: generation, updates: [update] })
      },
      acknowledged: (message) => sender.acknowledged(message),
      refused: (message) => sender.refused(message),
      presence: (people) => store.patch({ people }),
      trail: (entries) => store.patch({ trail: addToTrail(store.get().trail, entries) }),
      lost: (code) => gone({ connection: offline(code) }),
      closed: (code) => {
        // Told to reload before it knew any epoch, this page is older than the server: it cannot help itself.
        const newEpoch = code === CLOSE.reload.code && outbox.meta.epoch !== null
        gone({ connection: newEpoch ? CONNECTING : closed(code) })
        if (newEpoch) renew(NEW_EPOCH)
      },
    }
  }

  function hello(current: Open): void {
    const { epoch, seq, head } = outbox.meta
    // Yjs may change a document's client id: it is read now and not kept.
    const { clientID: clientId } = current.doc
    const header = { person: options.person, epoch, clientId, seq, head, schemaVersion: SCHEMA_VERSION }
    current.link.send({ type: MESSAGE.hello, header })
  }

  /** @returns false if the welcome is for another epoch than the document's */
  function takeWelcome({ epoch, role, seq, head }: Welcome): boolean {
    const { meta } = outbox
    if (meta.epoch !== null && meta.epoch !== epoch) {
      renew(NEW_EPOCH)
      return false
    }
    outbox.commit({ meta: seq > meta.seq ? { epoch, role, seq, head } : { epoch, role } })
    return true
  }

  /** Records of an older document, or made by another tab before it noticed, are done again in this one. */
  function doStaleAgain(): void {
    const { epoch, generation } = outbox.meta
    if (open === null || !sender.active || epoch === null || open.generation !== generation) return
    if (!isLoaded(open.doc)) return
    const document = open
    for (const record of outbox.records.filter(isStale)) {
      if (record.epoch !== epoch && !document.synced) return
      outbox.commit(quietly(() => doAgain(record, document, { epoch, generation })))
    }
    publish()
  }

  function isStale(record: OutboxRecord): boolean {
    return record.epoch !== outbox.meta.epoch || record.generation !== outbox.meta.generation
  }

  return {
    subscribe: store.subscribe,
    getSnapshot: store.get,
    ...editing,
    setCell: (next) => cell.set(next),
    settled: () => outbox.settled(),
    async destroy() {
      if (destroyed) return
      destroyed = true
      release()
      cell.stop()
      shut()
      await outbox.close()
    },
  }
}
