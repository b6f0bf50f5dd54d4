/** First letters of the first and the last word of a name. */
export function initialsOf(name: string): string {
  const words = name.trim().split(/\s+/).filter(Boolean)
  const letters = words.length > 1 ? [words[0], words.at(-1)] : words
  return letters.map((word) => [...(word ?? '')][0]?.toUpperCase() ?? '').join('')
}

/** The lowest number that nobody here has. */
export function colourFor(taken: ReadonlyMap<string, number>): number {
  const used = new Set(taken.values())
  let colour = 0
  while (used.has(colour)) colour++
  return colour
}
