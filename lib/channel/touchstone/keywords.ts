import { BRACKET, CLOSING_BRACKET, type Cursor } from './cursor'
import { MOST_PORTS } from './fileName'
import type { Header } from './header'
import { latin1 } from './latin1'
import { Unreadable } from './unreadable'
import type { Warnings } from './warnings'

/** What the words that follow are: nothing but keywords may follow in `head`. */
export type Section = 'head' | 'reference' | 'modes' | 'network' | 'noise' | 'end'

const LONGEST_KEYWORD = 64

/** Reads a version 2 keyword with its arguments from its [ on. @returns the section that it begins */
export function readKeyword(cursor: Cursor, header: Header, warnings: Warnings): Section {
  const { line } = cursor
  const name = keywordName(cursor)
  const shown = `[${name}]`
  const key = name.toLowerCase()
  if (key === 'version') {
    readVersion(cursor, header)
    return 'head'
  }
  if (header.keywordVersion === null)
    throw new Unreadable(line, `${shown} is a keyword of version 2; write [Version] 2.0 as the first line.`)
  switch (key) {
    case 'number of ports':
      header.ports = count(cursor, shown)
      if (header.ports > MOST_PORTS)
        throw new Unreadable(line, `The file has ${header.ports} ports; at most ${MOST_PORTS} are read.`)
      return 'head'
    case 'two-port data order':
      header.order = oneOf(cursor, shown, ['12_21', '21_12'])
      return 'head'
    case 'number of frequencies':
      header.frequencies = count(cursor, shown)
      return 'head'
    case 'number of noise frequencies':
      header.noiseFrequencies = count(cursor, shown)
      return 'head'
    case 'matrix format':
      header.matrix = oneOf(cursor, shown, ['full', 'lower', 'upper'])
      return 'head'
    case 'reference':
      header.reference = []
      return 'reference'
    case 'mixed-mode order':
      header.modes = []
      return 'modes'
    case 'begin information':
      skipInformation(cursor, line)
      return 'head'
    case 'network data':
      return 'network'
    case 'noise data':
      return 'noise'
    case 'end':
      return 'end'
    default:
      warnings.add(line, `${shown} is unknown and left out.`)
      cursor.skipLine()
      return 'head'
  }
}

/** The words between the brackets with single spaces; the cursor stands behind the ] then. */
function keywordName(cursor: Cursor): string {
  const { bytes } = cursor
  const from = cursor.at + 1
  let to = from
  while (to < bytes.length && to - from <= LONGEST_KEYWORD && bytes[to] !== CLOSING_BRACKET) to++
  const name = latin1(bytes, from, to)
  if (bytes[to] !== CLOSING_BRACKET || /[\r\n]/.test(name))
    throw new Unreadable(
      cursor.line,
      'A keyword begins here and has no ] at its end; write it as, for example, [Network Data].',
    )
  cursor.at = to + 1
  return name.trim().replace(/\s+/g, ' ')
}

function readVersion(cursor: Cursor, header: Header): void {
  const { line } = cursor
  if (header.keywordVersion !== null) throw new Unreadable(line, '[Version] stands here a second time; leave one out.')
  const version = cursor.more() ? cursor.word() : ''
  if (version !== '2.0' && version !== '2.1')
    throw new Unreadable(line, `[Version] is 2.0 or 2.1, not '${version}'; a file of version 1 has no such line.`)
  header.keywordVersion = version
}

function argument(cursor: Cursor, keyword: string): string {
  if (!cursor.more())
    throw new Unreadable(cursor.line, `${keyword} has nothing behind it; write its value on the same line.`)
  return cursor.word()
}

function count(cursor: Cursor, keyword: string): number {
  const word = argument(cursor, keyword)
  if (!/^\d{1,9}$/.test(word) || Number(word) === 0)
    throw new Unreadable(cursor.line, `${keyword} is '${word}'; write a whole number above zero.`)
  return Number(word)
}

function oneOf<const T extends string>(cursor: Cursor, keyword: string, allowed: readonly T[]): T {
  const word = argument(cursor, keyword)
  const found = allowed.find((candidate) => candidate === word.toLowerCase())
  if (found === undefined)
    throw new Unreadable(
      cursor.line,
      `${keyword} is '${word}'; write ${allowed.slice(0, -1).join(', ')} or ${allowed.at(-1)}.`,
    )
  return found
}

/** Passes everything up to and with [End Information]. */
function skipInformation(cursor: Cursor, begun: number): void {
  cursor.skipLine()
  for (let byte = cursor.next(); byte !== -1; byte = cursor.next()) {
    const { from, to } = cursor.skipLine()
    if (byte !== BRACKET) continue
    const beginning = latin1(cursor.bytes, from, Math.min(to, from + LONGEST_KEYWORD))
    if (/^\[\s*end\s+information\s*\]/i.test(beginning)) return
  }
  throw new Unreadable(
    begun,
    '[Begin Information] has no [End Information]; write it behind the last line of the information.',
  )
}
