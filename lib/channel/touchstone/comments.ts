const KEPT_BYTES = 4096

/** The beginning of a file's comments, kept as bytes until it is known how they are encoded. */
export class Comments {
  private readonly bytes = new Uint8Array(KEPT_BYTES)
  private length = 0

  /** Adds a line: the bytes of `file` from `from` to `to`. */
  add(file: Uint8Array, from: number, to: number): void {
    if (this.length > 0) this.push(10)
    for (let at = from; at < to && this.length < KEPT_BYTES; at++) {
      const byte = file[at] as number
      if (byte >= 32 || byte === 9) this.push(byte)
    }
  }

  /** UTF-8 where it is that, latin-1 otherwise; each line without its outer blanks. */
  text(): string {
    return decode(this.bytes.subarray(0, this.length), this.length === KEPT_BYTES)
      .split('\n')
      .map((line) => line.trim())
      .join('\n')
      .trim()
  }

  private push(byte: number): void {
    if (this.length < KEPT_BYTES) this.bytes[this.length++] = byte
  }
}

/** @param cut the last character may be half there */
function decode(bytes: Uint8Array, cut: boolean): string {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes, { stream: cut })
  } catch {
    return new TextDecoder('latin1').decode(bytes)
  }
}
