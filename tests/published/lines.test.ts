import { describe, expect, it } from 'vitest'
import type { Dimensions } from '../../lib/channel/lines/crossSection'
import { lineTwoPort } from '../../lib/channel/lines/lineTwoPort'
import { coupledPermittivity, thinCoupledMicrostrip } from '../../lib/channel/lines/microstrip/coupledMicrostrip'
import { hammerstadJensenDispersion, impedanceDispersion } from '../../lib/channel/lines/microstrip/dispersion'
import { effectivePermittivity, thinMicrostrip } from '../../lib/channel/lines/microstrip/hammerstadJensen'
import {
  coupledMicrostripPermittivity,
  microstripInAir,
  microstripPermittivity,
} from '../../lib/channel/lines/microstrip/section'
import { propagate } from '../../lib/channel/lines/propagate'
import { thinCoupledStripline, thinStripline } from '../../lib/channel/lines/stripline/cohn'
import { centredCoupledStripline } from '../../lib/channel/lines/stripline/coupledStripline'
import { offCentre } from '../../lib/channel/lines/stripline/thickStripline'
import { crossSection } from '../../lib/channel/lines/structures'
import { SPEED_OF_LIGHT } from '../../lib/channel/materials/constants'
import { hammerstad, SMOOTH } from '../../lib/channel/materials/roughness'
import { skinDepth, surfaceResistance } from '../../lib/channel/materials/skinEffect'
import { widebandDebye } from '../../lib/channel/materials/widebandDebye'
import { COUPLED_MICROSTRIPS, COUPLED_STRIPLINES, MICROSTRIPS, STRIPLINES } from './figures/crossSections'
import { MSL } from './figures/msl'

const MIL = 25.4e-6
const DB = 20 / Math.LN10
const ETA0 = 376.730313668

const off = (found: number, expected: number) => found / expected - 1
function near(found: number, expected: number, tolerance: number): void {
  expect(Math.abs(off(found, expected))).toBeLessThan(tolerance)
}
const centred = (width: number, spacing: number, thickness: number, gap = 0): Dimensions => {
  const height = (spacing - thickness) / 2
  return { width, gap, thickness, below: height, above: height }
}

describe('Stripline', () => {
  it('thin, in air: 100.432, 65.354, 38.579 Ω at w/b 0.5, 1, 2 (Cohn 1954, exact; from memory)', () => {
    near(thinStripline(0.5, 1), 100.432, 1e-5)
    near(thinStripline(1, 1), 65.354, 1e-5)
    near(thinStripline(2, 1), 38.579, 1e-5)
    near(thinStripline(0.2, 1), 153.029, 1e-5)
  })

  it('coupled and thin, 5/6/14 mil, εr 3.6: 68.955 even, 56.381 odd, 112.761 Ω differential; 4/6/10 mil, εr 3.4: 115.446 Ω (Cohn 1955; from memory)', () => {
    near(thinCoupledStripline(5, 6, 14, 'even') / Math.sqrt(3.6), 68.955, 1e-5)
    near(thinCoupledStripline(5, 6, 14, 'odd') / Math.sqrt(3.6), 56.381, 1e-5)
    near((2 * thinCoupledStripline(5, 6, 14, 'odd')) / Math.sqrt(3.6), 112.761, 1e-5)
    near((2 * thinCoupledStripline(4, 6, 10, 'odd')) / Math.sqrt(3.4), 115.446, 1e-5)
  })

  it('of the handbook: b 3.2 mm, t 0.01 mm, εr 2.20, tan δ 0.001, W 2.655 mm, 5.813e7 S/m at 10 GHz: 50 Ω, 0.155 + 0.122 Np/m, 2.41 dB/m (Pozar; conductor loss within 2 %, as its closed form is)', () => {
    const section = crossSection('stripline', centred(2.655e-3, 3.2e-3, 1e-5), 2.2)
    const metal = { conductivity: 5.813e7, roughness: SMOOTH }
    const line = propagate(section, widebandDebye(2.2, 0.001, 10e9), metal, Float64Array.of(10e9))
    near(line.zRe[0] as number, 50, 0.011)
    near(line.dielectric[0] as number, 0.15543, 1e-3)
    near(line.conductor[0] as number, 0.12187, 0.02)
    near((line.alpha[0] as number) * DB, 2.4086, 0.01)
    near((2 * Math.PI) / (line.beta[0] as number), 0.020212, 2e-3)
  })

  it('of a board, 5 mil wide, 13 mil from plane to plane, 0.6 mil thick, εr 3.6, tan δ 0.004: 54.41 Ω and Wheeler’s losses at 5, 12.89 and 26.56 GHz (incremental inductance rule, worked by hand)', () => {
    const section = crossSection('stripline', centred(5 * MIL, 13 * MIL, 0.6 * MIL), 3.6)
    // Worked with 30 Ω for η0/4π, 0.07 % more.
    near(section.airImpedance / Math.sqrt(3.6), 54.41, 1e-3)
    for (const [hz, conductor, dielectric] of [
      [5e9, 0.2278, 0.0877],
      [12.890625e9, 0.3658, 0.2262],
      [26.5625e9, 0.5252, 0.4661],
    ] as const) {
      const metal = { conductivity: 5.8e7, roughness: SMOOTH }
      const line = propagate(section, widebandDebye(3.6, 0.004, hz), metal, Float64Array.of(hz))
      const perInch = DB * 0.0254
      // R/2Z0 without the internal inductance, which lowers α by R/(2ωL): 0.5 % here.
      const rule = (surfaceResistance(5.8e7, hz) * section.crowding) / (2 * (section.airImpedance / Math.sqrt(3.6)))
      near(rule * perInch, conductor, 3e-4)
      near((line.conductor[0] as number) * perInch, conductor, 6e-3)
      near((line.dielectric[0] as number) * perInch, dielectric, 6e-3)
    }
  })

  it.each(STRIPLINES)('single against boundary elements: impedance −0.6 … +4 %, crowding within 6 % (%o)', (solved) => {
    const { airImpedance, crowding } = crossSection('stripline', solved, 3.6)
    const ratio = Math.max(solved.below, solved.above) / Math.min(solved.below, solved.above)
    expect(off(airImpedance, solved.ohm)).toBeGreaterThan(-0.006)
    expect(off(airImpedance, solved.ohm)).toBeLessThan(
      ratio === 1 ? 0.001 : ratio <= 2 ? 0.012 : ratio <= 3 ? 0.03 : 0.04,
    )
    near(crowding, solved.crowding, ratio === 1 ? 0.01 : 0.06)
  })

  it.each(COUPLED_STRIPLINES)(
    'pair against boundary elements: odd −1.5 … +4 %, even within 6 %, crowding within 6 % (%o)',
    (solved) => {
      const { airImpedance, crowding } = crossSection('coupled-stripline', solved, 3.6)
      expect(off(airImpedance, solved.ohm)).toBeGreaterThan(-0.015)
      expect(off(airImpedance, solved.ohm)).toBeLessThan(0.04)
      near(crowding, solved.crowding, 0.06)
      const { width, gap, thickness } = solved
      const even = offCentre((spacing) => centredCoupledStripline(width, gap, spacing, thickness, 'even'), solved)
      near(even, solved.even, 0.06)
    },
  )
})

describe('Microstrip', () => {
  const board = { width: 3e-3, gap: 0, thickness: 35e-6, below: 1.55e-3, above: 0 }

  it('of 3.00 mm on 1.55 mm, 35 µm, εr 4.413: 49.1526 Ω, εe 3.31840 static; thin 49.5966 Ω, 3.34336 (Hammerstad and Jensen 1980; an independent calculator has 49.142 and 3.324 at 1 GHz, within 1 %)', () => {
    const effective = microstripPermittivity(board, 4.413)
    const impedance = microstripInAir(board) / Math.sqrt(effective)
    near(effective, 3.3184, 2e-6)
    near(impedance, 49.1526, 2e-6)
    near(effectivePermittivity(3 / 1.55, 4.413), 3.34336, 2e-6)
    near(thinMicrostrip(3 / 1.55) / Math.sqrt(3.34336), 49.5966, 2e-6)
    near(hammerstadJensenDispersion(impedance, board.below)(effective, 4.413, 1e9), 3.324, 0.01)
  })

  it('of 25 mm of it in 50 Ω: S21 −0.0779386 dB, −54.7337° at 1 GHz, −0.7201836 dB, +144.5113° at 10 GHz, |S11| 0.01264299, 0.04028416 (S-parameters stored with the general-purpose RF library scikit-rf)', () => {
    const effective = microstripPermittivity(board, 4.413)
    const impedance = microstripInAir(board) / Math.sqrt(effective)
    const disperse = hammerstadJensenDispersion(impedance, board.below)
    const conductivity = 1 / 1.7e-8
    const rough = hammerstad(0.15e-6)
    for (const [hz, through, degrees, reflected] of [
      [1e9, -0.0779386, -54.7337, 0.01264299],
      [10e9, -0.7201836, 144.51132, 0.04028416],
    ] as const) {
      const e = disperse(effective, 4.413, hz)
      // Losses as that file has them: static impedance and permittivity, Hammerstad and Jensen's current factor.
      const crowded = Math.exp(-1.2 * (impedance / ETA0) ** 0.7) / (impedance * board.width)
      const conductor = surfaceResistance(conductivity, hz) * crowded * rough.resistance(skinDepth(conductivity, hz))
      const dielectric =
        (((Math.PI * hz) / SPEED_OF_LIGHT) * 4.413 * (effective - 1) * 0.0182) / (Math.sqrt(effective) * 3.413)
      const s = lineTwoPort(
        {
          alpha: Float64Array.of(conductor + dielectric),
          beta: Float64Array.of((2 * Math.PI * hz * Math.sqrt(e)) / SPEED_OF_LIGHT),
          zRe: Float64Array.of(impedance * impedanceDispersion(effective, e)),
          zIm: Float64Array.of(0),
        },
        0.025,
        50,
      )
      expect(DB * Math.log(Math.hypot(s[2] as number, s[3] as number))).toBeCloseTo(through, 6)
      expect((Math.atan2(s[3] as number, s[2] as number) * 180) / Math.PI).toBeCloseTo(degrees, 3)
      near(Math.hypot(s[0] as number, s[1] as number), reflected, 1e-5)
    }
  })

  it('designed for 50 Ω by the handbook: εr 2.20, d 1.27 mm, W/d 3.081 (Pozar 3rd ed., from memory): 50 Ω within 0.1 %, εe 1.8712 within 0.6 %, 90° at 2.5 GHz in 21.9 mm within 0.5 %', () => {
    const effective = effectivePermittivity(3.081, 2.2)
    near(thinMicrostrip(3.081) / Math.sqrt(effective), 50, 1e-3)
    near(effective, 1.8712, 6e-3)
    near(SPEED_OF_LIGHT / (4 * 2.5e9 * Math.sqrt(effective)), 21.916e-3, 5e-3)
  })

  it('measured: effective permittivity within 0.25 %, loss −1.5 … +8.5 % of MSL (0.2 to 9.5 GHz; εr 4.4, tan δ 0.017 at 1 GHz from memory, copper taken as smooth)', () => {
    const hz = Float64Array.from(MSL, (point) => point.hz)
    const section = crossSection('microstrip', { ...board, thickness: 50e-6 }, 4.4)
    const line = propagate(section, widebandDebye(4.4, 0.017, 1e9), { conductivity: 5.8e7, roughness: SMOOTH }, hz)
    for (const [i, point] of MSL.entries()) {
      const slowness = ((line.beta[i] as number) * SPEED_OF_LIGHT) / (2 * Math.PI * point.hz)
      near(slowness ** 2, point.effectivePermittivity, 0.0025)
      const loss = off((line.alpha[i] as number) * DB, point.dbPerMetre)
      expect(loss).toBeGreaterThan(-0.015)
      expect(loss).toBeLessThan(0.085)
    }
  })

  it('coupled and thin, u 2, g 1, εr 4.2: 55.388 even, 43.436 odd, εe 3.4262 and 2.9186; u 1, g 8, εr 4: 74.455 and 73.524 Ω (Kirschning and Jansen 1984, from memory)', () => {
    const impedance = (u: number, g: number, er: number, mode: 'odd' | 'even') =>
      thinCoupledMicrostrip(u, g, mode) / Math.sqrt(coupledPermittivity(u, g, er, mode))
    // The figures take 377 Ω where η0 stands here.
    near(impedance(2, 1, 4.2, 'even'), 55.388, 2e-4)
    near(impedance(2, 1, 4.2, 'odd'), 43.436, 2e-4)
    near(coupledPermittivity(2, 1, 4.2, 'odd'), 2.9186, 2e-5)
    near(coupledPermittivity(2, 1, 4.2, 'even'), 3.4262, 2e-5)
    near(impedance(1, 8, 4, 'even'), 74.455, 2e-4)
    near(impedance(1, 8, 4, 'odd'), 73.524, 2e-4)
  })

  it.each(MICROSTRIPS)(
    'single against boundary elements: impedance within 0.3 %, permittivity 0.5 %, crowding 1 % (%o)',
    (solved) => {
      const { airImpedance, crowding } = crossSection('microstrip', solved, solved.dielectric)
      near(airImpedance, solved.ohm, 0.003)
      near(crowding, solved.crowding, 0.01)
      near(microstripPermittivity(solved, solved.dielectric), solved.effective, 0.005)
    },
  )

  it.each(COUPLED_MICROSTRIPS)(
    'pair against boundary elements: odd impedance in air −0.3 … +3.5 %, permittivity −0.2 … +1.8 %, crowding within 6 % (%o)',
    (solved) => {
      const { airImpedance, crowding } = crossSection('coupled-microstrip', solved, solved.dielectric)
      expect(off(airImpedance, solved.ohm)).toBeGreaterThan(-0.003)
      expect(off(airImpedance, solved.ohm)).toBeLessThan(0.035)
      near(crowding, solved.crowding, 0.06)
      const permittivity = off(coupledMicrostripPermittivity(solved, solved.dielectric), solved.effective)
      expect(permittivity).toBeGreaterThan(-0.002)
      expect(permittivity).toBeLessThan(0.018)
    },
  )
})

describe('Telegrapher’s equations', () => {
  it('2.1234 Ω/in, 7.8405 nH/in, 3.136 pF/in, 911.52 µS/in at 3 GHz: 0.3827 dB/in, 50.00 Ω (published on the si-list, 1999)', () => {
    // The same line by its cross-section's words: Z0 and εe from L and C, R and G as a foil and a loss tangent that give them.
    const perMetre = 1 / 0.0254
    const [r, l, c, g] = [2.1234 * perMetre, 7.8405e-9 * perMetre, 3.136e-12 * perMetre, 911.52e-6 * perMetre]
    const hz = 3e9
    const effective = l * c * SPEED_OF_LIGHT ** 2
    const impedance = Math.sqrt(l / c)
    const section = {
      airImpedance: impedance * Math.sqrt(effective),
      fill: 1,
      crowding: r / surfaceResistance(5.8e7, hz),
      area: 1,
      conductors: 1 as const,
      dispersion: null,
    }
    const laminate = widebandDebye(effective, g / (2 * Math.PI * hz * c), hz)
    const line = propagate(section, laminate, { conductivity: 5.8e7, roughness: SMOOTH }, Float64Array.of(hz))
    // The foil brings its internal reactance R along, which the published line has in its L: 1.4 % of ωL.
    near((line.alpha[0] as number) * DB * 0.0254, 0.38237, 4e-3)
    near(line.zRe[0] as number, 50, 8e-3)
    near((line.conductor[0] as number) + (line.dielectric[0] as number), line.alpha[0] as number, 1e-12)
  })
})
