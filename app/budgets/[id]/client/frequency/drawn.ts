type Values = readonly (number | null)[]

/**
 * Which points of traces over one grid are drawn: of each stretch the lowest and the highest of every trace, so that no notch
 * and no peak is lost, a point without a value, where a line is broken, the ends, and those that are asked for.
 * @param kept indexes that are drawn whatever their values
 * @param most so many points at most, but for those that are kept
 * @returns indexes, rising
 */
export function drawnPoints(
  length: number,
  traces: readonly Values[],
  kept: readonly number[],
  most: number,
): number[] {
  const always = [0, length - 1, ...kept].filter((at) => at >= 0 && at < length)
  if (length <= most) return Array.from({ length }, (_, at) => at)
  const drawn = new Set(always)
  const stretches = Math.max(1, Math.floor((most - drawn.size) / (3 * traces.length)))
  for (let stretch = 0; stretch < stretches; stretch++) {
    const start = Math.floor((length * stretch) / stretches)
    const end = Math.floor((length * (stretch + 1)) / stretches)
    for (const values of traces) for (const at of extremes(values, start, end)) drawn.add(at)
  }
  return [...drawn].sort((a, b) => a - b)
}

/** Places of the lowest and the highest value of a stretch, and of the first that is missing. */
function extremes(values: Values, start: number, end: number): number[] {
  let low = -1
  let high = -1
  let missing = -1
  for (let at = start; at < end; at++) {
    const value = values[at] ?? null
    if (value === null) {
      if (missing < 0) missing = at
      continue
    }
    if (low < 0 || value < (values[low] as number)) low = at
    if (high < 0 || value > (values[high] as number)) high = at
  }
  return [low, high, missing].filter((at) => at >= 0)
}

/** The point of a rising grid that lies next to a frequency. */
export function nearest(hz: readonly number[], to: number): number {
  let best = 0
  for (let at = 1; at < hz.length; at++)
    if (Math.abs((hz[at] as number) - to) < Math.abs((hz[best] as number) - to)) best = at
  return best
}
