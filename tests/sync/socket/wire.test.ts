import { EventEmitter } from 'node:events'
import { describe, expect, it } from 'vitest'
import type { WebSocket } from 'ws'
import { Wire } from '../../../lib/sync/socket/wire'
import { heldTimers } from '../support/timers'

/** What Wire uses of a socket; what is sent stays unsent, as with a peer that reads nothing. */
class StuckSocket extends EventEmitter {
  readonly OPEN = 1
  readyState = 1
  bufferedAmount = 0
  readonly did: string[] = []
  send(frame: Uint8Array) {
    this.bufferedAmount += frame.length
  }
  close(code: number) {
    this.did.push(`close ${code}`)
  }
  terminate() {
    this.did.push('terminate')
  }
  ping() {
    this.did.push('ping')
  }
  resume() {}
}

function open() {
  const socket = new StuckSocket()
  const timers = heldTimers()
  // Contract: only the members above are used.
  return { socket, timers, wire: new Wire(socket as unknown as WebSocket, timers) }
}

describe('the sending end of a socket', () => {
  it('[W10.22] a peer that does not read is closed as retriable and cut off, and gets nothing more', () => {
    const { socket, timers, wire } = open()
    const megabyte = new Uint8Array(1024 * 1024)
    for (let sent = 0; sent < 20; sent++) wire.send(megabyte)
    expect(socket.bufferedAmount).toBe(16 * 1024 * 1024)
    expect(socket.did).toEqual(['close 4503'])
    timers.advance(3_000)
    expect(socket.did).toEqual(['close 4503', 'terminate'])
  })

  it('[W10.22] a peer that answers pings stays, one that does not is cut off at the next', () => {
    const { socket, timers } = open()
    timers.advance(30_000)
    socket.emit('pong')
    timers.advance(30_000)
    expect(socket.did).toEqual(['ping', 'ping'])
    timers.advance(30_000)
    expect(socket.did).toEqual(['ping', 'ping', 'terminate'])
    socket.emit('close')
    timers.advance(90_000)
    expect(socket.did).toHaveLength(3)
  })
})
