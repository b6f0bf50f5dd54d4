import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { extremeOf, groupedRootSumSquare, type Meaning, sigmaOf } from '../../lib/channel/statistics'

describe('what ± means (JCGM 100:2008, 4.3.7 and table G.1)', () => {
  it.each([
    ['limit', 0.1, 0.3],
    ['3-sigma', 0.1, 0.3],
    ['1-sigma', 0.3, 0.9],
    ['95-percent', 0.3 / 1.96, 0.9 / 1.96],
    ['anywhere', 0.3 / Math.sqrt(3), 0.3],
  ] as const)('%s', (meaning: Meaning, sigma, extreme) => {
    expect(sigmaOf(0.3, meaning)).toBeCloseTo(sigma, 12)
    expect(extremeOf(0.3, meaning)).toBeCloseTo(extreme, 12)
  })
})

describe('grouped root of the sum of squares', () => {
  it('0.5, 0.3, 0.2 and 0.8 on their own are 1.00995 (physics.md W15)', () => {
    const parts = [0.5, 0.3, 0.2, 0.8].map((value, n) => ({ group: String(n), value }))
    expect(groupedRootSumSquare(parts)).toBeCloseTo(1.00995, 5)
  })

  it('in one group they are 1.8, the worst case (physics.md W15)', () => {
    expect(groupedRootSumSquare([0.5, 0.3, 0.2, 0.8].map((value) => ({ group: 'lot', value })))).toBeCloseTo(1.8, 12)
  })

  it('lies between independent and all together, however grouped (random)', () => {
    const part = fc.record({
      group: fc.constantFrom('a', 'b', 'c', 'd'),
      value: fc.double({ min: 0, max: 9, noNaN: true }),
    })
    fc.assert(
      fc.property(fc.array(part), (parts) => {
        const grouped = groupedRootSumSquare(parts)
        const apart = Math.hypot(...parts.map(({ value }) => value))
        const together = parts.reduce((sum, { value }) => sum + value, 0)
        expect(grouped).toBeGreaterThanOrEqual(apart - 1e-9)
        expect(grouped).toBeLessThanOrEqual(together + 1e-9)
      }),
    )
  })
})
