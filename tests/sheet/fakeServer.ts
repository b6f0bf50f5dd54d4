import { EventEmitter, once } from 'node:events'
import type { AddressInfo } from 'node:net'
import * as decoding from 'lib0/decoding'
import * as encoding from 'lib0/encoding'
import { WebSocket, WebSocketServer } from 'ws'
import * as sync from 'y-protocols/sync'
import * as Y from 'yjs'
import { CLOSE } from '../../lib/sheet/closeCodes'
import {
  decodeBody,
  type EditHeader,
  encodeMessage,
  type Hello,
  MESSAGE,
  type Message,
  type Refused,
  type Role,
  type TrailEntry,
} from '../../lib/sheet/wire'
import { docOf } from './sample'

export type Sent = { readonly header: EditHeader; readonly update: Uint8Array; readonly count: number }
type Verdict = Omit<Refused, 'editId'> | 'cut before' | 'cut after' | null

/**
 * A server for the client's tests: it speaks the wire, keeps accepted edits in order, finds gaps with Yjs itself, and
 * otherwise does what its script says. It is not the product's server and shares no code with it.
 */
export class FakeServer {
  doc: Y.Doc
  epoch = 1
  role: Role = 'editor'
  readonly accepted: { editId: string; update: Uint8Array }[] = []
  readonly refusals: Refused[] = []
  readonly hellos: Hello[] = []
  readonly cells = new EventEmitter()
  /** Type and sync type of every frame that is not one of ours. */
  readonly protocolFrames: string[] = []
  connections = 0
  /** Answers every hello with 'reload'. */
  neverWelcome = false
  /** What to do with an edit: refuse it, cut the connection before it is kept or in place of its acknowledgement. */
  script: (sent: Sent) => Verdict = () => null

  private readonly sockets = new Map<WebSocket, { ready: boolean }>()
  private received = 0

  private constructor(
    private readonly server: WebSocketServer,
    seed: Uint8Array,
  ) {
    this.doc = docOf(seed)
    server.on('connection', (socket) => this.connect(socket))
  }

  static async start(seed: Uint8Array): Promise<FakeServer> {
    const server = new WebSocketServer({ port: 0, host: '127.0.0.1' })
    await once(server, 'listening')
    return new FakeServer(server, seed)
  }

  get url(): string {
    return `ws://127.0.0.1:${(this.server.address() as AddressInfo).port}`
  }

  /** A person with a proper connection elsewhere makes an edit. */
  editElsewhere(update: Uint8Array): void {
    Y.applyUpdate(this.doc, update)
    this.fanOut(update, null)
  }

  tell(entries: TrailEntry[]): void {
    for (const socket of this.sockets.keys()) this.send(socket, { type: MESSAGE.trail, header: entries })
  }

  /** The same content under a new epoch, as after a restore. */
  renewEpoch(seed: Uint8Array): void {
    this.epoch++
    this.doc = docOf(seed)
    for (const socket of this.sockets.keys()) socket.close(CLOSE.reload.code)
  }

  closeAll(code: number): void {
    for (const socket of this.sockets.keys()) socket.close(code)
  }

  closeFirst(code: number): void {
    const [socket] = this.sockets.keys()
    socket?.close(code)
  }

  cutAll(): void {
    for (const socket of this.sockets.keys()) socket.terminate()
  }

  async stop(): Promise<void> {
    this.cutAll()
    this.server.close()
    await once(this.server, 'close')
  }

  private connect(socket: WebSocket): void {
    this.connections++
    this.sockets.set(socket, { ready: false })
    socket.on('close', () => this.sockets.delete(socket))
    socket.on('message', (data: Buffer) => this.receive(socket, new Uint8Array(data)))
  }

  private receive(socket: WebSocket, frame: Uint8Array): void {
    const state = this.sockets.get(socket)
    if (!state) return
    const decoder = decoding.createDecoder(frame)
    const type = decoding.readVarUint(decoder)
    if (type === MESSAGE.hello) {
      this.hello(socket, state, decodeBody(type, decoder).header as Hello)
    } else if (!state.ready) {
      throw new Error(`A frame of type ${type} came before the hello.`)
    } else if (type === MESSAGE.edit) {
      const { header, update } = decodeBody(type, decoder)
      this.edit(socket, { header: header as EditHeader, update: update ?? new Uint8Array(), count: ++this.received })
    } else if (type === MESSAGE.cell) {
      this.cells.emit('cell', decodeBody(type, decoder).header)
    } else {
      this.protocolFrames.push(`${frame[0]},${frame[1]}`)
      if (type !== 0 || decoding.readVarUint(decoder) !== sync.messageYjsSyncStep1) return
      const encoder = encoding.createEncoder()
      encoding.writeVarUint(encoder, 0)
      sync.readSyncStep1(decoder, encoder, this.doc)
      socket.send(encoding.toUint8Array(encoder))
    }
  }

  private hello(socket: WebSocket, state: { ready: boolean }, hello: Hello): void {
    this.hellos.push(hello)
    if (this.neverWelcome || (hello.epoch !== null && hello.epoch !== this.epoch)) {
      // What is on its way already is not an offence.
      this.sockets.delete(socket)
      socket.close(CLOSE.reload.code)
      return
    }
    state.ready = true
    const seq = this.accepted.length
    const welcome = { person: hello.person, name: 'A', role: this.role, epoch: this.epoch, seq, head: `h${seq}` }
    this.send(socket, { type: MESSAGE.welcome, header: welcome })
    const me = { connection: 'c', person: hello.person, name: 'A', initials: 'A', colour: 0, cell: null, me: true }
    this.send(socket, { type: MESSAGE.presence, header: [me] })
  }

  private edit(socket: WebSocket, sent: Sent): void {
    const { editId } = sent.header
    const known = this.accepted.findIndex((each) => each.editId === editId)
    const verdict = known >= 0 ? null : (this.judge(sent) ?? this.script(sent))
    if (verdict === 'cut before') {
      socket.terminate()
      return
    }
    if (verdict !== null && verdict !== 'cut after') {
      const refused = { ...verdict, editId }
      this.refusals.push(refused)
      this.send(socket, { type: MESSAGE.refused, header: refused })
      return
    }
    if (known < 0) {
      this.accepted.push({ editId, update: sent.update })
      Y.applyUpdate(this.doc, sent.update)
      this.fanOut(sent.update, socket)
    }
    if (verdict === 'cut after') {
      socket.terminate()
      return
    }
    const seq = known >= 0 ? known + 1 : this.accepted.length
    this.send(socket, { type: MESSAGE.acknowledged, header: { editId, seq, head: `h${seq}` } })
  }

  private judge({ header, update }: Sent): Verdict {
    if (header.epoch !== this.epoch) return { code: 'epoch', reason: 'Another epoch.' }
    const trial = docOf(Y.encodeStateAsUpdate(this.doc))
    Y.applyUpdate(trial, update)
    const [first] = trial.store.pendingStructs?.missing ?? []
    if (first) return { code: 'gap', reason: 'Something is missing.', missing: { clientId: first[0], clock: first[1] } }
    return null
  }

  private fanOut(update: Uint8Array, except: WebSocket | null): void {
    const encoder = encoding.createEncoder()
    encoding.writeVarUint(encoder, 0)
    sync.writeUpdate(encoder, update)
    for (const [socket, { ready }] of this.sockets)
      if (socket !== except && ready) socket.send(encoding.toUint8Array(encoder))
  }

  private send(socket: WebSocket, message: Message): void {
    if (socket.readyState === WebSocket.OPEN) socket.send(encodeMessage(message))
  }
}
