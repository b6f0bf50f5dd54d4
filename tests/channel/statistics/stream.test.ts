import { describe, expect, it } from 'vitest'
import { fnv1a, splitMix64, streamOf } from '../../../lib/channel/statistics/stream'
import { nextUnit, nextWord } from '../../../lib/channel/statistics/xoshiro'

describe('known answers of the generators', () => {
  it('xoshiro128** 1.1 from the state 1, 2, 3, 4 (its reference source, as kept in rust-random/rngs)', () => {
    const state = Int32Array.of(1, 2, 3, 4)
    const words = Array.from({ length: 10 }, () => nextWord(state) >>> 0)
    expect(words).toEqual([
      11520, 0, 5927040, 70819200, 2031721883, 1637235492, 1287239034, 3734860849, 3729100597, 4258142804,
    ])
  })

  it('SplitMix64 from 1234567 (splitmix64.c, as listed by Rosetta Code)', () => {
    expect(splitMix64(1234567n, 5)).toEqual([
      6457827717110365317n,
      3203168211198807973n,
      9817491932198370423n,
      4593380528125082431n,
      16408922859458223821n,
    ])
  })

  it.each([
    ['', 0xcbf29ce484222325n],
    ['a', 0xaf63dc4c8601ec8cn],
    ['foobar', 0x85944171f73967e8n],
  ])("64-bit FNV-1a of '%s' (its authors' test vectors)", (text, hash) => {
    expect(fnv1a(text)).toBe(hash)
  })
})

describe('streams by seed and name', () => {
  const first = (seed: number, name: string) => {
    const stream = streamOf(seed, name)
    return Array.from({ length: 4 }, () => nextWord(stream)).join(' ')
  }

  it('are the same for the same two and differ else', () => {
    expect(first(1, 'card')).toBe(first(1, 'card'))
    const others = [first(1, 'card'), first(2, 'card'), first(1, 'card '), first(1, 'Károly'), first(11, '')]
    expect(new Set(others).size).toBe(5)
  })

  it('of neighbouring names and seeds do not move together (the correlation of n pairs has a deviation of 1/√n)', () => {
    const draw = (seed: number, name: string) => {
      const stream = streamOf(seed, name)
      return Array.from({ length: 20_000 }, () => nextUnit(stream) - 0.5)
    }
    const one = draw(1, 'lane 1')
    for (const other of [draw(1, 'lane 2'), draw(2, 'lane 1')]) {
      const product = one.reduce((sum, value, n) => sum + value * (other[n] ?? Number.NaN), 0)
      expect(Math.abs((12 * product) / 20_000)).toBeLessThan(4 / Math.sqrt(20_000))
    }
  })
})
