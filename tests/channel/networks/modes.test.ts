import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  differentialTwoPort,
  mixedMode,
  network,
  type Pair,
  parsePortMap,
  renormalise,
  singleEnded,
} from '../../../lib/channel/networks'
import { difference, found, passive, references } from './random'

/** A network of N pairs, its ports paired in any order and polarity; both ports of a pair at one reference. */
const paired = fc.constantFrom(1, 2, 3, 8).chain((count) =>
  fc.tuple(
    passive(2 * count),
    references(count),
    fc.shuffledSubarray(
      Array.from({ length: 2 * count }, (_, port) => port),
      { minLength: 2 * count },
    ),
  ),
)

function asPairs(order: readonly number[]): Pair[] {
  return Array.from({ length: order.length / 2 }, (_, k) => [order[2 * k] ?? 0, order[2 * k + 1] ?? 0])
}

function equalReferences(pairs: readonly Pair[], ofPairs: Float64Array): Float64Array {
  const reference = new Float64Array(2 * ofPairs.length)
  for (const [k, pair] of pairs.entries())
    for (const port of pair) reference.set(ofPairs.subarray(2 * k, 2 * k + 2), 2 * port)
  return reference
}

const fourPort = passive(4).map((given) => ({ ...given, reference: Float64Array.of(50, 0, 50, 0, 50, 0, 50, 0) }))
const sdd = (given: Parameters<typeof differentialTwoPort>[0], text: string) =>
  differentialTwoPort(given, found(parsePortMap(text, given.ports)))

describe('differential and common mode', () => {
  it('there and back, 1 to 8 pairs in any order, complex references (random)', () => {
    fc.assert(
      fc.property(paired, ([drawn, ofPairs, order]) => {
        const pairs = asPairs(order)
        const given = { ...drawn, reference: equalReferences(pairs, ofPairs) }
        const back = singleEnded(mixedMode(given, pairs), pairs)
        expect(difference(back.s, given.s)).toBeLessThan(1e-14)
        expect(difference(back.reference, given.reference)).toBe(0)
      }),
    )
  })

  it('hold the power of the ports: M is orthonormal (random)', () => {
    fc.assert(
      fc.property(paired, ([drawn, ofPairs, order]) => {
        const pairs = asPairs(order)
        const given = { ...drawn, reference: equalReferences(pairs, ofPairs) }
        const { s } = mixedMode(given, pairs)
        expect(Math.hypot(...s)).toBeCloseTo(Math.hypot(...given.s), 13)
      }),
    )
  })

  it('of a pair at two references is that of the pair brought to the reference of its + port', () => {
    fc.assert(
      fc.property(passive(2), (given) => {
        const [r = 0, x = 0] = given.reference
        const even = renormalise(given, Float64Array.of(r, x, r, x))
        const modes = mixedMode(given, [[0, 1]])
        expect(difference(modes.s, mixedMode(even, [[0, 1]]).s)).toBe(0)
        expect([...modes.reference]).toEqual([2 * r, 2 * x, r / 2, x / 2])
      }),
    )
  })

  it('of two uncoupled 50 Ω resistors to ground are matched at 100 and 25 Ω; of one between both ports only differential (circuit theory)', () => {
    const hz = Float64Array.of(1e9)
    const reference = Float64Array.of(50, 0, 50, 0)
    const apart = mixedMode({ ports: 2, hz, s: new Float64Array(8), reference }, [[0, 1]])
    expect([...apart.s].map(Math.abs)).toEqual(new Array(8).fill(0))
    // 100 Ω between the ports: Y = [1 −1; −1 1]/100, S = (1 − 50·Y)/(1 + 50·Y) = [0.5 0.5; 0.5 0.5].
    const bridged = mixedMode({ ports: 2, hz, s: Float64Array.of(0.5, 0, 0.5, 0, 0.5, 0, 0.5, 0), reference }, [[0, 1]])
    expect(difference(bridged.s, Float64Array.of(0, 0, 0, 0, 0, 0, 1, 0))).toBeLessThan(1e-16)
  })

  it('take every port once', () => {
    const given = network(4, Float64Array.of(1e9), new Float64Array(32), 50)
    const [a, b, c]: Pair[] = [
      [0, 1],
      [2, 3],
      [1, 2],
    ]
    for (const pairs of [[a], [a, c], [a, b, a], [a, [2, 4]], [a, [2, 2.5]]] as Pair[][])
      expect(() => mixedMode(given, pairs)).toThrow(RangeError)
  })
})

describe('the two-port that a map chooses', () => {
  it('turns its sign with the polarity of one end and not of both (by the formula; random)', () => {
    fc.assert(
      fc.property(fourPort, (given) => {
        const plain = sdd(given, '1,3>2,4').s
        const oneTurned = sdd(given, '3,1>2,4').s
        const negated = plain.map((x, k) => (k >= 2 && k < 6 ? -x : x))
        expect(difference(oneTurned, negated)).toBeLessThan(1e-16)
        expect(difference(sdd(given, '3,1>4,2').s, plain)).toBeLessThan(1e-16)
      }),
    )
  })

  it('exchanges both ends when turned round', () => {
    fc.assert(
      fc.property(fourPort, (given) => {
        const [a, b, c, d] = [0, 2, 4, 6].map((k) => [...sdd(given, '1,3>2,4').s.subarray(k, k + 2)])
        expect([...sdd(given, '2,4>1,3').s]).toEqual([d, c, b, a].flat())
      }),
    )
  })

  it('is a file of two ports itself, or any two ports of a larger one at their own references', () => {
    fc.assert(
      fc.property(passive(2), passive(6), (two, six) => {
        expect(sdd(two, '1>2')).toBe(two)
        const chosen = sdd(six, '5>2')
        const element = (row: number, column: number) => [
          ...six.s.subarray(2 * (6 * row + column), 2 * (6 * row + column) + 2),
        ]
        expect([...chosen.s]).toEqual([element(4, 4), element(4, 1), element(1, 4), element(1, 1)].flat())
        expect([...chosen.reference]).toEqual([...six.reference.subarray(8, 10), ...six.reference.subarray(2, 4)])
      }),
    )
  })

  it('out of eight ports is that of the four with the rest matched', () => {
    fc.assert(
      fc.property(passive(8), (drawn) => {
        const given = { ...drawn, reference: drawn.reference.map((_, k) => (k % 2 === 0 ? 42.5 : 0)) }
        const pairs: Pair[] = [
          [0, 4],
          [7, 2],
          [1, 3],
          [5, 6],
        ]
        const modes = mixedMode(given, pairs)
        const element = (row: number, column: number) => [
          ...modes.s.subarray(2 * (8 * row + column), 2 * (8 * row + column) + 2),
        ]
        const chosen = sdd(given, '1,5>8,3')
        const expected = [element(0, 0), element(0, 1), element(1, 0), element(1, 1)].flat()
        expect(difference(chosen.s, Float64Array.from(expected))).toBeLessThan(1e-16)
        expect([...chosen.reference]).toEqual([85, 0, 85, 0])
      }),
    )
  })

  it('refuses a map of another file', () => {
    const two = network(2, Float64Array.of(1e9), new Float64Array(8), 50)
    expect(() => differentialTwoPort(two, { from: [0, 2], to: [1, 3] })).toThrow(RangeError)
  })
})
