import * as encoding from 'lib0/encoding'
import { writeUpdate } from 'y-protocols/sync'
import type { Identity } from '../../access/identity'
import { type Cell, encodeMessage, MESSAGE, type Present, type Role, type TrailEntry } from '../../sheet/wire'
import type { Timers } from '../clock'
import type { CloseReason } from '../closing'
import { colourFor, initialsOf } from './person'

/** Between two presence messages because of changes. Milliseconds. */
const PRESENCE_PAUSE = 100

/** A connection as its room sees it. */
export type Peer = {
  readonly id: string
  readonly identity: Identity
  readonly cell: Cell | null
  /** It has asked for the document and so gets what follows. */
  readonly following: boolean
  send(frame: Uint8Array): void
  close(reason: CloseReason): void
  /** The person's role has become another one, which still lets them read. */
  roleChanged(role: Role): void
}

/** Everybody who has this budget open. */
export class Peers {
  private readonly peers = new Map<string, Peer>()
  private readonly colours = new Map<string, number>()
  private pause: { again: boolean } | null = null

  constructor(private readonly timers: Timers) {}

  get size(): number {
    return this.peers.size
  }
  all(): Peer[] {
    return [...this.peers.values()]
  }

  add(peer: Peer): void {
    this.peers.set(peer.id, peer)
    const { person } = peer.identity
    if (!this.colours.has(person)) this.colours.set(person, colourFor(this.colours))
    this.presenceChanged()
  }

  remove(peer: Peer): void {
    if (!this.peers.delete(peer.id)) return
    const { person } = peer.identity
    if (!this.all().some(({ identity }) => identity.person === person)) this.colours.delete(person)
    this.presenceChanged()
  }

  /** One frame to everybody who follows, but the connection that has all of it. */
  sendUpdate(update: Uint8Array, except: string | null): void {
    const encoder = encoding.createEncoder()
    encoding.writeVarUint(encoder, 0)
    writeUpdate(encoder, update)
    const frame = encoding.toUint8Array(encoder)
    for (const peer of this.all()) if (peer.following && peer.id !== except) peer.send(frame)
  }

  sendTrail(entries: TrailEntry[]): void {
    const frame = encodeMessage({ type: MESSAGE.trail, header: entries })
    for (const peer of this.all()) peer.send(frame)
  }

  /** Tells everybody at once, but no more often than they can look. */
  presenceChanged(): void {
    if (this.pause) {
      this.pause.again = true
      return
    }
    this.pause = { again: false }
    this.sendPresence()
    this.timers.after(PRESENCE_PAUSE, () => {
      const again = this.pause?.again
      this.pause = null
      if (again) this.presenceChanged()
    })
  }

  /** Who is here and where, from what the server knows of them: a page says nothing but its cell. */
  sendPresence(): void {
    const everybody = this.all()
    const present = everybody.map(({ id, identity, cell }): Omit<Present, 'me'> => {
      const { person, name } = identity
      return {
        connection: id,
        person,
        name,
        initials: initialsOf(name),
        colour: this.colours.get(person) ?? 0,
        cell,
      }
    })
    for (const peer of everybody) {
      const header = present.map((one) => ({ ...one, me: one.connection === peer.id }))
      peer.send(encodeMessage({ type: MESSAGE.presence, header }))
    }
  }
}
