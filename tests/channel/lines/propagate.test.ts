import { describe, expect, it } from 'vitest'
import { foilImpedance } from '../../../lib/channel/lines/foil'
import { coupledDispersion } from '../../../lib/channel/lines/microstrip/coupledDispersion'
import { impedanceDispersion, kirschningJansen } from '../../../lib/channel/lines/microstrip/dispersion'
import { propagate } from '../../../lib/channel/lines/propagate'
import { thinCoupledStripline, thinStripline } from '../../../lib/channel/lines/stripline/cohn'
import { centredStripline } from '../../../lib/channel/lines/stripline/thickStripline'
import { crossSection, type Structure, structureRange } from '../../../lib/channel/lines/structures'
import { cannonball, SMOOTH } from '../../../lib/channel/materials/roughness'
import { dfAt, dkAt, widebandDebye } from '../../../lib/channel/materials/widebandDebye'

const MIL = 25.4e-6
const SIZE = { width: 5 * MIL, gap: 6 * MIL, thickness: 0.6 * MIL, below: 5 * MIL, above: 7 * MIL }
const STRUCTURES: readonly Structure[] = ['microstrip', 'stripline', 'coupled-microstrip', 'coupled-stripline']
const HZ = Float64Array.from({ length: 200 }, (_, i) => 2e6 * 1.05 ** i)
const copper = { conductivity: 5.8e7, roughness: SMOOTH }

describe('A line over frequency', () => {
  it.each(STRUCTURES)('%s without losses only delays: α 0, Z real, β = ω√εe/c', (structure) => {
    const section = crossSection(structure, SIZE, 3.6)
    const perfect = { conductivity: 1e36, roughness: SMOOTH }
    const line = propagate(section, widebandDebye(3.6, 0, 1e10), perfect, HZ)
    for (const [i, hz] of HZ.entries()) {
      const beta = line.beta[i] as number
      const effective = ((beta * 299792458) / (2 * Math.PI * hz)) ** 2
      expect((line.alpha[i] as number) / beta).toBeLessThan(1e-9)
      expect(effective).toBeGreaterThanOrEqual(1 + section.fill * 2.6 - 1e-6)
      expect(effective).toBeLessThanOrEqual(3.6 + 1e-6)
      expect(Math.abs(line.zIm[i] as number)).toBeLessThan(1e-6)
    }
    const first = (section.airImpedance * section.conductors) / Math.sqrt(1 + section.fill * 2.6)
    expect((line.zRe[0] as number) / first).toBeCloseTo(1, 6)
  })

  it.each(['microstrip', 'coupled-microstrip'] as const)(
    '%s: its impedance rises with its permittivity by √(εe(0)/εe)·(εe − 1)/(εe(0) − 1) (Hammerstad and Jensen 1980)',
    (structure) => {
      const section = crossSection(structure, SIZE, 3.6)
      const perfect = { conductivity: 1e36, roughness: SMOOTH }
      const line = propagate(section, widebandDebye(3.6, 0, 1e10), perfect, HZ)
      const still = 1 + section.fill * 2.6
      for (const [i, hz] of HZ.entries()) {
        const e = (((line.beta[i] as number) * 299792458) / (2 * Math.PI * hz)) ** 2
        const rise = (line.zRe[i] as number) / (line.zRe[0] as number)
        expect(rise / ((Math.sqrt(still / e) * (e - 1)) / (still - 1))).toBeCloseTo(1, 6)
      }
      expect(line.zRe.at(-1)).toBeGreaterThan(1.005 * (line.zRe[0] as number))
    },
  )

  it.each(['stripline', 'coupled-stripline'] as const)(
    '%s with losses: γ/Z is ωC·tan δ + jωC, C of its impedance in air and the laminate (telegrapher’s equations)',
    (structure) => {
      const section = crossSection(structure, SIZE, 3.6)
      const laminate = widebandDebye(3.6, 0.02, 1e10)
      const line = propagate(section, laminate, copper, HZ)
      for (const [i, hz] of HZ.entries()) {
        const [alpha, beta] = [line.alpha[i] as number, line.beta[i] as number]
        const [zRe, zIm] = [(line.zRe[i] as number) / section.conductors, (line.zIm[i] as number) / section.conductors]
        const size = zRe * zRe + zIm * zIm
        const susceptance = (beta * zRe - alpha * zIm) / size
        const dk = dkAt(laminate, hz)
        expect(susceptance / ((2 * Math.PI * hz * dk) / (299792458 * section.airImpedance))).toBeCloseTo(1, 10)
        expect((alpha * zRe + beta * zIm) / size / susceptance).toBeCloseTo(dfAt(laminate, hz, dk), 10)
      }
    },
  )

  it('in air loses only in its conductors and is as fast as light', () => {
    const section = { ...crossSection('stripline', SIZE, 3.6), fill: 0 }
    for (const [one, laminate] of [
      [crossSection('stripline', SIZE, 1), widebandDebye(1, 0, 1e10)],
      [section, widebandDebye(3.6, 0.02, 1e10)],
    ] as const) {
      const line = propagate(one, laminate, copper, Float64Array.of(20e9))
      expect(line.dielectric[0]).toBe(0)
      expect(line.alpha[0]).toBeGreaterThan(0)
      // The inductance inside the copper slows it by X/(2ωL).
      expect((line.beta[0] as number) / ((2 * Math.PI * 20e9) / 299792458)).toBeCloseTo(1, 1)
    }
  })

  it.each(STRUCTURES)(
    '%s: its parts add up, loss grows with frequency, roughness adds to the conductor only',
    (structure) => {
      const section = crossSection(structure, SIZE, 3.6)
      const laminate = widebandDebye(3.6, 0.004, 1e10)
      const smooth = propagate(section, laminate, copper, HZ)
      const rough = propagate(section, laminate, { ...copper, roughness: cannonball(3e-6) }, HZ)
      const flat = propagate(section, laminate, { ...copper, roughness: cannonball(0) }, HZ)
      expect(flat).toEqual(smooth)
      for (let i = 1; i < HZ.length; i++) {
        const alpha = smooth.alpha[i] as number
        expect(((smooth.conductor[i] as number) + (smooth.dielectric[i] as number)) / alpha).toBeCloseTo(1, 12)
        expect(alpha).toBeGreaterThan(smooth.alpha[i - 1] as number)
        // Far below, where the skin is thicker than the foil is rough, what remains is the nodules' inductance.
        if ((HZ[i] as number) > 5e8) expect(rough.conductor[i]).toBeGreaterThan(smooth.conductor[i] as number)
      }
    },
  )

  it('of a pair far apart is the single line, with twice its impedance: striplines exactly, microstrips to 1.2 % as far as their formulas reach', () => {
    for (const [pair, single, gap] of [
      ['coupled-stripline', 'stripline', 200 * MIL],
      ['coupled-microstrip', 'microstrip', 49 * MIL],
    ] as const) {
      const laminate = widebandDebye(3.6, 0.004, 1e10)
      const far = propagate(crossSection(pair, { ...SIZE, gap }, 3.6), laminate, copper, HZ)
      const alone = propagate(crossSection(single, SIZE, 3.6), laminate, copper, HZ)
      for (let i = 0; i < HZ.length; i++) {
        const allowed = pair === 'coupled-stripline' ? 1e-10 : 0.012
        expect(Math.abs((far.zRe[i] as number) / (alone.zRe[i] as number) / 2 - 1)).toBeLessThan(allowed)
        expect(Math.abs((far.alpha[i] as number) / (alone.alpha[i] as number) - 1)).toBeLessThan(allowed)
      }
    }
  })

  it('holds up to the laminate’s 100 GHz, and open lines to f·h of 39 or 25 GHz·mm (from memory)', () => {
    expect(structureRange('stripline', SIZE)).toEqual([1e6, 1e11])
    expect(structureRange('microstrip', { ...SIZE, below: 1e-3 })[1]).toBeCloseTo(38.973e9, -7)
    expect(structureRange('coupled-microstrip', { ...SIZE, below: 1e-3 })[1]).toBe(25e9)
  })
})

describe('Conductors', () => {
  const of = (hz: number, roughness = SMOOTH) => {
    const [r, x] = [new Float64Array(1), new Float64Array(1)]
    foilImpedance({ crowding: 4000, area: 2e-9 }, { conductivity: 5.8e7, roughness }, Float64Array.of(hz), r, x)
    return [r[0] as number, x[0] as number] as const
  }

  it('have their resistance at 0 Hz and none under it, the skin effect above (limits of Dowell 1966)', () => {
    const direct = 1 / (5.8e7 * 2e-9)
    expect(of(100)[0] / direct).toBeCloseTo(1, 6)
    expect(of(100)[1] / direct).toBeLessThan(1e-3)
    expect(of(30e9)[0] / (4000 * Math.sqrt(30) * 8.25023e-3)).toBeCloseTo(1, 5)
    expect(of(30e9)[1] / of(30e9)[0]).toBeCloseTo(1, 12)
    let last = 0
    for (let hz = 1e4; hz < 1e11; hz *= 1.2) {
      expect(of(hz)[0]).toBeGreaterThanOrEqual(Math.max(direct, last) * (1 - 1e-12))
      last = of(hz)[0]
    }
  })

  it('do not feel roughness where the skin is thick', () => {
    expect(of(1e3, cannonball(3e-6))[0] / of(1e3)[0]).toBeCloseTo(1, 5)
  })
})

describe('Closed forms', () => {
  it('of coupled lines meet the single line far apart, exactly', () => {
    for (const mode of ['odd', 'even'] as const) {
      expect(thinCoupledStripline(1, 60, 1, mode) / thinStripline(1, 1)).toBeCloseTo(1, 14)
    }
  })

  it('of the thick stripline meets the exact thin one within 0.6 % for w/b 0.1 to 8', () => {
    for (let w = 0.1; w < 8; w *= 1.3) {
      expect(Math.abs(centredStripline(w, 1, 0) / thinStripline(w, 1) - 1)).toBeLessThan(0.006)
    }
  })

  it('fall with width, thickness and nearness of plane and partner, in steps of 2 %', () => {
    const ohm = (structure: Structure, changed: object) =>
      crossSection(structure, { ...SIZE, ...changed }, 3.6).airImpedance
    for (const structure of STRUCTURES) {
      for (let factor = 0.8; factor < 1.25; factor *= 1.02) {
        const [now, then] = [factor, factor * 1.02]
        expect(ohm(structure, { width: 5 * MIL * then })).toBeLessThan(ohm(structure, { width: 5 * MIL * now }))
        expect(ohm(structure, { thickness: MIL * then })).toBeLessThan(ohm(structure, { thickness: MIL * now }))
        expect(ohm(structure, { below: 5 * MIL * then })).toBeGreaterThan(ohm(structure, { below: 5 * MIL * now }))
        if (structure.startsWith('coupled')) {
          expect(ohm(structure, { gap: 6 * MIL * then })).toBeGreaterThan(ohm(structure, { gap: 6 * MIL * now }))
        }
        if (structure.endsWith('stripline')) {
          expect(ohm(structure, { above: 7 * MIL * then })).toBeGreaterThan(ohm(structure, { above: 7 * MIL * now }))
        }
      }
    }
  })

  it('of dispersion start at the static value, rise towards the dielectric, less for a tight pair, the same for a wide one', () => {
    const single = kirschningJansen(1, 1e-3, 4.4)
    const wide = coupledDispersion(1, 30, 1e-3, 4.4)
    const tight = coupledDispersion(1, 0.5, 1e-3, 4.4)
    let last = 3
    for (let hz = 1e6; hz < 25e9; hz *= 1.5) {
      const e = single(3, 4.4, hz)
      expect(e).toBeGreaterThanOrEqual(last)
      expect(e).toBeLessThan(4.4)
      expect(wide(3, 4.4, hz) / e).toBeCloseTo(1, 6)
      expect(tight(3, 4.4, hz)).toBeLessThanOrEqual(e)
      last = e
    }
    expect(single(3, 4.4, 1)).toBeCloseTo(3, 9)
    expect(impedanceDispersion(1, 1)).toBe(1)
    expect(impedanceDispersion(3, 3)).toBe(1)
  })
})
