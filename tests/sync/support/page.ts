import { randomInt } from 'node:crypto'
import * as decoding from 'lib0/decoding'
import * as encoding from 'lib0/encoding'
import { afterEach } from 'vitest'
import { WebSocket } from 'ws'
import * as Y from 'yjs'
import {
  type Acknowledged,
  encodeMessage,
  type Hello,
  MESSAGE,
  type Present,
  type Refused,
  type TrailEntry,
  type Welcome,
} from '../../../lib/sheet/wire'
import { type Name, PEOPLE } from './sessions'
import { editOf } from './sheet'
import { PUBLIC_URL } from './world'

export type Received =
  | { type: 'sync'; step: number; bytes: Uint8Array }
  | { type: 'acknowledged'; header: Acknowledged }
  | { type: 'refused'; header: Refused }
  | { type: 'welcome'; header: Welcome }
  | { type: 'presence'; header: Present[] }
  | { type: 'trail'; header: TrailEntry[] }
  | { type: 'other'; number: number }

export type Closed = { code: number; reason: string }
type Answer = Acknowledged | Refused

/** Sockets that a test has left open; what is closed is not kept, so that the heap can be watched. */
const open = new Set<WebSocket>()
afterEach(() => {
  for (const socket of open) socket.terminate()
})

/** One end of a socket, with frames made by hand: no client code of ours. */
export class Page {
  readonly received: Received[] = []
  readonly doc: Y.Doc
  readonly closed: Promise<Closed>
  epoch = 1
  private readonly watchers = new Set<() => void>()
  private edits = 0
  private ending: Closed | null = null

  constructor(
    readonly socket: WebSocket,
    readonly clientId: number,
  ) {
    this.doc = new Y.Doc()
    this.doc.clientID = clientId
    socket.on('message', (data: Buffer) => this.take(new Uint8Array(data)))
    socket.on('error', () => undefined)
    this.closed = new Promise((resolve) => {
      socket.once('close', (code, reason) => {
        this.ending = { code, reason: String(reason) }
        this.notify()
        resolve(this.ending)
      })
    })
    open.add(socket)
    socket.once('close', () => open.delete(socket))
  }

  /** Opens a socket and says nothing. */
  static async dial(url: string, options: { headers?: Record<string, string>; origin?: string; clientId?: number }) {
    const socket = new WebSocket(url, {
      headers: options.headers ?? {},
      ...(options.origin ? { origin: options.origin } : {}),
    })
    const page = new Page(socket, options.clientId ?? randomInt(1_000, 2 ** 32 - 1))
    await new Promise((resolve, reject) => socket.once('open', resolve).once('error', reject))
    return page
  }

  /** Opens a worksheet as a browser does: cookie, Origin, hello, SyncStep1; resolves when the document is here. */
  static async open(world: { url: string }, budget: string, name: Name, hello: Partial<Hello> = {}, clientId?: number) {
    const page = await Page.dial(`${world.url}${budget}`, {
      headers: { cookie: `session=${name}` },
      origin: PUBLIC_URL,
      ...(clientId === undefined ? {} : { clientId }),
    })
    page.hello(name, hello)
    page.askForDocument()
    await page.until((one) => one.type === 'sync' && one.step === 1)
    return page
  }

  hello(name: Name, other: Partial<Hello> = {}): void {
    const header: Hello = {
      person: PEOPLE[name].person,
      epoch: null,
      clientId: this.clientId,
      seq: 0,
      head: null,
      schemaVersion: 1,
      ...other,
    }
    this.send(encodeMessage({ type: MESSAGE.hello, header }))
  }

  askForDocument(): void {
    this.send(syncFrame(0, Y.encodeStateVector(this.doc)))
  }

  send(frame: Uint8Array): void {
    this.socket.send(frame)
  }

  /** Sends an update under an edit id; the answer is awaited apart. */
  sendEdit(update: Uint8Array, editId = this.nextEditId(), header: { epoch?: number; clientId?: number } = {}): string {
    const whole = { editId, epoch: this.epoch, clientId: this.clientId, ...header }
    this.send(encodeMessage({ type: MESSAGE.edit, header: whole, update }))
    return editId
  }

  /** Changes this page's own copy in one transaction and sends it. */
  edit(change: (doc: Y.Doc) => void): string {
    return this.sendEdit(editOf(this.doc, change))
  }

  answer(editId: string): Promise<Answer> {
    const isIt = (one: Received) =>
      (one.type === 'acknowledged' || one.type === 'refused') && one.header.editId === editId
    return this.until(isIt).then((one) => (one as { header: Answer }).header)
  }

  /** Resolves when the server has dealt with everything that was sent before. */
  async asked(): Promise<void> {
    const documents = () => this.all('sync').filter(({ step }) => step === 1).length
    const before = documents()
    this.askForDocument()
    await this.until(() => documents() > before)
  }

  /** Resolves when the server has received what was sent, or has closed the socket. */
  async heard(): Promise<void> {
    const ponged = new Promise((resolve) => this.socket.once('pong', resolve))
    if (this.socket.readyState === this.socket.OPEN) this.socket.ping()
    await Promise.race([ponged, this.closed])
  }

  /** Everything of a kind that has come so far. */
  all<T extends Received['type']>(type: T): Extract<Received, { type: T }>[] {
    return this.received.filter((one): one is Extract<Received, { type: T }> => one.type === type)
  }

  /** The first message that is like this, whether it has come or will. */
  until(isIt: (one: Received) => boolean): Promise<Received> {
    return this.when(() => this.received.find(isIt))
  }

  /** Resolves when this page's copy is as wanted. */
  sees(look: (doc: Y.Doc) => boolean): Promise<unknown> {
    return this.when(() => (look(this.doc) ? true : undefined))
  }

  private when<T>(find: () => T | undefined): Promise<T> {
    return new Promise((resolve, reject) => {
      const check = () => {
        const found = find()
        if (found !== undefined) {
          this.watchers.delete(check)
          resolve(found)
        } else if (this.ending) {
          reject(new Error(`The socket was closed first: ${this.ending.code} ${this.ending.reason}`))
        }
      }
      this.watchers.add(check)
      check()
    })
  }

  private nextEditId(): string {
    this.edits++
    return `edit-${this.clientId}-${this.edits}`
  }

  private take(frame: Uint8Array): void {
    this.received.push(this.read(frame))
    this.notify()
  }

  private read(frame: Uint8Array): Received {
    const decoder = decoding.createDecoder(frame)
    const number = decoding.readVarUint(decoder)
    if (number === 0) {
      const step = decoding.readVarUint(decoder)
      const bytes = decoding.readVarUint8Array(decoder)
      if (step > 0) Y.applyUpdate(this.doc, bytes, 'server')
      return { type: 'sync', step, bytes }
    }
    const name = NAMES[number]
    if (!name) return { type: 'other', number }
    const header = JSON.parse(decoding.readVarString(decoder))
    if (name === 'welcome') this.epoch = header.epoch
    return { type: name, header } as Received
  }

  private notify(): void {
    for (const watcher of [...this.watchers]) watcher()
  }
}

export function syncFrame(step: number, bytes: Uint8Array): Uint8Array {
  const encoder = encoding.createEncoder()
  encoding.writeVarUint(encoder, 0)
  encoding.writeVarUint(encoder, step)
  encoding.writeVarUint8Array(encoder, bytes)
  return encoding.toUint8Array(encoder)
}

const NAMES: Record<number, 'acknowledged' | 'refused' | 'welcome' | 'presence' | 'trail'> = {
  [MESSAGE.acknowledged]: 'acknowledged',
  [MESSAGE.refused]: 'refused',
  [MESSAGE.welcome]: 'welcome',
  [MESSAGE.presence]: 'presence',
  [MESSAGE.trail]: 'trail',
}
