/** Why a text is no JSON, or none that can be kept without losing part of it. Line and column count from 1. */
export type JsonProblem = { readonly line: number; readonly column: number; readonly message: string }

export type JsonText = { readonly value: unknown } | { readonly problem: JsonProblem }

/** A budget file nests three deep. */
const DEEPEST = 32

const SPACE = /[ \t\n\r]*/y
const ATOM = /true|false|null|-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?/y

/**
 * Reads JSON (RFC 8259) as JSON.parse does, but names the place of what is wrong, and refuses what JSON.parse would lose in
 * silence: a name that stands twice in one object (the first value would vanish) and the name `__proto__`.
 * @returns the value, or the first problem with a sentence that says what to do; never throws.
 */
export function readJson(text: string): JsonText {
  const walk = new Walk(text.startsWith('\ufeff') ? text.slice(1) : text)
  try {
    walk.document()
  } catch (refusal) {
    if (!(refusal instanceof Refusal)) throw refusal
    return { problem: { ...placeOf(walk.text, refusal.offset), message: refusal.message } }
  }
  return { value: JSON.parse(walk.text) }
}

class Refusal extends Error {
  constructor(
    readonly offset: number,
    message: string,
  ) {
    super(message)
  }
}

/** Goes through the text once without building anything. */
class Walk {
  private at = 0
  constructor(readonly text: string) {}

  document(): void {
    this.value(0)
    if (this.next() !== '') throw this.refuse('Take out what follows the end of the JSON value.')
  }

  private value(depth: number): void {
    const first = this.next()
    if (depth > DEEPEST) throw this.refuse(`Nest at most ${DEEPEST} levels.`)
    if (first === '{') this.members('}', this.member(new Set(), depth))
    else if (first === '[') this.members(']', () => this.value(depth + 1))
    else if (first === '"') this.string()
    else if (!this.take(ATOM)) throw this.refuse(first === "'" ? 'Use double quotation marks.' : VALUE_EXPECTED)
  }

  private members(close: string, item: () => void): void {
    this.at++
    let next = this.next()
    while (next !== close) {
      item()
      next = this.next()
      if (next !== ',' && next !== close) {
        throw this.refuse(`Put a comma between two values, or '${close}' at the end.`)
      }
      if (next === ',') this.at++
    }
    this.at++
  }

  /** `names` are those of one object. */
  private member(names: Set<string>, depth: number): () => void {
    return () => {
      if (this.next() !== '"')
        throw this.refuse('Put a name in double quotation marks here, and no comma after the last.')
      const start = this.at
      const name = this.string()
      if (names.has(name)) throw new Refusal(start, `The name '${name}' stands twice here; keep one of them.`)
      if (name === '__proto__') throw new Refusal(start, "'__proto__' cannot be a name; choose another.")
      names.add(name)
      if (this.next() !== ':') throw this.refuse(`Put a colon after the name '${name}'.`)
      this.at++
      this.value(depth + 1)
    }
  }

  /** A loop and not a pattern: patterns overflow the stack on a text of some megabytes. */
  private string(): string {
    const start = this.at
    let end = start
    do end = this.text.indexOf('"', end + 1)
    while (end > 0 && this.escaped(end))
    try {
      const text: string = JSON.parse(end < 0 ? '' : this.text.slice(start, end + 1))
      this.at = end + 1
      return text
    } catch {
      throw this.refuse('End this text with a double quotation mark on the same line, and write a backslash as \\\\.')
    }
  }

  /** An odd number of backslashes before a quotation mark makes it part of the text. */
  private escaped(at: number): boolean {
    let backslashes = 0
    while (this.text[at - 1 - backslashes] === '\\') backslashes++
    return backslashes % 2 === 1
  }

  private take(token: RegExp): boolean {
    token.lastIndex = this.at
    if (!token.test(this.text)) return false
    this.at = token.lastIndex
    return true
  }

  /** Skips white space. @returns the character that follows, '' at the end. */
  private next(): string {
    this.take(SPACE)
    return this.text.charAt(this.at)
  }

  private refuse(message: string): Refusal {
    return new Refusal(this.at, this.at === this.text.length ? `The text ends too early. ${message}` : message)
  }
}

const VALUE_EXPECTED = 'Put a value here: text in double quotation marks, a number, true, false, null, { } or [ ].'

function placeOf(text: string, offset: number): { line: number; column: number } {
  const before = text.slice(0, offset).split('\n')
  return { line: before.length, column: (before.at(-1) ?? '').length + 1 }
}
