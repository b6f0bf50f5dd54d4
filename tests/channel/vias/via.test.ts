import { describe, expect, it } from 'vitest'
import { lineTwoPort } from '../../../lib/channel/lines/lineTwoPort'
import { cascade, insertionLoss } from '../../../lib/channel/networks'
import { type Via, viaTwoPort } from '../../../lib/channel/vias'
import { barrelLine, barrelPairImpedance } from '../../../lib/channel/vias/barrel'
import { padExcess, viaCapacitance } from '../../../lib/channel/vias/pads'
import { stubTwoPort } from '../../../lib/channel/vias/stub'

const MM = 1e-3
const HZ = Float64Array.of(0, 1e9, 12.890625e9, 26.5625e9, 53.125e9)
const geometry: Via = {
  barrel: 0.2 * MM,
  pad: 0.45 * MM,
  antipad: 0.8 * MM,
  pitch: 0.9 * MM,
  usedDepth: 1.2 * MM,
  stub: 0.25 * MM,
  dk: 4,
  df: 0,
}
const plain = (s: Float64Array) => Array.from(s, (x) => x + 0)

/** Power that is neither passed nor reflected. */
const lost = (s: Float64Array) =>
  HZ.map((_, k) => 1 - [0, 1, 4, 5].reduce((sum, part) => sum + (s[8 * k + part] as number) ** 2, 0))

describe('a stub', () => {
  it('of no length is the ideal through: no loss at all', () => {
    const s = stubTwoPort({ length: 0, impedance: 80, dk: 4, df: 0.02 }, HZ, 100)
    for (let k = 0; k < HZ.length; k++) expect(plain(s.subarray(8 * k, 8 * k + 8))).toEqual([0, 0, 1, 0, 1, 0, 0, 0])
  })

  it('with dielectric loss has a notch of finite depth: Z·2/R·tan δ·π/4 passes at resonance (low loss, by hand)', () => {
    // At a quarter wave coth γL = tanh αL ≈ αL = (π/4)·tan δ, so Y·R = R/(Z αL).
    const df = 0.002
    const s = stubTwoPort({ length: 1.5 * MM, impedance: 80, dk: 4, df }, Float64Array.of(24.98270483e9), 100)
    const y = 100 / (80 * (Math.PI / 4) * df)
    expect(insertionLoss(s)[0]).toBeCloseTo(20 * Math.log10(1 + y / 2), 1)
    const dry = stubTwoPort({ length: 1.5 * MM, impedance: 80, dk: 4, df: 0 }, Float64Array.of(24.98270483e9), 100)
    expect(insertionLoss(dry)[0]).toBeGreaterThan(100)
  })

  it('without loss loses no power', () => {
    for (const left of lost(stubTwoPort({ length: 1 * MM, impedance: 80, dk: 4, df: 0 }, HZ, 100)))
      expect(left).toBeCloseTo(0, 12)
  })
})

describe('pads', () => {
  it('add what the whole via has over its barrel: 70.7 − 48.8 pF/m times εr (by hand, inches of physics.md W8)', () => {
    const inch = 0.0254
    const excess = padExcess(0.063 * inch, 0.016 * inch, 0.028 * inch, 0.05 * inch, 4.7)
    const line = (2 * Math.PI * 8.8541878128e-12 * 4.7 * 0.063 * inch) / Math.log(50 / 16)
    expect(viaCapacitance(0.063 * inch, 0.028 * inch, 0.05 * inch, 4.7) - line).toBeCloseTo(excess, 18)
    expect(excess * 1e12).toBeCloseTo(0.1642, 3)
  })

  it('add nothing where they are hardly wider than the barrel', () => {
    expect(padExcess(1 * MM, 0.25 * MM, 0.25 * MM, 0.75 * MM, 4)).toBe(0)
  })
})

describe('a via', () => {
  it('without stub and pads is its barrel: a line over the used depth', () => {
    const bare = { ...geometry, stub: 0, pad: geometry.barrel }
    const line = lineTwoPort(barrelLine(barrelPairImpedance(bare, 4), 4, 0, HZ), bare.usedDepth, 100)
    const s = viaTwoPort(bare, 1, HZ, 100)
    for (let i = 0; i < s.length; i++) expect(s[i]).toBeCloseTo(line[i] as number, 14)
  })

  it('of no depth and no stub is the ideal through', () => {
    const s = viaTwoPort({ ...geometry, usedDepth: 0, stub: 0 }, 1, HZ, 100)
    for (let k = 0; k < HZ.length; k++)
      for (const [i, expected] of [0, 0, 1, 0, 1, 0, 0, 0].entries()) expect(s[8 * k + i]).toBeCloseTo(expected, 14)
  })

  it('without dielectric loss loses no power, is reciprocal, and passes all at 0 Hz', () => {
    const s = viaTwoPort(geometry, 1, HZ, 100)
    for (const left of lost(s)) expect(left).toBeCloseTo(0, 12)
    for (let k = 0; k < HZ.length; k++)
      expect([s[8 * k + 2], s[8 * k + 3]]).toEqual(
        [s[8 * k + 4], s[8 * k + 5]].map((x) => expect.closeTo(x as number, 13)),
      )
    expect(insertionLoss(s)[0]).toBeCloseTo(0, 12)
  })

  it('with it loses some', () => {
    const left = lost(viaTwoPort({ ...geometry, df: 0.01 }, 1, HZ, 100))
    expect(left[3]).toBeGreaterThan(0.001)
  })

  it('counted once is itself, counted three times is three in a row', () => {
    const one = viaTwoPort(geometry, 1, HZ, 100)
    expect(plain(viaTwoPort(geometry, 3, HZ, 100))).toEqual(
      Array.from(cascade([one, one, one], HZ.length), (x) => expect.closeTo(x, 12)),
    )
  })

  it('loses more at 26.5625 GHz with every step of stub up to the resonance (the law of the open stub)', () => {
    const losses = [0, 0.2, 0.4, 0.8, 1.2].map(
      (stub) => insertionLoss(viaTwoPort({ ...geometry, stub: stub * MM }, 1, HZ, 100))[3] as number,
    )
    for (let k = 1; k < losses.length; k++) expect(losses[k]).toBeGreaterThan(losses[k - 1] as number)
  })
})
