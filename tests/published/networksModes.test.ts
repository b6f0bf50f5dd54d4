import { describe, expect, it } from 'vitest'
import { differentialTwoPort, mixedMode, type Network, network, parsePortMap } from '../../lib/channel/networks'
import { difference, interleaved, oracle, type Parts } from './networksOracle'

type Case = {
  readonly order: 'odd_even' | 'sequential'
  readonly z0: number
  readonly f_hz: readonly number[]
  readonly s: Parts
  readonly expected_mm: Parts
  readonly expected_sdd: Parts
}

const { cases } = oracle<{ cases: Record<string, Case> }>('o4_mixedmode')

const MAPS = { odd_even: '1,3>2,4', sequential: '1,2>3,4' }

function differential(from: Network, text: string): Network {
  const map = parsePortMap(text, from.ports)
  if ('reason' in map) throw new Error(map.reason)
  return differentialTwoPort(from, map)
}

describe.each(Object.entries(cases))('mixed mode, case %s (numpy)', (_, one) => {
  const given = network(4, Float64Array.from(one.f_hz), interleaved(one.s), one.z0)

  it('gives all four modes to 1e-14, at 2·Z0 and Z0/2', () => {
    const [pairOne, pairTwo] =
      one.order === 'odd_even'
        ? ([
            [0, 2],
            [1, 3],
          ] as const)
        : ([
            [0, 1],
            [2, 3],
          ] as const)
    const modes = mixedMode(given, [pairOne, pairTwo])
    expect(difference(modes.s, interleaved(one.expected_mm))).toBeLessThan(1e-14)
    const { z0 } = one
    expect([...modes.reference]).toEqual([2 * z0, 0, 2 * z0, 0, z0 / 2, 0, z0 / 2, 0])
  })

  it('gives Sdd as a two-port of twice the reference', () => {
    const pair = differential(given, MAPS[one.order])
    expect(difference(pair.s, interleaved(one.expected_sdd))).toBeLessThan(1e-14)
    expect(pair.ports).toBe(2)
    expect([...pair.reference]).toEqual([2 * one.z0, 0, 2 * one.z0, 0])
  })
})

describe('the four-port of the Touchstone specification at 5 GHz', () => {
  const rows = [
    [
      [0.6, 161.24],
      [0.4, -42.2],
      [0.42, -66.58],
      [0.53, -79.34],
    ],
    [
      [0.4, -42.2],
      [0.6, 161.2],
      [0.53, -79.34],
      [0.42, -66.58],
    ],
    [
      [0.42, -66.58],
      [0.53, -79.34],
      [0.6, 161.24],
      [0.4, -42.2],
    ],
    [
      [0.53, -79.34],
      [0.42, -66.58],
      [0.4, -42.2],
      [0.6, 161.24],
    ],
  ]
  const s = rows.flat().flatMap(([size = 0, degrees = 0]) => {
    const angle = (degrees * Math.PI) / 180
    return [size * Math.cos(angle), size * Math.sin(angle)]
  })
  const given = network(4, Float64Array.of(5e9), Float64Array.from(s), 50)
  const polar = (samples: Float64Array, at: number) => {
    const [re = 0, im = 0] = samples.subarray(2 * at)
    return [Math.hypot(re, im), (Math.atan2(im, re) * 180) / Math.PI]
  }

  it.each([
    [
      '1,3>2,4',
      [
        [0, 2],
        [1, 3],
      ],
      [0.93532, 141.804],
      [0.32079, 51.821],
      [0.88255, -63.459],
    ],
    [
      '1,2>3,4',
      [
        [0, 1],
        [2, 3],
      ],
      [0.98003, 151.884],
      [0.15197, 63.041],
      [0.9442, -73.702],
    ],
  ] as const)('%s: Sdd11, Sdd21, Scc21 (recomputed from the four terms of each)', (text, pairs, dd11, dd21, cc21) => {
    const sdd = differential(given, text).s
    for (const [found, [size, degrees]] of [
      [polar(sdd, 0), dd11],
      [polar(sdd, 2), dd21],
      [polar(mixedMode(given, pairs).s, 4 * 3 + 2), cc21],
    ] as const) {
      expect(found[0]).toBeCloseTo(size, 5)
      expect(found[1]).toBeCloseTo(degrees, 3)
    }
  })
})
