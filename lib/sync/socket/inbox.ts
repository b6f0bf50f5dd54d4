/** Frames that wait to be read, in order; the other end is held up while there are too many. */
export class Inbox {
  private readonly frames: Uint8Array[] = []
  private bytes = 0

  get count(): number {
    return this.frames.length
  }

  /** @returns false where it would be more than that */
  put(frame: Uint8Array, most: { count: number; bytes: number }): boolean {
    if (this.frames.length >= most.count || this.bytes + frame.length > most.bytes) return false
    this.frames.push(frame)
    this.bytes += frame.length
    return true
  }

  next(): Uint8Array | null {
    const frame = this.frames.shift()
    if (!frame) return null
    this.bytes -= frame.length
    return frame
  }

  clear(): void {
    this.frames.length = 0
    this.bytes = 0
  }
}
