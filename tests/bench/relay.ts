import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import * as decoding from 'lib0/decoding'
import * as encoding from 'lib0/encoding'
import { type WebSocket, WebSocketServer } from 'ws'
import { readSyncMessage } from 'y-protocols/sync'
import * as Y from 'yjs'

/** The yardstick: one document in memory, every update to everybody else, nothing judged, nothing kept. */
export async function startRelay(): Promise<{ url: string; close(): Promise<void> }> {
  const doc = new Y.Doc()
  const peers = new Set<WebSocket>()
  doc.on('update', (update: Uint8Array, origin: unknown) => {
    const encoder = encoding.createEncoder()
    encoding.writeVarUint(encoder, 0)
    encoding.writeVarUint(encoder, 2)
    encoding.writeVarUint8Array(encoder, update)
    const frame = encoding.toUint8Array(encoder)
    for (const peer of peers) if (peer !== origin) peer.send(frame)
  })
  const http = createServer()
  const sockets = new WebSocketServer({ server: http })
  sockets.on('connection', (socket) => {
    peers.add(socket)
    socket.on('close', () => peers.delete(socket))
    socket.on('message', (data: Buffer) => {
      const decoder = decoding.createDecoder(data)
      if (decoding.readVarUint(decoder) !== 0) return
      const encoder = encoding.createEncoder()
      encoding.writeVarUint(encoder, 0)
      readSyncMessage(decoder, encoder, doc, socket)
      if (encoding.length(encoder) > 1) socket.send(encoding.toUint8Array(encoder))
    })
  })
  await new Promise<void>((done) => http.listen(0, '127.0.0.1', done))
  return {
    url: `ws://127.0.0.1:${(http.address() as AddressInfo).port}`,
    close: async () => {
      for (const peer of peers) peer.terminate()
      sockets.close()
      await new Promise((done) => http.close(done))
    },
  }
}
