import { describe, expect, it } from 'vitest'
import { barrelImpedance, barrelLine, barrelPairImpedance, secondWave } from '../../../lib/channel/vias/barrel'

const MM = 1e-3

describe('a single barrel', () => {
  it('of 0.25 mm in 0.75 mm, εr 3.8, is 33.79 Ω (Pozar’s coaxial line; physics.md 5)', () => {
    expect(barrelImpedance(0.25 * MM, 0.75 * MM, 3.8)).toBeCloseTo(33.79, 2)
  })
})

describe('a pair of barrels', () => {
  it('whose antipads do not meet is two coaxial lines, up to the very touch', () => {
    for (const pitch of [0.75, 1, 5]) {
      const pair = { barrel: 0.25 * MM, antipad: 0.75 * MM, pitch: pitch * MM }
      expect(barrelPairImpedance(pair, 3.8)).toBeCloseTo(2 * barrelImpedance(0.25 * MM, 0.75 * MM, 3.8), 12)
    }
    const nearly = { barrel: 0.25 * MM, antipad: 0.75 * MM, pitch: 0.75 * MM * (1 - 1e-9) }
    expect(barrelPairImpedance(nearly, 3.8)).toBeCloseTo(2 * barrelImpedance(0.25 * MM, 0.75 * MM, 3.8), 6)
  })

  it('far from planes is the twin rods of (η0/π)/√εr · acosh(pitch/d) (from memory), within 0.02 % at 24 diameters', () => {
    const rods = (119.9169832 / Math.sqrt(3.8)) * Math.acosh(24)
    expect(barrelPairImpedance({ barrel: 0.25 * MM, antipad: 10, pitch: 6 * MM }, 3.8) / rods).toBeCloseTo(1, 3)
  })

  // ln(2ρ/d) by a boundary-element solution with 800 elements each on barrel and antipad, the wall by images (numpy, own, ±2e-4).
  it.each([
    [0.25, 0.75, 0.74, 1.09773, 0.001],
    [0.2, 1, 0.8, 1.56719, 0.001],
    [0.02, 1, 0.3, 3.28288, 0.001],
    [0.02, 1, 0.5, 3.65005, 0.001],
    [0.25, 1, 0.6, 1.21943, 0.01],
    [0.25, 1, 0.5, 1.10467, 0.02],
    [0.2, 20, 0.4, 1.31617, 0.055],
  ])(
    'barrel %f, antipad %f, pitch %f mm: a boundary-element solution gives %f (numpy), within %f',
    (barrel, antipad, pitch, solved, within) => {
      const ohms = barrelPairImpedance({ barrel: barrel * MM, antipad: antipad * MM, pitch: pitch * MM }, 1)
      const ratio = ohms / (119.9169832 * solved)
      expect(Math.abs(ratio - 1)).toBeLessThan(within)
      // Thick barrels near each other are taken too high, never too low.
      expect(ratio).toBeGreaterThan(0.9999)
    },
  )

  it('gets its second wave where the mean circumference is a wave long: 0.25 in 0.75 mm, εr 3.8: 97.9 GHz (Pozar, by hand)', () => {
    expect(secondWave(0.25 * MM, 0.75 * MM, 3.8) / 1e9).toBeCloseTo(299.792458 / (Math.sqrt(3.8) * Math.PI * 0.5), 9)
  })
})

describe('the barrel as a line', () => {
  it('loses π f √εr tan δ / c at low loss: 91.0214 dB/m at 1 GHz, εr 1, tan δ 1 (formula of Pozar; physics.md 2.2), to first order', () => {
    const { alpha, beta, zRe, zIm } = barrelLine(50, 4, 0.001, Float64Array.of(10e9))
    expect((alpha[0] as number) * (20 / Math.LN10)).toBeCloseTo(91.0214 * 10 * 2 * 0.001, 4)
    expect(beta[0]).toBeCloseTo((2 * Math.PI * 10e9 * 2) / 299792458, 3)
    expect([zRe[0], zIm[0]]).toEqual([expect.closeTo(50, 3), expect.closeTo(0.025, 5)])
  })

  it('has γ² = −(ω√εr/c)²(1 − j·tan δ) and γ·Z free of loss for any loss tangent (by complex numbers)', () => {
    const { alpha, beta, zRe, zIm } = barrelLine(40, 3.5, 0.2, Float64Array.of(5e9))
    const [a = 0, b = 0, r = 0, x = 0] = [alpha[0], beta[0], zRe[0], zIm[0]]
    const k = (2 * Math.PI * 5e9 * Math.sqrt(3.5)) / 299792458
    expect(a * a - b * b).toBeCloseTo(-k * k, 6)
    expect(2 * a * b).toBeCloseTo(0.2 * k * k, 6)
    expect([a * r - b * x, a * x + b * r]).toEqual([expect.closeTo(0, 9), expect.closeTo(40 * k, 6)])
  })
})
