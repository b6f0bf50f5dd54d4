import { describe, expect, it } from 'vitest'
import { propagationFromTwoLengths } from '../../lib/channel/fixtures'
import { MSL } from './figures/msl'
import { isThere, measuredFile, WHEN_THERE } from './measuredFile'

const DB = 20 / Math.LN10
const SPEED_OF_LIGHT = 299792458
/** The figures are means over ±50 MHz: so many points of 1 MHz to each side. */
const SIDE = 50

describe.skipIf(!isThere('MSL100.s2p', 'MSL200.s2p'))(`a measured microstrip of two lengths (${WHEN_THERE})`, () => {
  it('loses per metre what the table made in numpy says, and travels as fast', () => {
    const found = propagationFromTwoLengths(measuredFile('MSL200.s2p'), measuredFile('MSL100.s2p'), 0.1)
    if ('reason' in found) throw new Error(found.reason)
    const slowness = found.hz.map((hz, i) => ((found.beta[i] ?? 0) * SPEED_OF_LIGHT) / (2 * Math.PI * hz))
    for (const { hz, dbPerMetre, effectivePermittivity } of MSL) {
      const centre = found.hz.findIndex((f) => Math.abs(f - hz) < 1)
      const mean = (values: Float64Array) => {
        const near = values.subarray(centre - SIDE, centre + SIDE + 1)
        return near.reduce((sum, value) => sum + value, 0) / near.length
      }
      expect(mean(found.alpha) * DB).toBeCloseTo(dbPerMetre, 3)
      expect(mean(slowness.map((n) => n * n))).toBeCloseTo(effectivePermittivity, 4)
    }
  })

  it('is not told right by the plain difference of losses: 3 dB/m off at 9 GHz, where the launches reflect', () => {
    const found = propagationFromTwoLengths(measuredFile('MSL200.s2p'), measuredFile('MSL100.s2p'), 0.1)
    if ('reason' in found) throw new Error(found.reason)
    const at = found.hz.findIndex((f) => Math.abs(f - 9e9) < 1)
    expect((found.alpha[at] ?? 0) * DB - (found.differenceDb[at] ?? 0)).toBeCloseTo(2.918, 2)
  })
})
