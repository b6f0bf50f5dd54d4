import { describe, expect, it } from 'vitest'
import { type BuildLine, type Builds, drawBuilds } from '../../../lib/budget/builds'
import { groupedRootSumSquare } from '../../../lib/channel/statistics'
import { normalCdf } from '../../../lib/channel/statistics/normal'
import { clearBuilds } from '../../bench/clear/builds'
import { buildLine } from './lines'

const SEED = 11
const TRIALS = 100_000

const draw = (lines: readonly BuildLine[], limitDb: number | null = null, lanes = 1, seed = SEED) =>
  drawBuilds({ lines, lanes, limitDb, trials: TRIALS, seed })

/** Of four standard errors; the deviation of a mean is σ/√N. */
function expectMean({ meanDb }: Builds, mean: number, sigma: number) {
  expect(Math.abs((meanDb ?? Number.NaN) - mean)).toBeLessThan((4 * sigma) / Math.sqrt(TRIALS))
}

function expectPercentile(found: { db: number; error: number } | null, db: number) {
  expect(Math.abs((found?.db ?? Number.NaN) - db)).toBeLessThan(4 * (found?.error ?? 0))
}

/** Four binomial deviations. */
function expectShare(found: { value: number } | null | undefined, share: number) {
  const deviation = Math.sqrt((share * (1 - share)) / TRIALS)
  expect(Math.abs((found?.value ?? Number.NaN) - share)).toBeLessThan(4 * deviation)
}

/** Percentiles of the normal distribution, SciPy 1.17, norm.ppf. */
const AT_99 = 2.3263478740408408
const AT_997 = 2.7477813854449926

function expectNormal(builds: Builds, mean: number, sigma: number) {
  expectMean(builds, mean, sigma)
  expectPercentile(builds.percentiles.p50, mean)
  expectPercentile(builds.percentiles.p99, mean + AT_99 * sigma)
  expectPercentile(builds.percentiles.p99_7, mean + AT_997 * sigma)
}

describe(`what ± means, ${TRIALS} builds with seed ${SEED} (design rule 4.6, percentiles by SciPy)`, () => {
  it.each([
    ['limit', 0.3, 0.1],
    ['3-sigma', 0.3, 0.1],
    ['1-sigma', 0.1, 0.1],
    ['95-percent', 0.196, 0.1],
  ] as const)('%s', (meaning, t, sigma) => {
    expectNormal(draw([buildLine('a', { meaning, minusDb: t, plusDb: t })]), 2, sigma)
  })

  it('anywhere within: every value of ±0.3 dB as likely', () => {
    const builds = draw([buildLine('a', { meaning: 'anywhere' })], 2.15)
    expectMean(builds, 2, 0.3 / Math.sqrt(3))
    expectPercentile(builds.percentiles.p90, 2 + 0.8 * 0.3)
    expectPercentile(builds.percentiles.p99, 2 + 0.98 * 0.3)
    expectShare(builds.fractionInside, 0.75)
  })

  it('sides that differ: half of the builds on each, each with its own standard deviation', () => {
    const builds = draw([buildLine('a', { minusDb: 0.3, plusDb: 0.6 })], 2)
    expectPercentile(builds.percentiles.p50, 2)
    expectPercentile(builds.percentiles.p99, 2 + AT_99 * 0.2)
    expectShare(builds.fractionInside, 0.5)
    // The mean of a half-normal is σ√(2/π); each side counts half.
    expectMean(builds, 2 + 0.1 / Math.sqrt(2 * Math.PI), 0.2)
  })

  it('what moving in frequency added counts linearly, as in the root of the sum of squares', () => {
    expectNormal(draw([buildLine('a', { spreadDb: 0.15 })]), 2, 0.15)
  })

  it('an overlap subtracts, and its sides change places', () => {
    const overlap = buildLine('b', { sign: -1, nominalDb: 0.5, minusDb: 0.6, plusDb: 0 })
    const builds = draw([buildLine('a', { minusDb: 0, plusDb: 0 }), overlap], 1.5)
    expectPercentile(builds.percentiles.p99, 1.5 + AT_99 * 0.2)
    expectShare(builds.fractionInside, 0.5)
    expect(builds.percentiles.p50?.db).toBeCloseTo(1.5, 2)
  })
})

describe('groups (JCGM 100:2008, 5.2.2: variances add up, or standard deviations where the correlation is 1)', () => {
  const two = (first: string, second: string) => [
    buildLine('a', { group: first }),
    buildLine('b', { group: second, minusDb: 0.6, plusDb: 0.6 }),
  ]

  it('two lines of one group have the variance (σ1 + σ2)²', () => {
    expectNormal(draw(two('lot', 'lot')), 4, 0.3)
  })

  it('two lines apart have σ1² + σ2², in groups of their own or each on its own', () => {
    for (const [first, second] of [
      ['lot', 'other'],
      ['a', 'b'],
      ['lot', 'b'],
    ] as const) {
      expectNormal(draw(two(first, second)), 4, Math.hypot(0.1, 0.2))
    }
  })

  it('agree with the root of the sum of squares of both', () => {
    const sigmas = (first: string, second: string) =>
      groupedRootSumSquare([
        { group: first, value: 0.3 },
        { group: second, value: 0.6 },
      ]) / 3
    expect(sigmas('lot', 'lot')).toBeCloseTo(0.3, 12)
    expect(sigmas('lot', 'other')).toBeCloseTo(Math.hypot(0.1, 0.2), 12)
  })

  it('rectangular lines of one group lie at the same place of their ranges', () => {
    const lines = two('lot', 'lot').map((line) => ({ ...line, meaning: 'anywhere' as const }))
    expectPercentile(draw(lines).percentiles.p99, 4 + 0.98 * 0.9)
  })

  it('a rectangular and a normal line of one group rise together: their percentiles add up', () => {
    const [a, b] = two('lot', 'lot')
    if (!a || !b) throw new Error('two lines')
    expectPercentile(draw([{ ...a, meaning: 'anywhere' }, b]).percentiles.p99, 4 + 0.98 * 0.3 + AT_99 * 0.2)
  })

  it('says what is common and what is each lane’s own', () => {
    const lines = [...two('lot', 'b'), buildLine('c', { minusDb: 0, plusDb: 0 })]
    expect(draw(lines, null, 2)).toMatchObject({ common: ['lot'], independent: ['b'], lanes: 2, trials: TRIALS })
  })
})

describe(`all lanes of a build (by hand, normal distribution), seed ${SEED}`, () => {
  const limit = 2.15
  const one = normalCdf(1.5)

  it('a group moves all lanes at once: as many builds are inside as of one lane', () => {
    const line = buildLine('a', { group: 'lot' })
    const builds = draw([line], limit, 16)
    expect({ ...builds, lanes: 1 }).toEqual(draw([line], limit, 1))
    expectShare(builds.fractionInside, one)
  })

  it('a line on its own varies in every lane: n lanes are inside with the n-th power of one', () => {
    const builds = draw([buildLine('a')], limit, 16)
    expectShare(builds.fractionInside, one ** 16)
    expectShare(draw([buildLine('a', { minusDb: 0.31 })], limit, 16).fractionInside, one ** 16)
    expect(builds.worstLane?.fractionInside.value).toBeGreaterThan(0.92)
  })

  it('both together: the integral over what is common of the n-th power of what is not', () => {
    const lines = [buildLine('a', { group: 'lot' }), buildLine('b', { minusDb: 0.15, plusDb: 0.15 })]
    let inside = 0
    for (let z = -8; z < 8; z += 1 / 256) {
      const density = Math.exp(-0.5 * z * z) / Math.sqrt(2 * Math.PI)
      inside += (density * normalCdf((4.15 - 4 - 0.1 * z) / 0.05) ** 8) / 256
    }
    expectShare(draw(lines, 4.15, 8).fractionInside, inside)
  })

  it('a lane that differs has its own loss and tolerance, and is named as the worst', () => {
    const longer = { nominalDb: 2.1, minusDb: 0.6, plusDb: 0.6, meaning: 'limit', spreadDb: 0, response: null } as const
    const lanes = new Map([[3, longer]])
    const builds = draw([buildLine('a', { group: 'lot', lanes })], limit, 4)
    // One deviate: the longer lane is the lossier one where it is above −1.
    expectShare(builds.fractionInside, normalCdf(0.25))
    expect(builds.worstLane?.lane).toBe(3)
    expectShare(builds.worstLane?.fractionInside, normalCdf(0.25))
    expectPercentile(builds.percentiles.p99, 2.1 + AT_99 * 0.2)
  })

  it('a lane that differs in nothing that varies draws its own deviate for a line on its own', () => {
    const lane = { nominalDb: 1, minusDb: 0, plusDb: 0, meaning: 'limit', spreadDb: 0, response: null } as const
    expectShare(draw([buildLine('a', { lanes: new Map([[2, lane]]) })], limit, 3).fractionInside, one ** 2)
  })
})

describe('draws', () => {
  it('are the same for the same seed and group, whatever else is in the link', () => {
    const line = buildLine('a', { group: 'lot' })
    const still = buildLine('still', { nominalDb: 0, minusDb: 0, plusDb: 0, group: 'elsewhere' })
    const renamed = buildLine('z', { group: 'lot' })
    expect(draw([still, renamed]).percentiles).toEqual(draw([line]).percentiles)
    expect(draw([line], null, 1, SEED + 1).percentiles).not.toEqual(draw([line]).percentiles)
  })

  it('grow with a tolerance build by build: the same deviates, scaled', () => {
    const wide = draw([buildLine('a', { minusDb: 0.6, plusDb: 0.6 })]).percentiles.p99
    const narrow = draw([buildLine('a')]).percentiles.p99
    expect((wide?.db ?? 0) - 2).toBeCloseTo(2 * ((narrow?.db ?? 0) - 2), 9)
  })

  it('agree with the shortest clear version within the sampling error of both (Box & Muller, xorshift of its own)', () => {
    let state = SEED
    const random = () => {
      state ^= state << 13
      state ^= state >>> 17
      state ^= state << 5
      return (state >>> 0) / 2 ** 32
    }
    const plain = [1, 2, 3, 4].map((n) => ({ db: 2, sigma: 0.05 * n, group: `g${n % 2}` }))
    const clear = clearBuilds(plain, 8.5, TRIALS, random)
    const lines = plain.map(({ sigma, group }, n) =>
      buildLine(`l${n}`, { group, meaning: '1-sigma', minusDb: sigma, plusDb: sigma }),
    )
    const builds = draw(lines, 8.5)
    const error = Math.SQRT2 * 4 * (builds.percentiles.p50?.error ?? 0)
    expect(Math.abs((builds.meanDb ?? 0) - clear.mean)).toBeLessThan(error)
    expect(Math.abs((builds.percentiles.p50?.db ?? 0) - clear.median)).toBeLessThan(error)
    expect(Math.abs((builds.fractionInside?.value ?? 0) - clear.inside)).toBeLessThan(0.01)
  })

  it('of nothing that varies are the nominal sum, inside up to the limit itself', () => {
    const still = buildLine('a', { minusDb: 0, plusDb: 0 })
    const builds = drawBuilds({ lines: [still, still], lanes: 2, limitDb: 4, trials: 10, seed: 1 })
    expect(builds).toMatchObject({ meanDb: 4, common: [], independent: [], unknown: 0 })
    expect(builds.percentiles.p99).toEqual({ db: 4, error: 0 })
    expect(builds.fractionInside).toMatchObject({ value: 1, high: 1 })
    expect(drawBuilds({ lines: [], lanes: 1, limitDb: null, trials: 10, seed: 1 })).toMatchObject({
      meanDb: 0,
      fractionInside: null,
      worstLane: null,
    })
  })
})
