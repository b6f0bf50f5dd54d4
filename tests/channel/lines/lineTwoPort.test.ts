import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { lineTwoPort } from '../../../lib/channel/lines/lineTwoPort'

const one = (alpha: number, beta: number, zRe: number, zIm = 0) => ({
  alpha: Float64Array.of(alpha),
  beta: Float64Array.of(beta),
  zRe: Float64Array.of(zRe),
  zIm: Float64Array.of(zIm),
})
const magnitude = (s: Float64Array, entry: number) => Math.hypot(s[2 * entry] as number, s[2 * entry + 1] as number)
const db = (value: number) => 20 * Math.log10(value)

describe('A uniform line as a two-port', () => {
  it('is nothing at all at length 0, exactly', () => {
    expect([...lineTwoPort(one(3, 200, 85, -2), 0, 100)].map((value) => value + 0)).toEqual([0, 0, 1, 0, 1, 0, 0, 0])
  })

  it('is pure attenuation and delay in its own impedance', () => {
    const s = lineTwoPort(one(2, 10, 100), 0.1, 100)
    expect(magnitude(s, 0)).toBe(0)
    expect(s[2]).toBeCloseTo(Math.exp(-0.2) * Math.cos(1), 14)
    expect(s[3]).toBeCloseTo(-Math.exp(-0.2) * Math.sin(1), 14)
  })

  it('loses 20 log10((Z/R + R/Z)/2) as a quarter wave: 85 in 100 Ω 0.11421 dB, 90 0.04812, 110 0.03939 (conservation of energy)', () => {
    for (const [z, loss] of [
      [85, 0.11421],
      [90, 0.04812],
      [110, 0.03939],
    ] as const) {
      expect(-db(magnitude(lineTwoPort(one(0, Math.PI / 2, z), 1, 100), 1))).toBeCloseTo(loss, 5)
    }
  })

  it('gives the line of the IEEE 802.3bj package, 30 mm of 78.2 Ω at 12.890625 GHz: S21 −2.2273 dB, S11 −17.635 dB (constants from memory)', () => {
    const ghz = 12.890625
    const alpha = 1.734e-3 * Math.sqrt(ghz) + 1.455e-4 * ghz
    const beta =
      1.734e-3 * Math.sqrt(ghz) - 1.455e-4 * ghz * (2 / Math.PI) * Math.log(ghz) + 2 * Math.PI * 6.141e-3 * ghz
    const s = lineTwoPort(one(alpha * 1e3, beta * 1e3, 78.2), 0.03, 100)
    expect(db(magnitude(s, 1))).toBeCloseTo(-2.2273, 4)
    expect(db(magnitude(s, 0))).toBeCloseTo(-17.635, 3)
  })

  it('follows the ABCD matrix of hyperbolic functions (Frickey 1994) with a complex impedance', () => {
    // γl = 0.3 + 0j keeps cosh and sinh real: A = D = cosh, B = Z sinh, C = sinh/Z, S21 = 2/(A + B/R + C·R + D).
    const [zr, zi, r] = [60, -8, 100]
    const [ch, sh] = [Math.cosh(0.3), Math.sinh(0.3)]
    const inverse = zr * zr + zi * zi
    const re = 2 * ch + (zr * sh) / r + (zr / inverse) * sh * r
    const im = (zi * sh) / r - (zi / inverse) * sh * r
    const s = lineTwoPort(one(0.3, 0, zr, zi), 1, r)
    expect(s[2]).toBeCloseTo((2 * re) / (re * re + im * im), 14)
    expect(s[3]).toBeCloseTo((-2 * im) / (re * re + im * im), 14)
    expect(s[0]).toBeCloseTo((s[6] as number) + 0, 14)
  })

  it('keeps its reflection where the far end is lost: S11 is ρ and S21 is 0, without NaN', () => {
    const s = lineTwoPort(one(1e5, 1e4, 150), 1, 100)
    expect(s[0]).toBeCloseTo(0.2, 14)
    expect(s[2]).toBe(0)
    expect(s.every(Number.isFinite)).toBe(true)
  })

  it('keeps the digits of a very short line: S11 is j·βl·(Z/R − R/Z)/2 to first order', () => {
    const s = lineTwoPort(one(0, 1e-9, 50), 1, 100)
    expect((s[1] as number) / -0.75e-9).toBeCloseTo(1, 9)
  })

  it('two halves in cascade are the whole (star product written out)', () => {
    const positive = (min: number, max: number) => fc.double({ min, max, noNaN: true })
    fc.assert(
      fc.property(positive(0, 3), positive(0, 40), positive(20, 200), positive(-10, 10), (alpha, beta, zRe, zIm) => {
        const half = lineTwoPort(one(alpha, beta, zRe, zIm), 0.5, 100)
        const whole = lineTwoPort(one(alpha, beta, zRe, zIm), 1, 100)
        const [rr, ri, tr, ti] = half as unknown as [number, number, number, number]
        // t²/(1 − r²)
        const dr = 1 - (rr * rr - ri * ri)
        const di = -2 * rr * ri
        const nr = tr * tr - ti * ti
        const ni = 2 * tr * ti
        const size = dr * dr + di * di
        expect(whole[2]).toBeCloseTo((nr * dr + ni * di) / size, 11)
        expect(whole[3]).toBeCloseTo((ni * dr - nr * di) / size, 11)
      }),
      { verbose: 1 },
    )
  })
})
