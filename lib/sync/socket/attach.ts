import type { IncomingMessage, Server } from 'node:http'
import type { Duplex } from 'node:stream'
import { WebSocketServer } from 'ws'
import type { Identity } from '../../access/identity'
import { LIMITS } from '../../budget/schema'
import { CLOSE } from '../../sheet/closeCodes'
import { because, type CloseReason } from '../closing'
import { Connection, type ConnectionDeps } from './connection'

/** One edit's limit and room for its header: a longer frame is closed with 1009 before it is read. */
const MAX_PAYLOAD = LIMITS.editBytes + 64 * 1024
/** Sockets at once; each may hold a little before it has said who it is. */
const MOST_SOCKETS = 5_000

export type Collab = {
  /** Reads no more from anybody; what was accepted is still answered. */
  pause(): void
  /** Stops listening for new sockets. */
  close(): void
}

/**
 * Takes the worksheet's sockets at /collab/:budget. Other paths are left to the server's other listeners. Every refusal comes
 * after the socket is accepted, because a browser sees a close code and not an HTTP status.
 */
export function attachCollab(server: Server, deps: ConnectionDeps & { readonly publicUrl: string }): Collab {
  const sockets = new WebSocketServer({ noServer: true, maxPayload: MAX_PAYLOAD, perMessageDeflate: false })
  const connections = new Set<Connection>()
  const origin = new URL(deps.publicUrl).origin
  let isPaused = false

  const onUpgrade = (request: IncomingMessage, socket: Duplex, head: Buffer) => {
    const budget = budgetOf(request.url)
    if (budget === null) return
    if (isPaused || connections.size >= MOST_SOCKETS) {
      socket.end('HTTP/1.1 503 Service Unavailable\r\nConnection: close\r\n\r\n')
      return
    }
    sockets.handleUpgrade(request, socket, head, (ws) => {
      const connection = new Connection(ws, budget, () => whoIs(request, origin, deps), deps)
      connections.add(connection)
      ws.once('close', () => connections.delete(connection))
    })
  }
  server.on('upgrade', onUpgrade)

  return {
    pause() {
      isPaused = true
      for (const connection of connections) connection.pause()
    },
    close() {
      server.off('upgrade', onUpgrade)
      for (const connection of connections) connection.close(CLOSE.restart)
    },
  }
}

/** A program shows its token in the header and needs no Origin; a browser sends its cookie to whoever asks, and so its Origin counts. */
async function whoIs(
  request: IncomingMessage,
  origin: string,
  { sessions, log, publicUrl }: ConnectionDeps & { readonly publicUrl: string },
): Promise<Identity | { close: CloseReason }> {
  const { authorization, cookie, origin: from } = request.headers
  if (authorization === undefined && from !== origin) {
    log(`A page of ${from ?? 'no origin'} asked for a worksheet; the public address of this server is ${publicUrl}`)
    return { close: because(CLOSE.notAllowed, `Open the worksheet at ${origin}.`) }
  }
  const headers = new Headers(authorization === undefined ? { cookie: cookie ?? '' } : { authorization })
  return (await sessions.identify(headers)) ?? { close: CLOSE.signInAgain }
}

function budgetOf(url: string | undefined): string | null {
  const path = url?.split('?')[0] ?? ''
  const [, budget] = /^\/collab\/([^/]+)\/?$/.exec(path) ?? []
  return budget ?? null
}
