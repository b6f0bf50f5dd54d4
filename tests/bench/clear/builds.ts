/** A line of a link: its loss, its standard deviation and what it varies together with. */
export type ClearLine = { readonly db: number; readonly sigma: number; readonly group: string }

/** The shortest clear version of drawing builds of one lane: no unequal sides, no errors, nothing kept. */
export function clearBuilds(lines: readonly ClearLine[], limit: number, trials: number, random: () => number) {
  const losses: number[] = []
  for (let trial = 0; trial < trials; trial++) {
    const deviates: Record<string, number> = {}
    let loss = 0
    for (const { db, sigma, group } of lines) {
      // Box & Muller 1958.
      deviates[group] ??= Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random())
      loss += db + sigma * deviates[group]
    }
    losses.push(loss)
  }
  losses.sort((a, b) => a - b)
  return {
    mean: losses.reduce((sum, loss) => sum + loss, 0) / trials,
    median: losses[Math.ceil(trials / 2) - 1] ?? Number.NaN,
    inside: losses.filter((loss) => loss <= limit).length / trials,
  }
}
