/**
 * Puts what one person did to a note onto what the note has become meanwhile. Both are seen as one replaced stretch of the
 * text that the person began with.
 * @returns the text with both, or null where both changed the same stretch: then a person must look.
 */
export function mergeNote(base: string, mine: string, theirs: string): string | null {
  if (theirs === base || mine === theirs) return mine
  if (mine === base) return theirs
  const own = replaced(base, mine)
  const other = replaced(base, theirs)
  const ownText = mine.slice(own.from, mine.length - (base.length - own.to))
  if (own.to < other.from || (own.to === other.from && own.from < other.from)) {
    return theirs.slice(0, own.from) + ownText + theirs.slice(own.to)
  }
  if (other.to < own.from || (other.to === own.from && other.from < own.from)) {
    const shift = theirs.length - base.length
    return theirs.slice(0, own.from + shift) + ownText + theirs.slice(own.to + shift)
  }
  return null
}

/** The stretch of `before` that differs in `after`, between their common beginning and their common end. */
function replaced(before: string, after: string): { from: number; to: number } {
  const shorter = Math.min(before.length, after.length)
  let from = 0
  while (from < shorter && before[from] === after[from]) from++
  let tail = 0
  while (tail < shorter - from && before[before.length - 1 - tail] === after[after.length - 1 - tail]) tail++
  return { from, to: before.length - tail }
}
