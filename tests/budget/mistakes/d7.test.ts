import { describe, expect, it } from 'vitest'
import { copperFloor } from '../../../lib/channel/lines/copperFloor'
import { PAIR } from '../crossSections'
import { line } from '../links'
import { evaluated, flagged, words } from './flagged'

const geometry = (rest: object = {}) => line('a1', null, { ...PAIR, ...rest })
const one = (rest: object) => ({ lines: { g: geometry(rest) } })

describe('mistake 7: Dk and Df far from Nyquist, smooth and dry, models kinder than their coupon (practice A11; common practice, no source)', () => {
  it('an anchor under a third or over three times the Nyquist frequency of 10 GHz', () => {
    expect(flagged('anchor-far', one({ anchor: '1 GHz' }))).toEqual(['g anchor'])
    expect(flagged('anchor-far', one({ anchor: '3.4 GHz' }))).toEqual([])
    expect(flagged('anchor-far', one({ anchor: '29.9 GHz' }))).toEqual([])
    expect(flagged('anchor-far', one({ anchor: '31 GHz' }))).toEqual(['g anchor'])
  })

  it('of a stack-up that lines are computed from, it hangs at the layer', () => {
    const parts = {
      assemblies: { b: { order: 'a0', name: 'Board' } },
      layers: {
        l3: { order: 'a1', name: 'L3', assembly: 'b', role: 'signal' as const, thickness: '15 µm' },
        p: {
          order: 'a2',
          name: 'P',
          assembly: 'b',
          role: 'prepreg' as const,
          thickness: '150 µm',
          dk: '3.6',
          df: '0.004',
          anchor: '1 GHz',
        },
      },
      lines: { g: geometry({ assembly: 'b', layer: 'L3' }) },
    }
    expect(flagged('anchor-far', parts)).toEqual(['p anchor'])
  })

  it('smooth copper where foils are not smooth', () => {
    expect(flagged('smooth-copper', one({ roughness: 'smooth' }))).toEqual(['g roughness'])
    expect(flagged('smooth-copper', one({}))).toEqual([])
  })

  it('without the method or the resin content of its Dk and Df', () => {
    expect(flagged('laminate-unproven', one({ method: null }))).toEqual(['g method'])
    expect(flagged('laminate-unproven', one({ resin: null }))).toEqual(['g resin'])
    expect(words('laminate-unproven', one({ method: null, resin: null }))).toMatch(/the method and the resin content/)
    expect(flagged('laminate-unproven', one({}))).toEqual([])
  })

  it('a class that nobody measured, more than a tenth under a measured one of the same layer and width', () => {
    const lossClass = (order: string, perLength: string, basis: 'measured' | 'simulated', width = '5 mil') => ({
      order,
      name: `L3 ${basis}`,
      assembly: 'b',
      layer: 'L3',
      width,
      lossPerLength: `${perLength} dB/in`,
      at: '10 GHz',
      basis,
    })
    const parts = (model: string, coupon: string, width?: string) => ({
      assemblies: { b: { order: 'a0', name: 'Board' } },
      lossClasses: { m: lossClass('a0', model, 'simulated'), c: lossClass('a1', coupon, 'measured', width) },
      lines: {
        t: line('a1', null, {
          kind: 'trace',
          model: 'class',
          lossClass: 'm',
          assembly: 'b',
          length: '5 in',
          basis: null,
        }),
      },
    })
    expect(flagged('model-below-coupon', parts('0.89', '1.00'))).toEqual(['t lossClass'])
    expect(words('model-below-coupon', parts('0.89', '1.00'))).toMatch(
      /comes to 0\.89 dB\/in; the measured loss class 'L3 measured' .* has 1 dB\/in/,
    )
    expect(flagged('model-below-coupon', parts('0.91', '1.00'))).toEqual([])
    expect(flagged('model-below-coupon', parts('0.89', '1.00', '6 mil'))).toEqual([])
  })
})

describe('mistake 7: an attenuation that copper alone exceeds', () => {
  /** Worked W3 of physics.md (Wheeler's rule, recomputed there): 5 mil, 0.6 mil thick, 54.41 Ω, smooth: conductor 0.2278, 0.3658, 0.5252 dB/in. */
  it.each([
    [5e9, 0.2278],
    [12.890625e9, 0.3658],
    [26.5625e9, 0.5252],
  ])('the floor at %d Hz lies under the conductor loss of a real smooth stripline, %d dB/in', (hz, perInch) => {
    const floor = copperFloor(127e-6, 2 * 54.41, hz, 15.24e-6) * 0.0254
    expect(floor).toBeLessThan(perInch)
    expect(floor).toBeGreaterThan(0.4 * perInch)
  })

  it('is Rs / (perimeter · Z) in nepers, times 0.9: Rs(1 GHz, 5.8e7 S/m) = 8.25023 mΩ (physics.md D3)', () => {
    const byHand = (0.9 * 8.685889638 * 8.25023e-3) / (2 * (127e-6 + 70e-6) * 100)
    expect(copperFloor(127e-6, 100, 1e9)).toBeCloseTo(byHand, 4)
  })

  it('the rule of thumb (36/(w·Z0)) √f dB/in lies above the floor: there one surface carries everything (from memory)', () => {
    const rule = (36 / (5 * 50)) * Math.sqrt(10)
    expect(copperFloor(127e-6, 100, 10e9, 15e-6) * 0.0254).toBeLessThan(rule)
  })

  it('a number under the floor of its width is refused', () => {
    const trace = (lossPerLength: string) => ({
      lines: {
        t: line('a1', null, {
          kind: 'trace',
          model: 'per-length',
          length: '5 in',
          width: '5 mil',
          impedance: '100 Ω',
          lossPerLength,
        }),
      },
    })
    // 0.9 · 8.686 · 26.09 mΩ / (394 µm · 100 Ω) = 5.18 dB/m = 0.1315 dB/in at 10 GHz.
    expect(flagged('below-copper-floor', trace('0.13 dB/in'))).toEqual(['t lossPerLength'])
    expect(evaluated(trace('0.13 dB/in')).lines.t?.loss.nominalDb).toBeNull()
    expect(flagged('below-copper-floor', trace('0.14 dB/in'))).toEqual([])
    expect(evaluated(trace('0.14 dB/in')).lines.t?.loss.nominalDb).toBeCloseTo(0.7, 12)
  })
})
