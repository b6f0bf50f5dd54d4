/** What the pieces without a length take together at most. */
const SMALL_TOTAL = 0.42
/** One of them takes this part of the width where there are few. */
const SMALL_ONE = 0.034

/**
 * Shares a width among pieces: by length, and one equal small width for each piece without one. A length so short that
 * it would be thinner than that gets the small width too, so that a short trace beside a long cable stays visible.
 * @param lengths metres, null where a piece has none
 * @param total px
 * @returns px per piece; they add up to `total` unless there is no piece
 */
export function shareWidth(lengths: readonly (number | null)[], total: number): number[] {
  const pieces = lengths.length
  if (pieces === 0) return []
  const long = lengths.filter((length): length is number => length !== null && length > 0)
  if (long.length === 0) return lengths.map(() => total / pieces)
  const without = pieces - long.length
  const small = without === 0 ? total * SMALL_ONE : Math.min(total * SMALL_ONE, (total * SMALL_TOTAL) / without)
  const least = Math.min(small, (total * (1 - SMALL_TOTAL)) / long.length)
  return spread(lengths, small, least, total - without * small)
}

/** Lengths by proportion, none under `least`; whoever would be thinner leaves the sharing. */
function spread(lengths: readonly (number | null)[], small: number, least: number, room: number): number[] {
  const lifted = new Set<number>()
  for (;;) {
    const free = lengths.reduce<number>((sum, length, at) => sum + (lifted.has(at) ? 0 : (length ?? 0)), 0)
    const left = room - lifted.size * least
    const thin = lengths.findIndex(
      (length, at) => !lifted.has(at) && length !== null && length > 0 && (length / free) * left < least - 1e-9,
    )
    if (thin < 0) {
      return lengths.map((length, at) => {
        if (length === null || length <= 0) return small
        return lifted.has(at) ? least : (length / free) * left
      })
    }
    lifted.add(thin)
  }
}
