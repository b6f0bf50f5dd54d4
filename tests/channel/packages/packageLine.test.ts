import { describe, expect, it } from 'vitest'
import { insertionLoss } from '../../../lib/channel/networks'
import { type PackageLine, packageAttenuation, packageTwoPort } from '../../../lib/channel/packages'
import { packagePropagation } from '../../../lib/channel/packages/packageLine'

const HZ = Float64Array.of(0, 1e9, 12.890625e9, 26.5625e9)
const parameters = { gamma0: 0, a1: 1.734e-3 * Math.sqrt(1e-9) * 1e3, a2: 1.455e-10, tau: 6.141e-9 }
const one: PackageLine = {
  parameters,
  sections: [{ length: 0.03, impedance: 78.2 }],
  ballCapacitance: 0.18e-12,
  mirrored: false,
}

describe('the line of a package', () => {
  it('has γ = γ0 at 0 Hz, and no logarithm at 1 GHz: a1(1 + j) + a2 + j2πτ per mm (the form from memory)', () => {
    const { alpha, beta } = packagePropagation({ ...parameters, gamma0: 0.5 }, 78.2, HZ)
    expect([alpha[0], beta[0]]).toEqual([0.5, 0])
    expect(alpha[1]).toBeCloseTo(0.5 + (1.734e-3 + 1.455e-4) * 1e3, 12)
    expect(beta[1]).toBeCloseTo((1.734e-3 + 2 * Math.PI * 6.141e-3) * 1e3, 9)
  })

  it('parts its attenuation into conductor and dielectric, and γ0 is of neither', () => {
    const { alpha, conductor, dielectric } = packagePropagation({ ...parameters, gamma0: 0.5 }, 78.2, HZ)
    for (let k = 0; k < HZ.length; k++)
      expect((alpha[k] as number) - (conductor[k] as number) - (dielectric[k] as number)).toBeCloseTo(0.5, 12)
  })

  it('of no length and without ball is the ideal through, and counts nothing', () => {
    const none = { ...one, sections: [{ length: 0, impedance: 78.2 }], ballCapacitance: 0 }
    expect(Array.from(insertionLoss(packageTwoPort(none, HZ, 100)))).toEqual(
      Array.from(HZ, () => expect.closeTo(0, 12)),
    )
    expect(Array.from(packageAttenuation(none, HZ))).toEqual([0, 0, 0, 0])
  })

  it('matched and without ball loses just its attenuation', () => {
    const matched = { ...one, sections: [{ length: 0.03, impedance: 92.5 }], ballCapacitance: 0 }
    const db = insertionLoss(packageTwoPort(matched, HZ, 92.5))
    const attenuation = packageAttenuation(matched, HZ)
    for (let k = 0; k < HZ.length; k++) expect(db[k]).toBeCloseTo(attenuation[k] as number, 12)
  })

  it('turned round swaps its ends and passes the same', () => {
    const two = { ...one, sections: [...one.sections, { length: 0.0018, impedance: 92.5 }] }
    const forward = packageTwoPort(two, HZ, 100)
    const back = packageTwoPort({ ...two, mirrored: true }, HZ, 100)
    for (let k = 0; k < HZ.length; k++)
      for (const [a, b] of [
        [0, 6],
        [1, 7],
        [4, 4],
        [5, 5],
        [6, 0],
        [7, 1],
      ] as const)
        expect(back[8 * k + a]).toBeCloseTo(forward[8 * k + b] as number, 12)
  })

  it('in two sections of one impedance is one of the whole length', () => {
    const split = {
      ...one,
      sections: [
        { length: 0.01, impedance: 78.2 },
        { length: 0.02, impedance: 78.2 },
      ],
    }
    const whole = packageTwoPort(one, HZ, 100)
    const parts = packageTwoPort(split, HZ, 100)
    for (let i = 0; i < whole.length; i++) expect(parts[i]).toBeCloseTo(whole[i] as number, 12)
    expect(packageAttenuation(split, HZ)[3]).toBeCloseTo(packageAttenuation(one, HZ)[3] as number, 12)
  })
})
