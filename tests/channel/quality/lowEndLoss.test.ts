import { describe, expect, it } from 'vitest'
import { network } from '../../../lib/channel/networks/network'
import { lowEndLoss } from '../../../lib/channel/quality/lowEndLoss'

function through(from: number, step: number, points: number, loss: (hz: number) => number) {
  const hz = Float64Array.from({ length: points }, (_, k) => from + k * step)
  const s = new Float64Array(8 * points)
  for (const [k, f] of hz.entries()) s[8 * k + 4] = 10 ** (-loss(f) / 20)
  return network(2, hz, s, 100)
}

describe('what is left of the loss towards 0 Hz (a file made here; no source)', () => {
  it('finds the constant beside any √f term', () => {
    expect(lowEndLoss(through(1e7, 1e7, 100, (f) => 0.4 + 3 * Math.sqrt(f / 1e9)))).toBeCloseTo(0.4, 9)
    expect(lowEndLoss(through(0, 1e7, 100, (f) => 7 * Math.sqrt(f / 1e9)))).toBeCloseTo(0, 9)
  })

  it('a term with f alone is no loss at the low end', () => {
    expect(lowEndLoss(through(1e7, 1e7, 100, (f) => 3 * (f / 1e9)))).toBeLessThan(0)
  })

  it('says nothing of a file that starts above 100 MHz or is too coarse', () => {
    expect(lowEndLoss(through(2e8, 1e7, 100, () => 1))).toBeNull()
    expect(lowEndLoss(through(1e8, 2e8, 100, () => 1))).toBeNull()
  })
})
