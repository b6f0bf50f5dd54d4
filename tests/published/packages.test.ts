import { describe, expect, it } from 'vitest'
import { cascade, insertionLoss, returnLoss } from '../../lib/channel/networks'
import { type PackageLine, packageAttenuation, packageTwoPort } from '../../lib/channel/packages'
import { shuntCapacitance } from '../../lib/channel/pads'

/** γ0 1/mm, a1 √ns/mm, a2 ns/mm, τ ns/mm in SI; the same for both generations. */
const parameters = { gamma0: 0, a1: 1.734e-3 * Math.sqrt(1e-9) * 1e3, a2: 1.455e-4 * 1e-6, tau: 6.141e-3 * 1e-6 }

function figures(zp: number, impedance: number, die: number, ball: number, hz: number) {
  const at = Float64Array.of(hz)
  const bare: PackageLine = {
    parameters,
    sections: [{ length: zp * 1e-3, impedance }],
    ballCapacitance: 0,
    mirrored: false,
  }
  const line = packageTwoPort(bare, at, 100)
  const whole = cascade(
    [shuntCapacitance(die, at, 100), packageTwoPort({ ...bare, ballCapacitance: ball }, at, 100)],
    1,
  )
  return {
    attenuation: packageAttenuation(bare, at)[0],
    line: insertionLoss(line)[0],
    lineReflection: returnLoss(line, 1)[0],
    whole: insertionLoss(whole)[0],
    wholeReflection: returnLoss(whole, 1)[0],
  }
}

describe('reference packages of IEEE 802.3 (form and parameters from memory, figures recomputed from them)', () => {
  it('D15, W11: 802.3bj, 30 mm at 12.890625 GHz: 2.1110 dB of line, 2.2273 in 100 Ω, 3.6766 with die and ball (from memory)', () => {
    const found = figures(30, 78.2, 250e-15, 180e-15, 12.890625e9)
    expect(found.attenuation).toBeCloseTo(2.111, 4)
    expect(found.line).toBeCloseTo(2.2273, 4)
    expect(found.lineReflection).toBeCloseTo(17.635, 3)
    expect(found.whole).toBeCloseTo(3.6766, 4)
    expect(found.wholeReflection).toBeCloseTo(6.003, 3)
  })

  it('W11: 802.3bj, 12 mm: 0.8444 dB of line, 3.0286 with die and ball (from memory)', () => {
    const found = figures(12, 78.2, 250e-15, 180e-15, 12.890625e9)
    expect(found.attenuation).toBeCloseTo(0.8444, 4)
    expect(found.whole).toBeCloseTo(3.0286, 4)
  })

  it('W11: 802.3cd, 30 mm at 13.28125 GHz: 2.1502 and 3.2589 dB (Zc, Cd, Cp, zp read in an ad hoc of 2016; the rest from memory)', () => {
    const found = figures(30, 90, 180e-15, 110e-15, 13.28125e9)
    expect(found.attenuation).toBeCloseTo(2.1502, 4)
    expect(found.whole).toBeCloseTo(3.2589, 4)
  })
})
