import { latin1 } from './latin1'
import { Unreadable } from './unreadable'

export const BANG = 33
export const HASH = 35
export const BRACKET = 91
export const CLOSING_BRACKET = 93
const CR = 13
const LF = 10
const LONGEST_WORD = 64

/** A place in the bytes of a file that goes forwards only. Lines end with CR, LF or both; blanks are what else is not above a space. */
export class Cursor {
  line = 1

  constructor(
    readonly bytes: Uint8Array,
    public at: number,
  ) {}

  /** Passes blanks and ends of lines. @returns the byte it stands on then, −1 at the end of the file */
  next(): number {
    const { bytes } = this
    const { length } = bytes
    let at = this.at
    for (; at < length; at++) {
      const byte = bytes[at] as number
      if (byte > 32) {
        this.at = at
        return byte
      }
      if (byte === LF || (byte === CR && bytes[at + 1] !== LF)) this.line++
      else if (byte === 0) throw new Unreadable(this.line, 'The file is not text: it has a zero byte here.')
    }
    this.at = at
    return -1
  }

  /** Passes blanks of this line. @returns false where the line, or what is not comment of it, ends */
  more(): boolean {
    for (; this.at < this.bytes.length; this.at++) {
      const byte = this.bytes[this.at] as number
      if (byte === LF || byte === CR || byte === BANG) return false
      if (byte > 32) return true
    }
    return false
  }

  /** The word from here to a blank, a comment or the end of the line, at most 64 characters of it read as latin-1. */
  word(): string {
    const from = this.at
    const to = this.endOfWord()
    if (to - from > LONGEST_WORD)
      throw new Unreadable(this.line, `'${this.shown()}' is longer than anything that may stand here.`)
    this.at = to
    return latin1(this.bytes, from, to)
  }

  /** The rest of the line, comment and all, left out. @returns where it began and ended */
  skipLine(): { from: number; to: number } {
    const from = this.at
    while (this.at < this.bytes.length && this.bytes[this.at] !== LF && this.bytes[this.at] !== CR) this.at++
    return { from, to: this.at }
  }

  /** The word here as a message may show it. */
  shown(): string {
    const to = Math.min(this.endOfWord(), this.at + 24)
    const text = latin1(this.bytes, this.at, to).replace(/[^\x21-\x7e\xa1-\xff]/g, '?')
    return this.endOfWord() > to ? `${text}…` : text
  }

  /** How many words the line still has from here, counted no further than `most`. */
  words(most: number): number {
    const kept = this.at
    let count = 0
    while (count < most && this.more()) {
      this.at = this.endOfWord()
      count++
    }
    this.at = kept
    return count
  }

  private endOfWord(): number {
    let to = this.at
    while (to < this.bytes.length && (this.bytes[to] as number) > 32 && this.bytes[to] !== BANG) to++
    return to
  }
}
