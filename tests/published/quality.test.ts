import { describe, expect, it } from 'vitest'
import { type Network, network } from '../../lib/channel/networks/network'
import { causality, passivity, reciprocity } from '../../lib/channel/quality'
import { reversed } from '../channel/quality/networks'
import { everyNth, isThere, measuredFile, WHEN_THERE } from './measuredFile'

/** S multiplied by e^(−jωτ). */
function delayed(whole: Network, seconds: number): Network {
  const s = whole.s.slice()
  const size = 2 * whole.ports * whole.ports
  for (let at = 0; at < s.length; at += 2) {
    const turn = -2 * Math.PI * (whole.hz[Math.floor(at / size)] ?? 0) * seconds
    const [re, im] = [whole.s[at] ?? 0, whole.s[at + 1] ?? 0]
    s[at] = re * Math.cos(turn) - im * Math.sin(turn)
    s[at + 1] = re * Math.sin(turn) + im * Math.cos(turn)
  }
  return { ...whole, s }
}

describe('the largest singular value', () => {
  it.each([
    [2, 1.0762750388890758],
    [4, 0.9240617277102868],
    [8, 0.7991142336212016],
    [16, 0.7651654042156041],
  ])('of %d ports agrees with numpy.linalg.svd (2.4)', (ports, expected) => {
    const s = new Float64Array(2 * ports * ports)
    for (let i = 0; i < ports; i++)
      for (let j = 0; j < ports; j++) {
        s[2 * (i * ports + j)] = Math.sin(1 + 7 * i * i + 3 * j) / ports
        s[2 * (i * ports + j) + 1] = Math.cos(2 + 5 * i - 11 * j * j) / ports
      }
    expect(passivity(network(ports, Float64Array.of(1e9), s, 50)).largest.value).toBeCloseTo(expected, 13)
  })
})

// Expected: the formulas of IEEE Std 370's initial quality check, as published in scikit-rf's source, in numpy with its own SVD.
describe.skipIf(!isThere('MSL100.s2p', 'MSL200.s2p'))(`metrics of a measured line (${WHEN_THERE})`, () => {
  it.each([
    ['MSL100.s2p', 99.99739725797355, 91.92776339030848, 48.195228284282564, 1.0075159263002664],
    ['MSL200.s2p', 99.99781156508392, 87.99705236756344, 47.15439815620808, 1.007434421010617],
  ])('%s agree with numpy: passivity, reciprocity, causality, largest singular value', (name, p, r, c, value) => {
    const file = measuredFile(name)
    const found = [passivity(file), reciprocity(file), causality(file)]
    for (const [k, percent] of [p, r, c].entries()) expect(found[k]?.percent).toBeCloseTo(percent, 9)
    expect(found.map((metric) => metric?.grade)).toEqual(['good', 'inconclusive', 'inconclusive'])
    expect(passivity(file).largest).toEqual({ value: expect.closeTo(value, 12), hz: 4e6 })
  })

  // At its own steps of 1 MHz the noise of the receiver turns each element more than the line does.
  it('late it is good and backwards in time poor, at steps of 50 MHz', () => {
    const file = everyNth(measuredFile('MSL100.s2p'), 50)
    expect(causality(file)?.grade).toBe('good')
    expect(causality(delayed(file, 1e-9))?.grade).toBe('good')
    expect(causality(reversed(file))?.grade).toBe('poor')
    expect(causality(delayed(reversed(file), 1e-10))?.grade).toBe('poor')
  })
})

describe.skipIf(!isThere('diff_fdf.s4p'))(`metrics of a simulated pair (${WHEN_THERE})`, () => {
  it('agree with numpy, and tell the file from the same backwards in time', () => {
    const file = measuredFile('diff_fdf.s4p')
    expect(passivity(file)).toEqual({
      percent: 100,
      grade: 'good',
      largest: { value: expect.closeTo(0.9992786635534566, 12), hz: 1e7 },
    })
    expect(reciprocity(file)?.percent).toBe(100)
    expect(causality(file)).toMatchObject({ percent: expect.closeTo(99.96592363797674, 9), grade: 'good' })
    expect(causality(delayed(file, 1e-9))?.grade).toBe('good')
    expect(causality(reversed(file))?.grade).toBe('poor')
  })
})
