import * as decoding from 'lib0/decoding'
import { messageYjsSyncStep1 } from 'y-protocols/sync'
import { messageSync, WebsocketProvider } from 'y-websocket'
import type * as Y from 'yjs'
import { shouldReconnect } from '../closeCodes'
import {
  type Acknowledged,
  decodeBody,
  encodeMessage,
  MESSAGE,
  type Message,
  type Present,
  type Refused,
  type TrailEntry,
  type Welcome,
} from '../wire'
import { quietSocket } from './quietSocket'
import type { SheetOptions } from './types'

/** What comes up from one generation's connection. Nothing comes after it was closed. */
export type LinkEvents = {
  /** The socket is open: the moment for the hello, before anything else is sent. */
  opened(): void
  welcome(welcome: Welcome): void
  /** The document holds what the server has. */
  synced(): void
  /** An update as the server sent it, that brought something new. */
  received(update: Uint8Array): void
  acknowledged(message: Acknowledged): void
  refused(message: Refused): void
  presence(people: Present[]): void
  trail(entries: TrailEntry[]): void
  /** The connection is gone and will be tried again. */
  lost(code: number | null): void
  /** The connection is gone for good. */
  closed(code: number): void
}

export type Link = {
  readonly provider: WebsocketProvider
  /** @returns false where there is no open socket */
  send(message: Message): boolean
  close(): void
}

/** Connects a document through the y-websocket provider as it is, with the messages of our own beside the protocol's. */
export function openLink(options: SheetOptions, doc: Y.Doc, events: LinkEvents): Link {
  const provider = new WebsocketProvider(options.url, options.budget, doc, {
    connect: false,
    disableBc: true,
    resyncInterval: -1,
    params: { ...options.params },
    WebSocketPolyfill: quietSocket(options.WebSocketPolyfill ?? WebSocket),
    maxBackoffTime: options.maxBackoff ?? 2500,
    shouldReconnect: (event) => shouldReconnect(event.code),
  })
  provider.awareness.setLocalState(null)
  let open = true

  // Nothing may be written to the handler's encoder: the provider would send it.
  const on = <T>(type: number, listener: (header: T) => void) => {
    provider.messageHandlers[type] = (_encoder: unknown, decoder: decoding.Decoder) => {
      // The server is this product's own; its headers are not judged again here.
      if (open) listener(decodeBody(type, decoder).header as T)
    }
  }
  on<Welcome>(MESSAGE.welcome, (header) => events.welcome(header))
  on<Acknowledged>(MESSAGE.acknowledged, (header) => events.acknowledged(header))
  on<Refused>(MESSAGE.refused, (header) => events.refused(header))
  on<Present[]>(MESSAGE.presence, (header) => events.presence(header))
  on<TrailEntry[]>(MESSAGE.trail, (header) => events.trail(header))

  // What the document tells of an update is not what the server sent: a value that lost against an unsent edit is empty there.
  let changed = false
  doc.on('update', (_update: Uint8Array, origin: unknown) => {
    if (origin === provider) changed = true
  })
  const receive = provider.messageHandlers[messageSync]
  provider.messageHandlers[messageSync] = (encoder, decoder, ...rest) => {
    const update = readUpdate(decoding.clone(decoder))
    changed = false
    receive?.(encoder, decoder, ...rest)
    if (open && changed && update !== null) events.received(update)
  }

  provider.on('status', ({ status }) => {
    if (open && status === 'connected') events.opened()
  })
  provider.on('sync', (synced) => {
    if (open && synced) events.synced()
  })
  provider.on('connection-close', (event) => {
    if (open && (event === null || shouldReconnect(event.code))) events.lost(event?.code ?? null)
  })
  provider.on('closed', ({ code }) => {
    if (open) events.closed(code)
  })
  provider.connect()

  return {
    provider,
    send(message) {
      const { ws, wsconnected } = provider
      if (!wsconnected || ws === null || ws.readyState !== ws.OPEN) return false
      ws.send(encodeMessage(message))
      return true
    },
    close() {
      open = false
      provider.destroy()
    },
  }
}

function readUpdate(decoder: decoding.Decoder): Uint8Array | null {
  return decoding.readVarUint(decoder) === messageYjsSyncStep1 ? null : decoding.readVarUint8Array(decoder)
}
