import { randomUUID } from 'node:crypto'
import type { WebSocket } from 'ws'
import type { Identity } from '../../access/identity'
import type { Sessions } from '../../access/service'
import type { Journal } from '../../records/journal/types'
import { CLOSE } from '../../sheet/closeCodes'
import { type Cell, type EditHeader, encodeMessage, type Hello, MESSAGE, type Role } from '../../sheet/wire'
import type { Cancel, Clock, Log } from '../clock'
import { type CloseReason, FAULT } from '../closing'
import { Ration } from '../ration'
import { keyOfUpdate } from '../room/editKey'
import type { Peer } from '../room/peers'
import type { Actor, Answer } from '../room/queued'
import type { Room } from '../room/room'
import type { Rooms } from '../rooms'
import { readable, type Said, syncStep2 } from './frames'
import { doorOf, judgeHello, readHello } from './hello'
import { Inbox } from './inbox'
import { Patience } from './patience'
import { Wire } from './wire'

export type ConnectionDeps = {
  readonly rooms: Rooms
  readonly sessions: Sessions
  readonly journal: Pick<Journal, 'entries'>
  readonly clock: Clock
  readonly log: Log
}

/** From the opening of the socket; nothing that arrives makes it longer. Milliseconds. */
const HELLO_WITHIN = 10_000
/** What may come from somebody who has not been let in, and from somebody who has and is waited for. */
const BEFORE_HELLO = { count: 16, bytes: 64 * 1024 }
const ONCE_SAID = { count: 2_000, bytes: 16 * 1024 * 1024 }
/** Frames that may wait before the other end is held up. */
const HOLD_UP = 200
/** Whole documents per minute, cells per second. */
const DOCUMENTS = 20
const CELLS = 10

/** One socket: opening until its hello is judged, then one of its room's peers. */
export class Connection implements Peer {
  readonly id = randomUUID()
  cell: Cell | null = null
  following = false
  private room: Room | null = null
  private actor: Actor | null = null
  private said: Hello | null = null
  private isReading = false
  private isEnded = false
  private isHalted = false
  private readonly inbox = new Inbox()
  private readonly wire: Wire
  private readonly patience: Patience
  private readonly documents: Ration
  private readonly cells: Ration
  private readonly stopWaiting: Cancel

  /** @param who finds out whose session or token the request came with; null where it is nobody's */
  constructor(
    private readonly socket: WebSocket,
    private readonly budget: string,
    who: () => Promise<Identity | { close: CloseReason }>,
    private readonly deps: ConnectionDeps,
  ) {
    const { clock } = deps
    this.wire = new Wire(socket, clock)
    this.patience = new Patience(clock.now)
    this.documents = new Ration(DOCUMENTS, 60_000, clock.now)
    this.cells = new Ration(CELLS, 1_000, clock.now)
    this.stopWaiting = clock.after(HELLO_WITHIN, () => this.close(CLOSE.slowHello))
    socket.on('message', (data, isBinary) => this.take(data, isBinary))
    socket.once('close', () => this.end())
    void this.guarded(() => this.identify(who))
  }

  get identity(): Identity {
    if (!this.actor) throw new Error('A connection has an identity when it has joined its room.')
    return this.actor.identity
  }

  send(frame: Uint8Array): void {
    this.wire.send(frame)
  }

  close(reason: CloseReason): void {
    this.wire.close(reason)
    this.end()
  }

  /** Reads no more; what was accepted is still answered. */
  pause(): void {
    this.isHalted = true
    this.inbox.clear()
    this.socket.pause()
  }

  roleChanged(role: Role): void {
    this.welcome(role)
  }

  private end(): void {
    if (this.isEnded) return
    this.isEnded = true
    this.stopWaiting()
    this.inbox.clear()
    this.room?.peers.remove(this)
    this.room = null
  }

  private async identify(who: () => Promise<Identity | { close: CloseReason }>): Promise<void> {
    const identity = await who()
    if ('close' in identity) {
      this.close(identity.close)
      return
    }
    this.actor = { identity, door: doorOf(identity) }
    await this.join()
  }

  private async guarded(step: () => Promise<void>): Promise<void> {
    try {
      await step()
    } catch (cause) {
      this.deps.log('Somebody could not be let in', cause)
      this.close(CLOSE.notReady)
    }
  }

  private take(data: unknown, isBinary: boolean): void {
    if (this.isEnded || this.isHalted) return
    if (!isBinary || !(data instanceof Buffer)) {
      this.close(FAULT.text)
      return
    }
    const frame = new Uint8Array(data.buffer, data.byteOffset, data.byteLength)
    if (!this.inbox.put(frame, this.said ? ONCE_SAID : BEFORE_HELLO)) {
      this.close(FAULT.flood)
      return
    }
    if (this.room === null && this.said === null) this.lookForHello(frame)
    if (this.inbox.count > HOLD_UP) this.socket.pause()
    void this.read()
  }

  private lookForHello(frame: Uint8Array): void {
    const message = readable(frame)
    if (message?.is === 'hello') {
      this.said = readHello(message.header)
      this.stopWaiting()
      if (this.said) void this.guarded(() => this.join())
    }
    if (message === null || (message.is === 'hello' && !this.said)) this.close(FAULT.unreadable)
  }

  /** Goes in when it is known who it is and what was said, whichever comes last. */
  private async join(): Promise<void> {
    const { actor, said } = this
    if (!actor || !said || this.isEnded) return
    const { rooms, journal, sessions } = this.deps
    const admitted = await judgeHello(said, actor, this.budget, rooms, journal)
    if (this.isEnded) return
    if ('close' in admitted) {
      this.close(admitted.close)
      return
    }
    // Signed out while the budget was loaded: nobody knew of this connection then.
    if (!sessions.valid(actor.identity)) {
      this.close(CLOSE.signInAgain)
      return
    }
    this.room = admitted.room
    this.welcome(admitted.role)
    this.room.peers.add(this)
    await this.read()
  }

  private welcome(role: Role): void {
    if (!this.room) return
    const { person, name } = this.identity
    const { epoch, seq, hash } = this.room.state.head
    const header = { person, name, role, epoch, seq, head: hash }
    this.send(encodeMessage({ type: MESSAGE.welcome, header }))
  }

  /** Reads what has come, one frame after the other. */
  private async read(): Promise<void> {
    if (this.isReading || !this.room) return
    this.isReading = true
    try {
      for (let frame = this.inbox.next(); frame && this.room; frame = this.inbox.next()) {
        const said = readable(frame)
        if (said) await this.hear(said, this.room)
        else this.close(FAULT.unreadable)
        if (this.inbox.count === 0 && !this.isHalted) this.socket.resume()
      }
    } catch (cause) {
      this.deps.log('A message could not be dealt with', cause)
      this.close(CLOSE.notReady)
    } finally {
      this.isReading = false
    }
  }

  private async hear(said: Said, room: Room): Promise<void> {
    if (said.is === 'edit') await this.edit(said.header, said.update, room)
    else if (said.is === 'bad edit') this.answer({ editId: said.editId, ...UNREADABLE }, -1)
    else if (said.is === 'asks') this.sendDocument(said.stateVector, room)
    else if (said.is === 'cell' && this.cells.spend('')) {
      this.cell = said.cell
      room.peers.presenceChanged()
    }
  }

  private async edit({ editId, epoch, clientId }: EditHeader, update: Uint8Array, room: Room): Promise<void> {
    const { actor } = this
    if (!actor) return
    const incoming = { actor, from: this.id, epoch, key: keyOfUpdate(editId, update), clientId, update }
    await room.receive(incoming, (answer) => this.answer(answer, clientId))
  }

  private answer(answer: Answer, clientId: number): void {
    if ('seq' in answer) this.send(encodeMessage({ type: MESSAGE.acknowledged, header: answer }))
    else this.send(encodeMessage({ type: MESSAGE.refused, header: answer }))
    if (!this.patience.after(answer, clientId)) this.close(CLOSE.refused)
  }

  private sendDocument(stateVector: Uint8Array, room: Room): void {
    if (!this.documents.spend('')) {
      this.close(FAULT.flood)
      return
    }
    this.send(syncStep2(room.missingFrom(stateVector)))
    this.following = true
  }
}

const UNREADABLE = {
  code: 'malformed',
  reason: "An edit's header is {editId, epoch, clientId}; reload the page.",
} as const
