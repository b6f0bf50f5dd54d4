import { describe, expect, it } from 'vitest'
import { bulkAttenuation, twinaxFloor, wireDiameter } from '../../lib/channel/cables'

describe('cable of published tables', () => {
  it.each([
    [26, 0.4049, 0.4039],
    [28, 0.3211, 0.32],
    [30, 0.2546, 0.254],
    [32, 0.2019, null],
    [34, 0.1601, null],
  ])(
    '%i AWG is %f mm by ASTM B258, %f in a vendor’s rounded table (wavesplitter.jp, within 0.4 %)',
    (gauge, exact, listed) => {
      const mm = wireDiameter(gauge) * 1e3
      expect(mm).toBeCloseTo(exact, 4)
      if (listed !== null) expect(Math.abs(mm / listed - 1)).toBeLessThan(0.004)
    },
  )

  it.each([
    [26, 2.02],
    [28, 2.55],
    [30, 3.22],
    [32, 4.06],
    [34, 5.11],
  ])(
    'the inner conductors of %i AWG, 100 Ω, cost %f dB/m at 12.890625 GHz (skin effect of smooth copper, 5.8e7 S/m)',
    (gauge, db) => {
      expect(Math.abs(twinaxFloor(wireDiameter(gauge), 100, 12.890625e9) - db)).toBeLessThan(0.006)
    },
  )

  it('lies under what cable of that gauge usually loses, 3.3 to 8 dB/m from 26 to 34 AWG (typical totals from memory, ±15 %)', () => {
    for (const [gauge, db] of [
      [26, 3.3],
      [28, 4],
      [30, 4.8],
      [32, 6.5],
      [34, 8],
    ] as const) {
      const ratio = db / twinaxFloor(wireDiameter(gauge), 100, 12.890625e9)
      expect(ratio).toBeGreaterThan(1.3)
      expect(ratio).toBeLessThan(1.7)
    }
  })

  it('W12: 2.91 √f + 0.39 f + 0.027 f² is 19.96 dB at 12.89 GHz (an IEEE 802.3 ballot comment)', () => {
    expect(bulkAttenuation({ root: 2.91, linear: 0.39, square: 0.027 }, Float64Array.of(12.89e9))[0]).toBeCloseTo(
      19.961,
      3,
    )
  })
})
