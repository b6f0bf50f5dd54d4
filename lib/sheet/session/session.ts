import * as Y from 'yjs'
import { CLOSE } from '../closeCodes'
import { type Batch, Outbox, type OutboxRecord } from '../outbox'
import { MESSAGE } from '../wire'
import { createCellSender } from './cell'
import { CONNECTING, closed, LIVE, offline } from './connectionWords'
import { doAgain } from './doAgain'
import { createEditing } from './editing'
import { afterWelcome, helloOf } from './handshake'
import { type Link, type LinkEvents, openLink } from './link'
import { refusedEdits } from './refusedEdits'
import { NEW_EPOCH, Sender } from './sender'
import { ACKNOWLEDGED, closeDocument, isLoaded, openDocument, type SheetDocument } from './sheetDocument'
import { firstSnapshot, unsavedOf } from './snapshot'
import { createStore } from './store'
import { addToTrail } from './trail'
import type { SheetOptions, SheetSession, SheetSnapshot } from './types'

/** After so many attempts the page is older than the server (another schema), and cannot help itself. */
const MANY_RELOADS = 3

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
  /** How often in a row the server has told to reload without a welcome in between. */
  let reloads = 0
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

  let release: (() => void) | null = options.locks.hold(`halfbaud/${options.person}/${options.budget}`, () => {
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

  function letGo(): void {
    sender.active = false
    release?.()
    release = null
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
      opened: () =>
        ifOpen(({ doc, link }) => {
          const header = helloOf(options.person, outbox.meta, doc)
          link.send({ type: MESSAGE.hello, header })
        }),
      welcome: (message) =>
        ifOpen((current) => {
          const meta = afterWelcome(outbox.meta, message)
          if (meta === null) {
            renew(NEW_EPOCH)
            return
          }
          outbox.commit({ meta })
          current.welcomed = true
          reloads = 0
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
      closed(code) {
        const again = code === CLOSE.reload.code && reloads < MANY_RELOADS
        gone({ connection: again ? CONNECTING : closed(code) })
        if (again) {
          reloads++
          renew(NEW_EPOCH)
          return
        }
        // Another tab may still be able to send.
        letGo()
      },
    }
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
      letGo()
      cell.stop()
      shut()
      await outbox.close()
    },
  }
}
