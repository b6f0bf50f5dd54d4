import { describe, expect, it } from 'vitest'
import { insertionLoss } from '../../lib/channel/networks'
import { stubResonance } from '../../lib/channel/vias'
import { barrelImpedance } from '../../lib/channel/vias/barrel'
import { viaCapacitance } from '../../lib/channel/vias/pads'
import { stubTwoPort } from '../../lib/channel/vias/stub'

const MM = 1e-3
const INCH = 25.4 * MM

/** dB of a stub whose single-ended impedance and reference are doubled to the pair's. */
const stubLoss = (length: number, dk: number, single: number, hz: number) =>
  insertionLoss(stubTwoPort({ length, impedance: 2 * single, dk, df: 0 }, Float64Array.of(hz), 100))[0]

describe('vias of text books', () => {
  it('W8: εr 4.7, 63 mil, 28 mil in 50 mil is 0.53 pF (si-list att-0231; 0.51 in the printed book, from memory)', () => {
    expect(viaCapacitance(0.063 * INCH, 0.028 * INCH, 0.05 * INCH, 4.7) * 1e12).toBeCloseTo(0.5314, 4)
  })

  it('a barrel of 0.25 mm in an antipad of 0.75 mm, εr 3.8: 33.79 Ω by η0; the rounded 60 gives 0.07 % more', () => {
    const ohms = barrelImpedance(0.25 * MM, 0.75 * MM, 3.8)
    expect(ohms).toBeCloseTo(33.79, 2)
    expect((60 / Math.sqrt(3.8)) * Math.log(3)).toBeCloseTo(ohms * 1.00069, 3)
  })

  it('D12, W9: 1.5 mm, εr 4, 40 Ω in 50 Ω: resonance 24.983 GHz, 1.5591 dB at 12.890625 GHz', () => {
    expect(stubResonance(1.5 * MM, 4) / 1e9).toBeCloseTo(24.9827, 4)
    expect(stubLoss(1.5 * MM, 4, 40, 12.890625e9)).toBeCloseTo(1.5591, 4)
  })

  it('W9 as well: 0.25 mm and 1 mm, εr 5, 40 Ω in 50 Ω at 26.5625 GHz: 0.1721 and 6.453 dB', () => {
    expect(stubLoss(0.25 * MM, 5, 40, 26.5625e9)).toBeCloseTo(0.1721, 4)
    expect(stubLoss(1 * MM, 5, 40, 26.5625e9)).toBeCloseTo(6.453, 3)
  })

  it('at a third of its resonance a stub of 40 Ω in 50 Ω costs 0.532 dB (engineering guidance, from memory)', () => {
    expect(stubLoss(1 * MM, 4, 40, stubResonance(1 * MM, 4) / 3)).toBeCloseTo(0.532, 3)
  })

  it('where pages print otherwise, the quarter wave counts: 0.8 mm, εr 4.2 is 45.71 GHz and 1.4 mm, εr 4.3 is 25.82 GHz (a page says 5.3)', () => {
    expect(stubResonance(0.8 * MM, 4.2) / 1e9).toBeCloseTo(45.714, 3)
    expect(stubResonance(1.4 * MM, 4.3) / 1e9).toBeCloseTo(25.82, 2)
    // DesignCon 2025, p. 1337, prints 0.67 and 0.30 mm for 106 GHz.
    expect(stubResonance(0.70706 * MM, 1) / 1e9).toBeCloseTo(106, 2)
    expect(stubResonance(0.4767 * MM, 2.2) / 1e9).toBeCloseTo(106, 1)
  })
})
