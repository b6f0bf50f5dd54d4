import { describe, expect, it } from 'vitest'
import { chainOf, fromChain, fromTransfer, network, transferOf } from '../../lib/channel/networks'
import { difference } from './networksOracle'

const polar = [
  [0.61, 165],
  [0.05, 42],
  [3.72, 59],
  [0.45, -48],
]
const s = Float64Array.from(
  polar.flatMap(([size = 0, degrees = 0]) => {
    const angle = (degrees * Math.PI) / 180
    return [size * Math.cos(angle), size * Math.sin(angle)]
  }),
)
const transistor = network(2, Float64Array.of(1e9), s, 50)

function matrix(found: ReturnType<typeof transferOf>): Float64Array {
  if ('reason' in found) throw new Error(found.reason)
  return found
}

describe('a two-port that handbooks convert (Gonzalez, Microwave Transistor Amplifiers; Frickey 1994)', () => {
  it('has this T, with the wave that goes in on the left', () => {
    const published = Float64Array.of(0.1385, -0.2304, 0.0354, 0.1157, -0.0452, 0.1576, -0.0019, -0.0291)
    expect(difference(matrix(transferOf(transistor)), published)).toBeLessThan(5.1e-5)
    const recomputed = [0.138451, -0.230421, 0.035368, 0.115682, -0.045199, 0.157626, -0.001946, -0.029121]
    expect(difference(matrix(transferOf(transistor)), Float64Array.from(recomputed))).toBeLessThan(5.1e-7)
  })

  it('has this ABCD in 50 Ω (Frickey’s formulas, recomputed)', () => {
    const found = matrix(chainOf(transistor))
    const expected = [0.063337, 0.006883, 1.495766, -3.983897, 0.00220963, -0.00243244, 0.073168, -0.266425]
    for (const [k, value] of expected.entries()) expect(found[k]).toBeCloseTo(value, k === 4 || k === 5 ? 8 : 6)
  })

  it('comes back from both to 1e-15', () => {
    const { hz, reference } = transistor
    for (const back of [
      fromTransfer(hz, matrix(transferOf(transistor)), reference),
      fromChain(hz, matrix(chainOf(transistor)), reference),
    ]) {
      if ('reason' in back) throw new Error(back.reason)
      expect(difference(back.s, s)).toBeLessThan(2e-15)
    }
  })
})
