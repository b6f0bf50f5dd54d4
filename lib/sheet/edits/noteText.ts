import type { Operation } from '../change'

export type NoteOperation = Operation & { op: 'note' }

/** A change of a text in one piece: at this position so many UTF-16 code units go, and this text comes. */
export type Splice = { readonly at: number; readonly remove: number; readonly insert: string }

/** The shortest single splice that turns one text into the other; no surrogate pair is split. */
export function spliceBetween(from: string, to: string): Splice {
  const shorter = Math.min(from.length, to.length)
  let start = 0
  while (start < shorter && from[start] === to[start]) start++
  if (start > 0 && isHigh(from.charCodeAt(start - 1))) start--
  let end = 0
  while (end < shorter - start && from[from.length - 1 - end] === to[to.length - 1 - end]) end++
  if (end > 0 && isLow(from.charCodeAt(from.length - end))) end--
  return { at: start, remove: from.length - start - end, insert: to.slice(start, to.length - end) }
}

/**
 * Puts what a person typed since `base` into the text as others have changed it meanwhile. Where both changed the same
 * stretch, both insertions stay, theirs first.
 */
export function mergeTyped(base: string, mine: string, theirs: string): string {
  if (base === theirs || mine === theirs) return mine
  const typed = spliceBetween(base, mine)
  const other = spliceBetween(base, theirs)
  const typedEnd = typed.at + typed.remove
  const otherEnd = other.at + other.remove
  if (typedEnd <= other.at) return theirs.slice(0, typed.at) + typed.insert + theirs.slice(typedEnd)
  if (typed.at >= otherEnd) {
    const shift = other.insert.length - other.remove
    return theirs.slice(0, typed.at + shift) + typed.insert + theirs.slice(typedEnd + shift)
  }
  return (
    base.slice(0, Math.min(typed.at, other.at)) + other.insert + typed.insert + base.slice(Math.max(typedEnd, otherEnd))
  )
}

/** What the note reads after the operation, given what it reads now. */
export function mergedText(operation: NoteOperation, present: string): string {
  return operation.base === undefined ? operation.text : mergeTyped(operation.base, operation.text, present)
}

const isHigh = (unit: number) => unit >= 0xd800 && unit <= 0xdbff
const isLow = (unit: number) => unit >= 0xdc00 && unit <= 0xdfff
