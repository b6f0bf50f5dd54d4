/** A small seeded generator (mulberry32, public domain), so that a run can be had again from its seed. */
export function seeded(seed: number) {
  let state = seed >>> 0
  const next = () => {
    state = (state + 0x6d2b79f5) >>> 0
    let mixed = state
    mixed = Math.imul(mixed ^ (mixed >>> 15), mixed | 1)
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32
  }
  const below = (limit: number) => Math.floor(next() * limit)
  const pick = <T>(values: readonly T[]): T => {
    const value = values[below(values.length)]
    if (value === undefined) throw new Error('Nothing to pick from.')
    return value
  }
  return { next, below, pick, chance: (share: number) => next() < share }
}
export type Random = ReturnType<typeof seeded>
