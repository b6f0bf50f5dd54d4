import { BANG, BRACKET, Cursor, HASH } from './cursor'
import type { TouchstoneFile, TouchstoneProblem } from './file'
import { MOST_PORTS, portsByName } from './fileName'
import type { Options } from './options'
import { Scan } from './scan'
import { Unreadable } from './unreadable'

/**
 * Reads a Touchstone file of version 1.0, 1.1, 2.0 or 2.1 (Touchstone File Format Specification 2.0, 2009, and its corrections
 * TSIRD 4.1 and 5.1). One pass over the bytes; every number has the bits that Number() gives its text, frequencies those of
 * the text moved to Hz. What departs from the standard and can be understood in only one way is read with a warning.
 * Range: 1 to 16 ports, 20 million numbers, real references; rows of one frequency count once.
 * @param fileName its ending says how many ports a version 1 file has
 */
export function readTouchstone(bytes: Uint8Array, fileName: string): TouchstoneFile | TouchstoneProblem {
  try {
    const named = portsByName(fileName)
    if (named !== null && !(named >= 1 && named <= MOST_PORTS))
      throw new Unreadable(null, `By its ending the file has ${named} ports; 1 to ${MOST_PORTS} are read.`)
    const version2 = /\.ts$/i.test(fileName.trim())
    const start = startOfText(bytes)
    const scan = (late: Options | null) => scanned(new Cursor(bytes, start), named, version2, late)
    const first = scan(null)
    const file = 'network' in first ? first : scan(first)
    if ('network' in file) return file
    throw new Unreadable(file.line, 'The option line must stand before the data.')
  } catch (error) {
    if (error instanceof Unreadable) return { line: error.line, message: error.message }
    throw error
  }
}

/** @returns the file, or the option line where it stands behind the first data, with which the file has to be read anew */
function scanned(
  cursor: Cursor,
  named: number | null,
  version2: boolean,
  late: Options | null,
): TouchstoneFile | Options {
  const scan = new Scan(cursor, named, version2, late)
  for (let byte = cursor.next(); byte !== -1; byte = cursor.next()) {
    if (byte === BANG) scan.comment()
    else if (byte === HASH) {
      const found = scan.optionLine()
      if (found) return found
    } else if (byte === BRACKET) {
      if (scan.keyword()) break
    } else scan.words()
  }
  return scan.file()
}

/** Behind a UTF-8 byte-order mark. @throws Unreadable for UTF-16 */
function startOfText(bytes: Uint8Array): number {
  const [first, second, third] = bytes
  if ((first === 0xff && second === 0xfe) || (first === 0xfe && second === 0xff))
    throw new Unreadable(1, 'The file is in UTF-16; save it as plain text (ASCII or UTF-8).')
  return first === 0xef && second === 0xbb && third === 0xbf ? 3 : 0
}
