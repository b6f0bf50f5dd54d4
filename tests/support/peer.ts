import * as decoding from 'lib0/decoding'
import * as encoding from 'lib0/encoding'
import { WebSocket } from 'ws'
import { readSyncMessage, writeSyncStep1 } from 'y-protocols/sync'
import * as Y from 'yjs'
import { SCHEMA_VERSION } from '../../lib/budget/schema'
import { type Acknowledged, encodeMessage, MESSAGE, type Refused } from '../../lib/sheet/wire'

export type PeerOptions = {
  readonly url: string
  readonly headers?: Record<string, string>
  /** Null: a bare relay, which takes y-websocket's own frames; else the person that the hello names. */
  readonly person: string | null
  readonly onAcknowledged?: (acknowledged: Acknowledged) => void
  readonly onRefused?: (refused: Refused) => void
}

export type Peer = {
  readonly doc: Y.Doc
  /** Edit ids that were sent and have not been answered. */
  readonly waiting: ReadonlySet<string>
  readonly closed: Promise<number>
  close(): void
}

/** One end of a server, as small as it can be and with no client code of ours, so that only the servers differ. */
export async function connectPeer(options: PeerOptions): Promise<Peer> {
  const doc = new Y.Doc()
  const socket = new WebSocket(options.url, { headers: options.headers ?? {} })
  const waiting = new Set<string>()
  let edits = 0
  let epoch = 1
  const closed = new Promise<number>((resolve) => socket.once('close', resolve))
  const synced = new Promise<void>((resolve, reject) => {
    socket.once('close', (code) =>
      reject(new Error(`The server closed the socket with ${code} before the document came.`)),
    )
    socket.on('message', (data: Buffer) => {
      const decoder = decoding.createDecoder(data)
      const type = decoding.readVarUint(decoder)
      if (type === 0) {
        if (readSyncMessage(decoder, encoding.createEncoder(), doc, socket) === 1) resolve()
        return
      }
      if (type < MESSAGE.edit) return
      const header = JSON.parse(decoding.readVarString(decoder))
      if (type === MESSAGE.welcome) epoch = header.epoch
      if (type === MESSAGE.acknowledged || type === MESSAGE.refused) waiting.delete(header.editId)
      if (type === MESSAGE.acknowledged) options.onAcknowledged?.(header)
      if (type === MESSAGE.refused) {
        if (!options.onRefused) throw new Error(`Refused: ${JSON.stringify(header)}`)
        options.onRefused(header)
      }
    })
  })
  synced.catch(() => undefined)
  await new Promise((resolve, reject) => socket.once('open', resolve).once('error', reject))
  socket.on('error', () => undefined)
  if (options.person !== null) {
    const header = {
      person: options.person,
      epoch: null,
      clientId: doc.clientID,
      seq: 0,
      head: null,
      schemaVersion: SCHEMA_VERSION,
    }
    socket.send(encodeMessage({ type: MESSAGE.hello, header }))
  }
  socket.send(syncFrame((encoder) => writeSyncStep1(encoder, doc)))
  await synced

  doc.on('update', (update: Uint8Array, origin: unknown) => {
    if (origin === socket || socket.readyState !== WebSocket.OPEN) return
    if (options.person === null) {
      socket.send(
        syncFrame((encoder) => {
          encoding.writeVarUint(encoder, 2)
          encoding.writeVarUint8Array(encoder, update)
        }),
      )
      return
    }
    edits += 1
    const header = { editId: `${doc.clientID}-${edits}`, epoch, clientId: doc.clientID }
    waiting.add(header.editId)
    socket.send(encodeMessage({ type: MESSAGE.edit, header, update }))
  })
  return { doc, waiting, closed, close: () => socket.terminate() }
}

function syncFrame(write: (encoder: encoding.Encoder) => void): Uint8Array {
  const encoder = encoding.createEncoder()
  encoding.writeVarUint(encoder, 0)
  write(encoder)
  return encoding.toUint8Array(encoder)
}
