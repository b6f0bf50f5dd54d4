export type BenchRow = {
  readonly what: string
  readonly ours: number
  readonly baseline: number
  readonly unit: string
}

/** Milliseconds of one call: the median of several rounds of many. */
export function milliseconds(rounds: number, calls: number, work: (n: number) => unknown): number {
  const times: number[] = []
  for (let round = 0; round < rounds; round++) {
    const start = performance.now()
    for (let n = 0; n < calls; n++) work(n)
    times.push((performance.now() - start) / calls)
  }
  return times.sort((a, b) => a - b)[Math.floor(rounds / 2)] ?? Number.NaN
}
