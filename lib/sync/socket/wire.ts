import type { WebSocket } from 'ws'
import { CLOSE } from '../../sheet/closeCodes'
import type { Cancel, Timers } from '../clock'
import { because, type CloseReason } from '../closing'

/** Between two pings; a connection that has not answered one until the next is dead. Milliseconds. */
const PING = 30_000
/** How long a closed connection may take to say so. Milliseconds. */
const GOODBYE = 3_000
/** What may wait to be sent to one connection, in bytes. */
const MOST_UNSENT = 16 * 1024 * 1024

/** The sending end of one socket: closes with a reason, finds the dead, drops the slow. */
export class Wire {
  private answered = true
  private isClosing = false
  private readonly stopPings: Cancel

  constructor(
    private readonly socket: WebSocket,
    private readonly timers: Timers,
  ) {
    socket.on('pong', () => {
      this.answered = true
    })
    // A frame that is too large or malformed: the library closes the socket with its own code.
    socket.on('error', () => undefined)
    socket.once('close', () => this.stopPings())
    this.stopPings = timers.every(PING, () => this.ping())
  }

  get isOpen(): boolean {
    return !this.isClosing && this.socket.readyState === this.socket.OPEN
  }

  send(frame: Uint8Array): void {
    if (!this.isOpen) return
    if (this.socket.bufferedAmount + frame.length > MOST_UNSENT) {
      this.close(because(CLOSE.notReady, 'The connection is too slow.'))
      return
    }
    this.socket.send(frame)
  }

  close({ code, words }: CloseReason): void {
    if (this.isClosing) return
    this.isClosing = true
    // A socket that is held up would not read the other end's goodbye.
    this.socket.resume()
    this.socket.close(code, words)
    // The close frame stands behind what is unsent, which may never go.
    this.timers.after(GOODBYE, () => this.socket.terminate())
  }

  private ping(): void {
    if (!this.answered) {
      this.socket.terminate()
      return
    }
    this.answered = false
    if (this.socket.readyState === this.socket.OPEN) this.socket.ping()
  }
}
