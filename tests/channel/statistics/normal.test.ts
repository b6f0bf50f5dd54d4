import { describe, expect, it } from 'vitest'
import { fillNormal, fillRectangular, streamOf } from '../../../lib/channel/statistics'
import { normalCdf } from '../../../lib/channel/statistics/normal'
import { nextWord } from '../../../lib/channel/statistics/xoshiro'

const SEED = 20261
const N = 400_000
/** Kolmogorov's limit for √N·D that is passed in 0.1 % of all runs (Kolmogorov 1933). */
const KOLMOGOROV_999 = 1.949

function normals(name: string): Float64Array {
  const out = new Float64Array(N)
  fillNormal(streamOf(SEED, name), out)
  return out
}

/** √N times the greatest distance between the samples' distribution and the given one (Kolmogorov & Smirnov). */
function distance(samples: Float64Array, cdf: (x: number) => number): number {
  const sorted = Float64Array.from(samples).sort()
  let most = 0
  sorted.forEach((x, n) => {
    most = Math.max(most, Math.abs(cdf(x) - n / N), Math.abs(cdf(x) - (n + 1) / N))
  })
  return Math.sqrt(N) * most
}

const moment = (samples: Float64Array, k: number) => samples.reduce((sum, x) => sum + x ** k, 0) / N

describe('cumulative normal distribution', () => {
  it.each([
    [-8, 6.22096057427174e-16],
    [-5, 2.866515718791933e-7],
    [-3.2, 0.0006871379379158471],
    [-1, 0.15865525393145707],
    [-0.3, 0.3820885778110474],
    [0, 0.5],
    [0.5, 0.6914624612740131],
    [1.96, 0.9750021048517795],
    [2.2, 0.9860965524865014],
    [4, 0.9999683287581669],
  ])('at %d (SciPy 1.17, norm.cdf)', (x, expected) => {
    expect(Math.abs(normalCdf(x) - expected)).toBeLessThan(2e-15)
  })
})

describe(`normal deviates by the ziggurat, seed ${SEED}, ${N} of each stream`, () => {
  it.each(['a', 'b', 'c'])(
    'have the moments of the normal distribution, within four deviations (stream %s)',
    (name) => {
      const samples = normals(name)
      // Variance of the mean of x^k is (E x^2k − (E x^k)²)/N, by the moments 1, 3, 15, 105 of the normal distribution.
      const off = [0, 1, 0, 3].map((expected, k) => moment(samples, k + 1) - expected)
      const deviations = [1, 2, 15, 96].map((variance) => Math.sqrt(variance / N))
      off.forEach((value, k) => {
        expect(Math.abs(value)).toBeLessThan(4 * (deviations[k] ?? 0))
      })
    },
  )

  it.each(['a', 'b', 'c'])('follow its cumulative distribution (Kolmogorov–Smirnov, stream %s)', (name) => {
    expect(distance(normals(name), normalCdf)).toBeLessThan(KOLMOGOROV_999)
  })

  it('reach past the lowest layer as often as they should, and lie apart from what a wrong width would give', () => {
    const samples = normals('a')
    const beyond = samples.filter((x) => Math.abs(x) > 3.6541528853610088).length
    const expected = 2 * normalCdf(-3.6541528853610088) * N
    expect(Math.abs(beyond - expected)).toBeLessThan(4 * Math.sqrt(expected))
    expect(distance(samples, (x) => normalCdf(x / 1.02))).toBeGreaterThan(KOLMOGOROV_999)
  })

  it('come in the same order however many are filled at once, from the words of the generator', () => {
    const whole = new Float64Array(1000)
    fillNormal(streamOf(SEED, 'a'), whole)
    const stream = streamOf(SEED, 'a')
    const [head, rest] = [new Float64Array(7), new Float64Array(993)]
    fillNormal(stream, head)
    fillNormal(stream, rest)
    expect([...head, ...rest]).toEqual([...whole])
    const plain = streamOf(SEED, 'a')
    let words = 0
    while (words < 2000 && plain.some((word, n) => word !== stream[n])) {
      nextWord(plain)
      words++
    }
    expect(words).toBeGreaterThanOrEqual(1000)
    expect(words).toBeLessThan(1100)
  })
})

describe(`rectangular deviates, seed ${SEED}`, () => {
  const normal = normals('a')
  const rectangular = new Float64Array(N)
  fillRectangular(normal, rectangular)

  it('lie within ±√3, with variance 1 (JCGM 100:2008, 4.3.7: a²/3) and a straight cumulative distribution', () => {
    expect(rectangular.reduce((most, x) => Math.max(most, Math.abs(x)), 0)).toBeLessThanOrEqual(Math.sqrt(3))
    expect(Math.abs(moment(rectangular, 2) - 1)).toBeLessThan(4 * Math.sqrt(0.8 / N))
    expect(distance(rectangular, (x) => 0.5 + x / (2 * Math.sqrt(3)))).toBeLessThan(KOLMOGOROV_999)
  })

  it('rise with the normal deviate that they are made of', () => {
    const few = Float64Array.of(-40, -8, -1, 0, 1e-3, 1, 8, 40)
    const made = new Float64Array(few.length)
    fillRectangular(few, made)
    few.forEach((z, n) => {
      expect(made[n]).toBeCloseTo(Math.sqrt(3) * (2 * normalCdf(z) - 1), 5)
    })
  })
})
