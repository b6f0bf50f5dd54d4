import { describe, expect, it } from 'vitest'
import { drawBuilds } from '../../lib/budget/builds'
import { evaluate } from '../../lib/budget/evaluate'
import { groupedRootSumSquare, sigmaOf } from '../../lib/channel/statistics'
import { buildLine } from '../budget/builds/lines'
import { line, link } from '../budget/links'

/** Standard uncertainties put together all three ways, as lines of no loss: worst case and root of the sum of squares by evaluate(). */
function combined(parts: readonly { readonly sigma: number; readonly group: string }[]) {
  const own = parts.map(({ sigma, group }, n) => [
    `l${n}`,
    line(`b${n}`, '1 dB', { tolerancePlus: `${sigma} dB`, toleranceMeaning: '1-sigma', group }),
  ])
  const [allowance] = evaluate(link({ lines: Object.fromEntries(own) }), new Map()).allowances
  const lines = parts.map(({ sigma, group }, n) =>
    buildLine(`l${n}`, { nominalDb: 1, minusDb: sigma, plusDb: sigma, meaning: '1-sigma', group }),
  )
  const builds = drawBuilds({ lines, lanes: 1, limitDb: null, trials: 100_000, seed: 1 })
  return {
    worst: ((allowance?.worstDb ?? Number.NaN) - parts.length) / 3,
    rss: (allowance?.rssDb ?? Number.NaN) / 3,
    p99: builds.percentiles.p99 ?? { db: Number.NaN, error: 0 },
  }
}

/** Percentile of the normal distribution, SciPy 1.17, norm.ppf. */
const AT_99 = 2.3263478740408408

describe('worked facts of JCGM 100:2008 (from memory)', () => {
  it('4.3.7: expansion of copper known within ±0.40e-6 per °C, anywhere: u = 0.23e-6', () => {
    expect(sigmaOf(0.4, 'anywhere')).toBeCloseTo(0.23, 2)
  })

  it('5.2.2: ten resistors of 100 mΩ, all calibrated by one standard: 1 Ω, and 0.32 Ω only if they had nothing in common', () => {
    const ten = (group: (n: number) => string) =>
      combined(Array.from({ length: 10 }, (_, n) => ({ sigma: 0.1, group: group(n) })))
    const together = ten(() => 'standard')
    const apart = ten((n) => `standard ${n}`)
    expect([together.worst, together.rss]).toEqual([expect.closeTo(1, 9), expect.closeTo(1, 9)])
    expect([apart.worst, apart.rss]).toEqual([expect.closeTo(1, 9), expect.closeTo(0.32, 2)])
    expect(Math.abs(together.p99.db - 10 - AT_99)).toBeLessThan(4 * together.p99.error)
    expect(Math.abs(apart.p99.db - 10 - AT_99 * Math.sqrt(0.1))).toBeLessThan(4 * apart.p99.error)
  })

  it('H.1: an end gauge, 25, 9.7, 2.9 and 16.6 nm on their own: 32 nm', () => {
    const parts = [25, 9.7, 2.9, 16.6].map((value, n) => ({ group: String(n), value }))
    expect(groupedRootSumSquare(parts)).toBeCloseTo(32, 0)
  })
})

describe('worked examples of JCGM 101:2008 (from memory): four inputs added up, 95 % interval', () => {
  const interval = (meaning: '1-sigma' | 'anywhere', halves: readonly number[]) => {
    const lines = halves.map((half, n) =>
      buildLine(`l${n}`, { nominalDb: 0, minusDb: half, plusDb: half, meaning, group: `g${n}` }),
    )
    // The upper end at 97.5 %: as many builds are below it.
    return (limitDb: number) =>
      drawBuilds({ lines, lanes: 1, limitDb, trials: 100_000, seed: 1 }).fractionInside?.value ?? Number.NaN
  }
  const DEVIATION = 4 * Math.sqrt((0.975 * 0.025) / 100_000)
  const root3 = Math.sqrt(3)

  it.each([
    ['9.2.2: all normal, u = 1: ±3.92', '1-sigma', [1, 1, 1, 1], 3.92, 0.005],
    ['9.2.3: all rectangular, u = 1: ±3.88', 'anywhere', [root3, root3, root3, root3], 3.88, 0.005],
    ['9.2.4: all rectangular, one with u = 10: ±17.0', 'anywhere', [root3, root3, root3, 10 * root3], 17, 0.05],
  ] as const)('%s', (_, meaning, halves, end, rounding) => {
    const share = interval(meaning, halves)
    expect(share(end - rounding)).toBeLessThan(0.975 + DEVIATION)
    expect(share(end + rounding)).toBeGreaterThan(0.975 - DEVIATION)
  })
})

describe('0.5, 0.3, 0.2 and 0.8 dB (physics.md W15, computed there)', () => {
  it('are 1.8 dB at worst, 1.00995 dB as a root of the sum of squares; anywhere within, σ is 0.583095 dB', () => {
    const parts = [0.5, 0.3, 0.2, 0.8]
    const lines = Object.fromEntries(
      parts.map((t, n) => [`l${n}`, line(`b${n}`, '1 dB', { tolerancePlus: `${t} dB`, group: `g${n}` })]),
    )
    const [allowance] = evaluate(link({ lines }), new Map()).allowances
    expect(allowance?.worstDb).toBeCloseTo(5.8, 12)
    expect(allowance?.rssDb).toBeCloseTo(1.00995, 5)
    expect(Math.hypot(...parts.map((t) => sigmaOf(t, 'anywhere')))).toBeCloseTo(0.583095, 6)
  })
})
