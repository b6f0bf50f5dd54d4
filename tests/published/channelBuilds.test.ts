import { describe, expect, it } from 'vitest'
import { evaluate } from '../../lib/budget/evaluate'
import { type BudgetFile, budgetSchema } from '../../lib/budget/schema'
import { scenario, withAllowance } from './byHand'
import { onlyAllowance } from './straightLink'

const TRIALS = 100_000
const judge = (file: BudgetFile) =>
  onlyAllowance(evaluate(budgetSchema.parse(file), new Map(), { sweep: false, builds: TRIALS }))

/** ± of the lines between the balls as printed, and their groups. */
const GROUPS: Readonly<Record<string, readonly number[]>> = {
  'card-via-bga': [0.15, 0.15],
  card: [0.285, 0.399],
  'card-via-conn': [0.12, 0.12],
  conn: [0.2, 0.2],
  'bp-via': [0.15, 0.15],
  bp: [0.552],
  '': [0.1],
}
const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0)
const all = Object.values(GROUPS)
const grouped = Math.hypot(...all.map(sum))
const independent = Math.hypot(...all.flat())

/** Standard normal distribution, by Simpson's rule. */
function normal(z: number): number {
  const width = (z + 8) / 4000
  let total = 0
  for (let k = 0; k <= 4000; k++) {
    const x = -8 + k * width
    total += Math.exp((-x * x) / 2) * (k === 0 || k === 4000 ? 1 : k % 2 === 0 ? 2 : 4)
  }
  return (total * width) / 3 / Math.sqrt(2 * Math.PI)
}

/** Every line between the planes on its own, with the reason that this asks for. */
function ungrouped(file: BudgetFile): BudgetFile {
  const lines = Object.entries(file.lines ?? {}).map(
    ([id, line]) => [id, { ...line, group: 'none', groupNote: 'For this check.' }] as const,
  )
  return { ...file, lines: Object.fromEntries(lines) }
}

describe('random builds of Tamarack (invented example; shares by the normal distribution)', () => {
  const file = scenario('tamarack')
  const hot = withAllowance(file, 'ball-to-ball', { judgedCorner: 'hot' })

  it('98.6 % of the worst lane inside at 25 °C: Φ(0.80/(1.09/3))', () => {
    const share = normal(0.8 / (grouped / 3))
    expect(share).toBeCloseTo(0.986, 3)
    const { builds } = judge(file)
    expect(builds?.worstLane).toMatchObject({ lane: 7 })
    expect(builds?.worstLane?.fractionInside.value).toBeCloseTo(share, 2)
    expect(Math.abs((builds?.worstLane?.fractionInside.value ?? 0) - share)).toBeLessThan(0.0015)
    // No build is inside with its worst lane outside.
    expect(builds?.fractionInside?.value ?? 1).toBeLessThanOrEqual(builds?.worstLane?.fractionInside.value ?? 0)
  })

  it('about 30 % hot: Φ(−0.19/(1.13/3)), as the ±6 % of the traces are of the grown loss', () => {
    const grown = all.map(
      (group, n) => sum(group) * (['card', 'bp'].includes(Object.keys(GROUPS)[n] ?? '') ? 1.048 : 1),
    )
    const share = normal((28 - 27.2 - 20.6 * 0.0012 * 40) / (Math.hypot(...grown) / 3))
    expect(share).toBeCloseTo(0.3, 1)
    expect(Math.abs((judge(hot).builds?.worstLane?.fractionInside.value ?? 0) - share)).toBeLessThan(0.006)
  })

  it('RSS ±1.09 dB grouped, ±0.87 dB where every line is said to vary on its own; worst case 29.78 dB in both', () => {
    expect([grouped, independent]).toEqual([expect.closeTo(1.09, 2), expect.closeTo(0.87, 2)])
    const [together, apart] = [judge(file), judge(ungrouped(file))]
    expect(together.rssDb).toBeCloseTo(grouped, 9)
    expect(apart.rssDb).toBeCloseTo(independent, 9)
    for (const { worstDb } of [together, apart]) expect(worstDb).toBeCloseTo(27.2 + sum(all.flat()), 9)
    // Of the worst lane alone; with every lane on its own all of them inside is rarer.
    const share = normal(0.8 / (independent / 3))
    expect(Math.abs((apart.builds?.worstLane?.fractionInside.value ?? 0) - share)).toBeLessThan(0.0015)
    expect(apart.builds?.fractionInside?.value ?? 1).toBeLessThan(apart.builds?.worstLane?.fractionInside.value ?? 0)
  })

  it('median and 99 % of the worst lane follow from it', () => {
    const { builds } = judge(withAllowance(file, 'ball-to-ball', { judgedLane: 7 }))
    // The loss of a build is that of its lossiest lane; lane 7 is 27.20 dB and the next ones are shorter.
    expect(builds?.percentiles.p50?.db ?? 0).toBeGreaterThanOrEqual(27.2 - 0.005)
    expect(builds?.percentiles.p50?.db).toBeCloseTo(27.2, 1)
    expect(builds?.percentiles.p99?.db).toBeCloseTo(27.2 + 2.3263 * (grouped / 3), 1)
  })
})
