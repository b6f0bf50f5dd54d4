import { describe, expect, it } from 'vitest'
import { bulkAttenuation, twinaxFloor, wireDiameter } from '../../../lib/channel/cables'

describe('the bulk of a cable', () => {
  it('is k1·√f + k2·f + k3·f² with f in GHz (by hand)', () => {
    const db = bulkAttenuation({ root: 0.9, linear: 0.05, square: 0.002 }, Float64Array.of(0, 1e9, 16e9))
    expect(Array.from(db)).toEqual([0, expect.closeTo(0.952, 12), expect.closeTo(3.6 + 0.8 + 0.512, 12)])
  })
})

describe('the floor of twin-axial cable', () => {
  it('falls as the diameter, the impedance and the root of the frequency say', () => {
    const floor = twinaxFloor(0.3e-3, 100, 10e9)
    expect(twinaxFloor(0.6e-3, 100, 10e9)).toBeCloseTo(floor / 2, 12)
    expect(twinaxFloor(0.3e-3, 85, 10e9)).toBeCloseTo(floor / 0.85, 12)
    expect(twinaxFloor(0.3e-3, 100, 40e9)).toBeCloseTo(floor * 2, 12)
  })

  it('has the diameters of ASTM B258’s two fixed gauges: 36 is 0.005 in, 0000 (−3) is 0.46 in', () => {
    expect(wireDiameter(36)).toBeCloseTo(0.127e-3, 12)
    expect(wireDiameter(-3)).toBeCloseTo(0.46 * 0.0254, 12)
  })
})
