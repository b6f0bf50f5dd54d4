const SYNC = 0
const SYNC_STEP_1 = 0
const AWARENESS = 1

/**
 * A WebSocket class that does not send the provider's own edits and awareness: edits go up through the outbox, presence is
 * built by the server. The server ignores such frames; not sending them saves the bytes.
 */
export function quietSocket(Base: typeof WebSocket): typeof WebSocket {
  return class extends Base {
    override send(data: string | ArrayBufferLike | Blob | ArrayBufferView<ArrayBuffer>): void {
      if (data instanceof Uint8Array && isProvidersOwn(data)) return
      super.send(data)
    }
  }
}

function isProvidersOwn(frame: Uint8Array): boolean {
  return frame[0] === AWARENESS || (frame[0] === SYNC && frame[1] !== SYNC_STEP_1)
}
