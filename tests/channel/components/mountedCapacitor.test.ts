import { describe, expect, it } from 'vitest'
import { inductanceCorner, mountedCapacitor } from '../../../lib/channel/components'
import { seriesCapacitor } from '../../../lib/channel/components/seriesCapacitor'
import { fromChain, insertionLoss, network } from '../../../lib/channel/networks'

const THROUGH = [0, 0, 1, 0, 1, 0, 0, 0]
const part = { capacitance: 220e-9, resistance: 0.05, inductance: 0.3e-9 }
const plain = (s: Float64Array) => Array.from(s, (x) => x + 0)

describe('a capacitor in each conductor', () => {
  it('without resistance and inductance, and as its capacitance grows without end, is the ideal through', () => {
    const s = seriesCapacitor({ capacitance: 1e12, resistance: 0, inductance: 0 }, Float64Array.of(1, 1e9, 1e11), 100)
    for (let i = 0; i < 24; i++) expect(s[i]).toBeCloseTo(THROUGH[i % 8] as number, 13)
  })

  it('passes nothing at 0 Hz and reflects everything', () => {
    expect(plain(seriesCapacitor(part, Float64Array.of(0), 100))).toEqual([1, 0, 0, 0, 0, 0, 1, 0])
  })

  it('has its lower corner at 1/(2πC(R + R_s)), 7.2 kHz for 220 nF in 100 Ω: 3.01 dB (by hand)', () => {
    const corner = 1 / (2 * Math.PI * 220e-9 * 100)
    expect(corner).toBeCloseTo(7234.3, 1)
    const ideal = { ...part, resistance: 0, inductance: 0 }
    expect(insertionLoss(seriesCapacitor(ideal, Float64Array.of(corner), 100))[0]).toBeCloseTo(10 * Math.log10(2), 12)
  })

  it('is only its resistance at series resonance: 20 log10(1 + R_s/R) (by hand)', () => {
    const resonance = 1 / (2 * Math.PI * Math.sqrt(part.capacitance * part.inductance))
    const s = seriesCapacitor({ ...part, resistance: 2 }, Float64Array.of(resonance), 100)
    expect(insertionLoss(s)[0]).toBeCloseTo(20 * Math.log10(1.02), 9)
  })

  it('far above is its inductance, half of the power at ωL = R (by hand)', () => {
    const corner = inductanceCorner(0.3e-9, 100)
    expect(corner).toBeCloseTo(100 / (2 * Math.PI * 0.3e-9), 0)
    const s = seriesCapacitor({ ...part, resistance: 0 }, Float64Array.of(corner), 100)
    expect(insertionLoss(s)[0]).toBeCloseTo(10 * Math.log10(2), 5)
  })
})

describe('between its pads', () => {
  it('is the chain of the elements’ ABCD matrices (Frickey 1994, by another way to S)', () => {
    const hz = Float64Array.of(1e4, 1e6, 1e9, 26.5625e9)
    const pads = 60e-15
    const chain = new Float64Array(8 * hz.length)
    for (const [k, f] of hz.entries()) {
      // Per conductor at twice: B of the pair is 2Z, C is Y/2; A = D = 1 + Z·Y with Z and Y of one conductor.
      const w = 2 * Math.PI * f
      const [zr, zi] = [part.resistance, w * part.inductance - 1 / (w * part.capacitance)]
      const y = w * pads
      const [ar, ai] = [1 - zi * y, zr * y]
      // C of one conductor is 2Y + Z·Y², with Y = jy.
      chain.set([ar, ai, 2 * zr, 2 * zi, (-zr * y * y) / 2, (2 * y - zi * y * y) / 2, ar, ai], 8 * k)
    }
    const expected = fromChain(hz, chain, network(2, hz, chain, 100).reference)
    if ('reason' in expected) throw new Error(expected.reason)
    const s = mountedCapacitor(part, pads, hz, 100)
    for (let i = 0; i < s.length; i++) expect(s[i]).toBeCloseTo(expected.s[i] as number, 11)
  })

  it('without pads is the capacitor alone', () => {
    const hz = Float64Array.of(1e6, 10e9)
    expect(plain(mountedCapacitor(part, 0, hz, 85))).toEqual(plain(seriesCapacitor(part, hz, 85)))
  })
})
