import { type Fraction, fractionOf, percentileOf } from '../../channel/statistics'
import { addChanges, addTerms, Changes } from './accumulate'
import type { BuildLine } from './buildLine'
import { type LanePlan, lanePlan, variesAlone } from './plan'
import { BLOCK, CommonSources, drawBlock, OwnSources } from './source'

export type BuildsInput = {
  readonly lines: readonly BuildLine[]
  /** How many lanes the link has; lanes are numbered from 1. */
  readonly lanes: number
  /** dB that no lane may exceed; null: not known. */
  readonly limitDb: number | null
  /** How many builds to draw; at least 1. */
  readonly trials: number
  readonly seed: number
}

/** Shares of the builds that stay at or below a loss. */
export const SHARES = { p50: 0.5, p90: 0.9, p95: 0.95, p99: 0.99, p99_7: 0.997 } as const

/** What random builds of a link come to. The loss of a build is that of its lossiest lane. */
export type Builds = {
  readonly trials: number
  readonly seed: number
  readonly lanes: number
  /** dB; null where a model gave no number for some builds. */
  readonly meanDb: number | null
  /** Loss that this share of the builds does not exceed, and its standard error, in dB. */
  readonly percentiles: Readonly<Record<keyof typeof SHARES, { readonly db: number; readonly error: number } | null>>
  /** Share of the builds that have every lane within the limit, with its 95 % interval; null without a limit. */
  readonly fractionInside: Fraction | null
  /** The lane that alone is inside least often. */
  readonly worstLane: { readonly lane: number; readonly fractionInside: Fraction } | null
  /** What is drawn once for all lanes of a build: groups, and parameters as 'group: field'. */
  readonly common: readonly string[]
  /** What is drawn for each lane apart: lines, and parameters as 'line: field'. */
  readonly independent: readonly string[]
  /** Builds that a model gave no number for; they count as not inside. */
  readonly unknown: number
}

/**
 * Draws builds of a link at random, all lanes of one build together (JCGM 101:2008). A group is one normal deviate in a build,
 * which all its lines follow linearly in every lane; a line on its own has a deviate for each lane. A tolerance gives
 * the standard deviation by what its ± means (a limit t: t/3), and the normal distribution is not cut off there; 'anywhere' is
 * rectangular within ±t. Sides that differ each have their own standard deviation, half of the builds lying on either side.
 * An overlap follows its group towards less taken away, as in the root of the sum of squares.
 */
export function drawBuilds({ lines, lanes, limitDb, trials, seed }: BuildsInput): Builds {
  const common = new CommonSources(seed)
  const own = new OwnSources(seed)
  const plans = distinctPlans(lines, lanes, common, own)
  const totals = new Float64Array(trials)
  const inside = new Float64Array(plans.length)
  const ofLane = new Float64Array(BLOCK)
  const changes = new Changes()
  for (let start = 0; start < trials; start += BLOCK) {
    const count = Math.min(BLOCK, trials - start)
    const worst = totals.subarray(start, start + count).fill(Number.NEGATIVE_INFINITY)
    for (const source of common.all()) drawBlock(source)
    changes.forget()
    plans.forEach((plan, which) => {
      for (const source of plan.ownSources) drawBlock(source)
      ofLane.fill(plan.constant)
      addTerms(plan.commonTerms, ofLane)
      changes.addKept(plan.commonChanges, ofLane)
      addTerms(plan.ownTerms, ofLane)
      addChanges(plan.ownChanges, ofLane)
      // Math.max hands a NaN on.
      for (let n = 0; n < count; n++) worst[n] = Math.max(worst[n] as number, ofLane[n] as number)
      if (limitDb !== null) inside[which] = (inside[which] as number) + within(ofLane, count, limitDb)
    })
  }
  const least = inside.indexOf(Math.min(...inside))
  return {
    trials,
    seed,
    lanes,
    ...summary(totals),
    fractionInside: limitDb === null ? null : fractionOf(within(totals, trials, limitDb), trials),
    worstLane:
      limitDb === null
        ? null
        : { lane: plans[least]?.lane ?? 1, fractionInside: fractionOf(inside[least] ?? 0, trials) },
    common: common.names(),
    independent: own.names(),
  }
}

/** Lanes to draw: each that differs or has something of its own, and one that stands for all that are alike. */
function distinctPlans(lines: readonly BuildLine[], lanes: number, common: CommonSources, own: OwnSources): LanePlan[] {
  const plans: LanePlan[] = []
  let alike = false
  for (let lane = 1; lane <= lanes; lane++) {
    const differs = lines.some((line) => line.lanes.has(lane))
    if (alike && !differs) continue
    const plan = lanePlan(lines, lane, common, own.lane(lane))
    plans.push(plan)
    if (!differs && !variesAlone(plan)) alike = true
  }
  return plans
}

function within(db: Float64Array, count: number, limitDb: number): number {
  let inside = 0
  for (let n = 0; n < count; n++) if ((db[n] as number) <= limitDb) inside++
  return inside
}

/** Sorts the builds; those without a number come last, as the worst. */
function summary(totals: Float64Array): Pick<Builds, 'meanDb' | 'percentiles' | 'unknown'> {
  totals.sort()
  let unknown = 0
  while (unknown < totals.length && Number.isNaN(totals[totals.length - 1 - unknown])) unknown++
  let sum = 0
  for (let n = 0; n < totals.length; n++) sum += totals[n] as number
  const at = (share: number) => {
    const { value, error } = percentileOf(totals, share)
    return Number.isNaN(value) || Number.isNaN(error) ? null : { db: value, error }
  }
  return {
    meanDb: unknown > 0 ? null : sum / totals.length,
    percentiles: {
      p50: at(SHARES.p50),
      p90: at(SHARES.p90),
      p95: at(SHARES.p95),
      p99: at(SHARES.p99),
      p99_7: at(SHARES.p99_7),
    },
    unknown,
  }
}
