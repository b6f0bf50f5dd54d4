import { describe, expect, it } from 'vitest'
import { ETA0, SPEED_OF_LIGHT } from '../../lib/channel/materials/constants'
import { copperConductivity } from '../../lib/channel/materials/copper'
import { cannonball, groiss, hammerstad, huray, rqOfRz, SMOOTH } from '../../lib/channel/materials/roughness'
import { skinDepth, surfaceResistance } from '../../lib/channel/materials/skinEffect'
import { dfAt, dkAt, widebandDebye } from '../../lib/channel/materials/widebandDebye'

/** To a relative deviation. */
function near(found: number, expected: number, tolerance: number): void {
  expect(Math.abs(found / expected - 1)).toBeLessThan(tolerance)
}

describe('Skin effect (Pozar, Microwave Engineering: copper 5.813e7 S/m, 0.026 Ω at 10 GHz)', () => {
  it('has the surface resistance and depth of the handbook', () => {
    near(surfaceResistance(5.813e7, 10e9), 0.0260603, 1e-5)
    near(skinDepth(5.813e7, 10e9), 0.660116e-6, 1e-5)
    near(surfaceResistance(5.8e7, 1e9), 8.25023e-3, 1e-5)
    near(skinDepth(5.8e7, 1e9), 2.08981e-6, 1e-5)
    near(skinDepth(5.8e7, 26.5625e9), 0.40548e-6, 1e-4)
  })

  it('has free space at 376.7303 Ω (CODATA)', () => {
    near(ETA0, 376.7303, 1e-6)
    expect(SPEED_OF_LIGHT).toBe(299792458)
  })
})

describe('Copper over temperature (IACS, IEC 60028; 0.00393 1/K from memory)', () => {
  it('has 5.8e7 S/m at 20 °C and loses √ρ: 0.95990 at 0 °C, 1.05731 at 50, 1.11167 at 80, 1.12047 at 85', () => {
    expect(copperConductivity(20)).toBe(5.8e7)
    for (const [celsius, factor] of [
      [0, 0.9599],
      [50, 1.05731],
      [80, 1.11167],
      [85, 1.12047],
    ] as const) {
      const loss = surfaceResistance(copperConductivity(celsius), 10e9) / surfaceResistance(5.8e7, 10e9)
      near(loss, factor, 1e-5)
    }
  })
})

describe('Roughness', () => {
  it('Hammerstad and Jensen 1980 at Rq/δ 0.5, 1, 2: 1.2143, 1.60514, 1.8875', () => {
    near(hammerstad(0.5).resistance(1), 1.2143, 1e-4)
    near(hammerstad(1).resistance(1), 1.60514, 1e-5)
    near(hammerstad(2).resistance(1), 1.8875, 1e-4)
  })

  it('Groiss 1996 (from memory) at Rq/δ 0.5, 1, 2: 1.3679, 1.71901, 1.8969', () => {
    near(groiss(0.5).resistance(1), 1.3679, 1e-4)
    near(groiss(1).resistance(1), 1.71901, 1e-5)
    near(groiss(2).resistance(1), 1.8969, 1e-4)
  })

  it('cannonball (0.06 Rz and 36 a² from memory) of Rz 3 µm: 1.09162 at 1 GHz, 1.37264, 1.64239 at 10 GHz, 1.77472, 2.26605', () => {
    for (const [ghz, factor] of [
      [1, 1.09162],
      [5, 1.37264],
      [10, 1.64239],
      [12.890625, 1.77472],
      [26.5625, 2.26605],
    ] as const) {
      near(cannonball(3e-6).resistance(skinDepth(5.8e7, ghz * 1e9)), factor, 1e-5)
    }
  })

  it('Huray of 79 spheres of 0.5 µm on a hexagon of 9.4 µm (from memory): 2.5226 at 10 GHz', () => {
    const area = (Math.sqrt(3) / 2) * 9.4e-6 ** 2
    const areaRatio = (79 * 4 * Math.PI * 0.5e-6 ** 2) / area
    near(areaRatio, 3.2433, 1e-4)
    near(huray(1, [{ radius: 0.5e-6, areaRatio }]).resistance(skinDepth(5.8e7, 10e9)), 2.5226, 2e-5)
  })

  it('is the real and imaginary part of (1 + j)·(base + 1.5 ratio/(1 + (1 − j)x)), x = δ/2a (complex division written out)', () => {
    const [radius, areaRatio, delta] = [0.4e-6, 2.2, 0.55e-6]
    const x = delta / (2 * radius)
    // (1 + j)/(1 + x − jx) = (1 + j)(1 + x + jx)/((1 + x)² + x²)
    const size = (1 + x) ** 2 + x ** 2
    const foil = huray(1.1, [{ radius, areaRatio }])
    near(foil.resistance(delta), 1.1 + (1.5 * areaRatio * (1 + x - x)) / size, 1e-12)
    near(foil.reactance(delta), 1.1 + (1.5 * areaRatio * (1 + x + x)) / size, 1e-12)
  })

  it('of height 0 is smooth, exactly', () => {
    for (const foil of [hammerstad(0), cannonball(0), groiss(1e-30), huray(1, []), SMOOTH]) {
      expect(foil.resistance(0.4e-6)).toBe(1)
      expect(foil.reactance(0.4e-6)).toBe(1)
    }
  })

  it('takes the root mean square as a fifth of Rz (rough conversion from memory, Rz/4 to Rz/6)', () => {
    expect(rqOfRz(3e-6)).toBeCloseTo(0.6e-6, 12)
  })
})

describe('Wideband Debye (Djordjević et al. 2001)', () => {
  const at = (model: ReturnType<typeof widebandDebye>, hz: number) => {
    const dk = dkAt(model, hz)
    return [dk, dfAt(model, hz, dk)] as const
  }

  it('through 4.413 and 0.0182 at 1 GHz, relaxations 1 kHz to 1 THz: ε∞ 4.059573, values at 0.1, 5, 10 and 26.5625 GHz', () => {
    const model = widebandDebye(4.413, 0.0182, 1e9, 1e3, 1e12)
    near(model.infinite, 4.059573, 2e-7)
    near(model.slope * Math.log(1e12 / 1e3), 1.06028, 1e-6)
    for (const [hz, dk, df] of [
      [0.1e9, 4.530809, 0.0177368],
      [1e9, 4.413, 0.0182],
      [5e9, 4.330656, 0.0184988],
      [10e9, 4.295194, 0.018592],
      [26.5625e9, 4.245227, 0.0186113],
    ] as const) {
      const found = at(model, hz)
      near(found[0], dk, 2e-7)
      near(found[1], df, 5e-6)
    }
  })

  it('through 3.6 and 0.004 at 1 GHz, relaxations 10 kHz to 1 THz: 3.578878 and 0.0040006 at 10 GHz, 3.569920 and 0.0039681 at 26.5625 GHz', () => {
    const model = widebandDebye(3.6, 0.004, 1e9)
    for (const [hz, dk, df] of [
      [10e9, 3.578878, 0.0040006],
      [26.5625e9, 3.56992, 0.0039681],
    ] as const) {
      const found = at(model, hz)
      near(found[0], dk, 2e-7)
      near(found[1], df, 2e-5)
    }
  })

  it('falls by (2 ln 10/π)·εr·tan δ a decade in mid-band (Kramers-Kronig)', () => {
    const model = widebandDebye(3.6, 0.004, 1e9)
    near(dkAt(model, 1e8) - dkAt(model, 1e9), 1.46587 * 3.6 * 0.004, 5e-3)
  })

  it('is constant without loss', () => {
    expect(at(widebandDebye(3.6, 0, 1e9), 40e9)).toEqual([3.6, 0])
  })
})
