import { describe, expect, it } from 'vitest'
import { fixtureImpedances, removeFixtures } from '../../lib/channel/fixtures'
import { mixedMode, type Network, network } from '../../lib/channel/networks'
import { passivity, throughFacts } from '../../lib/channel/quality'
import { worstErrors } from './errors'
import { isThere, measuredFile, WHEN_THERE } from './measuredFile'

const FILES = ['diff_2xthru.s4p', 'diff_dut.s4p', 'diff_fdf.s4p']

/** Differential or common two-port of a file whose pairs are (1, 2) and (3, 4). */
function mode(name: string, which: 'differential' | 'common'): Network {
  const modes = mixedMode(measuredFile(name), [
    [0, 1],
    [2, 3],
  ])
  const first = which === 'differential' ? 0 : 2
  const s = new Float64Array(8 * modes.hz.length)
  for (let f = 0; f < modes.hz.length; f++)
    for (let i = 0; i < 2; i++)
      for (let j = 0; j < 2; j++) {
        const from = 32 * f + 2 * (4 * (first + i) + first + j)
        s.set(modes.s.subarray(from, from + 2), 8 * f + 2 * (2 * i + j))
      }
  return network(2, modes.hz, s, modes.reference[2 * first] ?? 0)
}

// What was reached against the file of the device alone: dB and degrees of S21, size of the error of S11 and S22. The thru of this
// example has another impedance than the fixtures in the file, so that the uncorrected removal shows what that costs.
describe.skipIf(!isThere(...FILES))(`fixtures of a simulated pair (${WHEN_THERE})`, () => {
  it.each([
    ['differential', true, 1, 0.02, 0.6, 0.006],
    ['differential', true, 2, 0.06, 1.4, 0.016],
    ['differential', true, 5, 0.07, 3.4, 0.03],
    ['differential', true, 10, 0.11, 8, 0.07],
    ['differential', false, 1, 0.4, 1.3, 0.11],
    ['differential', false, 10, 0.62, 10.6, 0.13],
    ['common', true, 1, 0.02, 1, 0.008],
    ['common', true, 5, 0.11, 4.5, 0.037],
    ['common', true, 10, 0.35, 9.6, 0.11],
    ['common', false, 10, 1.2, 11.2, 0.16],
  ] as const)('%s, corrected %s, up to %d GHz: within %d dB, %d°, %d', (which, impedanceCorrection, ghz, ...bounds) => {
    const found = removeFixtures(mode('diff_fdf.s4p', which), mode('diff_2xthru.s4p', which), { impedanceCorrection })
    if ('reason' in found) throw new Error(found.reason)
    const { db, degrees, reflection } = worstErrors(found, mode('diff_dut.s4p', which), ghz * 1e9)
    const reached = [db, degrees, reflection]
    for (const [k, bound] of (bounds as readonly number[]).entries()) {
      expect(reached[k]).toBeLessThan(bound)
      // A bound far above what is reached would say nothing.
      expect(reached[k]).toBeGreaterThan(0.8 * bound)
    }
  })

  it('the impedances say beforehand that the thru is not like them: 104 against 97 Ω, 39 against 36 Ω', () => {
    const differential = fixtureImpedances(
      mode('diff_fdf.s4p', 'differential'),
      mode('diff_2xthru.s4p', 'differential'),
    )
    const common = fixtureImpedances(mode('diff_fdf.s4p', 'common'), mode('diff_2xthru.s4p', 'common'))
    if ('reason' in differential || 'reason' in common) throw new Error('refused')
    expect(differential.thru).toBeCloseTo(104, 0)
    expect(differential.near).toBeCloseTo(97, 0)
    expect(differential.far).toBeCloseTo(97, 0)
    expect(common.thru).toBeCloseTo(38.7, 0)
    expect(common.near).toBeCloseTo(35.5, 0)
  })

  it('afterwards nothing is active, the low end loses next to nothing and the delay is that of the device', () => {
    const [file, thru] = [mode('diff_fdf.s4p', 'differential'), mode('diff_2xthru.s4p', 'differential')]
    const found = removeFixtures(file, thru, { impedanceCorrection: true })
    if ('reason' in found) throw new Error(found.reason)
    const facts = throughFacts(found)
    const truth = throughFacts(mode('diff_dut.s4p', 'differential'))
    expect(passivity(found).percent).toBeGreaterThan(99)
    expect(facts?.lowest.lossDb).toBeLessThan(0.02)
    expect(Math.abs((facts?.delay ?? 0) / (truth?.delay ?? 1) - 1)).toBeLessThan(0.01)
    expect(throughFacts(file)?.delay).toBeGreaterThan(1.5 * (truth?.delay ?? 0))
  })
})
