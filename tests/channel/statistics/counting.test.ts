import { describe, expect, it } from 'vitest'
import { fillNormal, fractionOf, percentileOf, streamOf } from '../../../lib/channel/statistics'

const SEED = 907

describe('percentiles', () => {
  it('are order statistics: 15, 20, 35, 40, 50 (Hyndman & Fan 1996, type 1; textbook sample, common practice)', () => {
    const sorted = Float64Array.of(15, 20, 35, 40, 50)
    const found = [0.05, 0.3, 0.4, 0.5, 1].map((p) => percentileOf(sorted, p).value)
    expect(found).toEqual([15, 20, 20, 35, 50])
  })

  it('take the rank that pN is, where rounding puts it a hair above', () => {
    const sorted = Float64Array.from({ length: 1000 }, (_, n) => n + 1)
    for (const rank of [1, 7, 290, 550, 570, 990, 997, 1000]) {
      expect(percentileOf(sorted, rank / 1000).value).toBe(rank)
    }
  })

  it('of one sample are it, and its error is not known to be more than 0', () => {
    expect(percentileOf(Float64Array.of(3), 0.5)).toEqual({ value: 3, error: 0 })
  })

  it(`carry the standard error √(p(1 − p)/N)/pdf (JCGM 101, from memory), seed ${SEED}`, () => {
    const n = 100_000
    const sorted = new Float64Array(n)
    fillNormal(streamOf(SEED, 'percentiles'), sorted)
    sorted.sort()
    // Percentiles of the normal distribution by SciPy 1.17, norm.ppf; the density shown by 2√(Np(1 − p)) ranks is as rough as they are few.
    for (const [p, x, rough] of [
      [0.5, 0, 0.25],
      [0.9, 1.2815515655446004, 0.3],
      [0.997, 2.7477813854449926, 0.7],
    ] as const) {
      const density = Math.exp(-0.5 * x * x) / Math.sqrt(2 * Math.PI)
      const exact = Math.sqrt((p * (1 - p)) / n) / density
      const { value, error } = percentileOf(sorted, p)
      expect(Math.abs(value - x)).toBeLessThan(4 * exact)
      expect(Math.abs(error / exact - 1)).toBeLessThan(rough)
    }
  })
})

describe('a share found by counting, with its 95 % interval (SciPy 1.17, binomtest(...).proportion_ci(method="wilson"))', () => {
  it.each([
    [8, 10, 0.4901624715366418, 0.9433178485456248],
    [0, 20, 0, 0.16112515805281935],
    [986, 1000, 0.9766379658824643, 0.991642424869576],
  ])('%i of %i', (hits, trials, low, high) => {
    const found = fractionOf(hits, trials)
    expect(found.value).toBe(hits / trials)
    expect(found.low).toBeCloseTo(low, 4)
    expect(found.high).toBeCloseTo(high, 4)
  })
})
