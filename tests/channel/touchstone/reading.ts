import { readTouchstone, type TouchstoneFile, type TouchstoneProblem } from '../../../lib/channel/touchstone'

const bytesOf = (text: string | Uint8Array) => (typeof text === 'string' ? new TextEncoder().encode(text) : text)

export function fileOf(text: string | Uint8Array, name = 'link.s1p'): TouchstoneFile {
  const file = readTouchstone(bytesOf(text), name)
  if ('message' in file) throw new Error(`Line ${file.line}: ${file.message}`)
  return file
}

export function problemOf(text: string | Uint8Array, name = 'link.s1p'): TouchstoneProblem | 'none' {
  const file = readTouchstone(bytesOf(text), name)
  return 'message' in file ? file : 'none'
}
