import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { type Network, network } from '../../../lib/channel/networks/network'
import { writeTouchstone } from '../../../lib/channel/touchstone'
import { fileOf } from './reading'

const part = fc.double({ noNaN: true, noDefaultInfinity: true })
const ohm = fc.oneof(fc.constant(50), fc.double({ min: 1e-3, max: 1e6, noNaN: true }))

/** Any network that the format can hold. */
const networks: fc.Arbitrary<Network> = fc
  .record({ ports: fc.integer({ min: 1, max: 6 }), points: fc.integer({ min: 1, max: 5 }) })
  .chain(({ ports, points }) =>
    fc.record({
      ports: fc.constant(ports),
      hz: fc
        .array(fc.double({ min: 0, max: 1e12, noNaN: true }), { minLength: points, maxLength: points })
        .map((hz) => Float64Array.from(hz, (f) => f + 0).sort())
        .filter((hz) => hz.every((f, k) => k === 0 || f > (hz[k - 1] ?? f))),
      s: fc
        .array(part, { minLength: 2 * ports * ports * points, maxLength: 2 * ports * ports * points })
        .map((s) => Float64Array.from(s)),
      reference: fc
        .array(ohm, { minLength: ports, maxLength: ports })
        .map((ohms) => Float64Array.from(ohms.flatMap((value) => [value, 0]))),
    }),
  )

const sameBits = (one: Float64Array, other: Float64Array) =>
  one.length === other.length && one.every((value, k) => Object.is(value, other[k]))

describe('what is written is read back', () => {
  it.each(['1', '2.0'] as const)('version %s in RI to the bit; the seed is printed on failure', (version) => {
    fc.assert(
      fc.property(networks, (given) => {
        const file = fileOf(
          writeTouchstone(given, { version, format: 'RI' }),
          version === '1' ? `link.s${given.ports}p` : 'link.ts',
        )
        expect(sameBits(file.network.hz, given.hz)).toBe(true)
        expect(sameBits(file.network.s, given.s)).toBe(true)
        expect(sameBits(file.network.reference, given.reference)).toBe(true)
        const same = given.reference.every((value, k) => value === given.reference[k % 2])
        expect(file.version).toBe(version === '2.0' ? '2.0' : same ? '1.0' : '1.1')
        expect(file.warnings).toEqual([])
      }),
      { numRuns: 300 },
    )
  })

  it.each(['MA', 'DB'] as const)(
    'in %s to 1e-13 of the size, zero as zero; the seed is printed on failure',
    (format) => {
      const moderate = fc.oneof(
        fc.constant(0),
        fc.double({ min: 1e-9, max: 2, noNaN: true }),
        fc.double({ min: -2, max: -1e-9, noNaN: true }),
      )
      fc.assert(
        fc.property(fc.array(moderate, { minLength: 8, maxLength: 8 }), (s) => {
          const given = network(2, Float64Array.of(1e9), Float64Array.from(s), 50)
          const back = fileOf(writeTouchstone(given, { version: '1', format }), 'link.s2p').network.s
          for (let k = 0; k < 8; k += 2) {
            const size = Math.hypot(s[k] ?? 0, s[k + 1] ?? 0)
            expect(Math.hypot((back[k] ?? 0) - (s[k] ?? 0), (back[k + 1] ?? 0) - (s[k + 1] ?? 0))).toBeLessThanOrEqual(
              1e-13 * size,
            )
          }
        }),
        { numRuns: 300 },
      )
    },
  )
})

describe('the text', () => {
  const four = network(
    5,
    Float64Array.of(1e9),
    Float64Array.from({ length: 50 }, (_, k) => k),
    50,
  )

  it('of version 1 has the columns of the standard: S11 S21 S12 S22', () => {
    const given = network(
      2,
      Float64Array.of(0, 1.5e9),
      Float64Array.from({ length: 16 }, (_, k) => k),
      42.5,
    )
    expect(writeTouchstone(given, { version: '1', format: 'RI', comments: ['made up\nfor this test'] })).toBe(
      '! made up\n! for this test\n# Hz S RI R 42.5\n0 0 1 4 5 2 3 6 7\n1500000000 8 9 12 13 10 11 14 15\n',
    )
  })

  it('begins a line for each matrix row and after four numbers', () => {
    expect(writeTouchstone(four, { version: '1', format: 'RI' }).split('\n').slice(1, 4)).toEqual([
      '1000000000 0 1 2 3 4 5 6 7',
      '8 9',
      '10 11 12 13 14 15 16 17',
    ])
  })

  it('of version 2 has what the standard demands', () => {
    const given = {
      ...network(2, Float64Array.of(1), new Float64Array(8), 50),
      reference: Float64Array.of(50, 0, 75, 0),
    }
    expect(writeTouchstone(given, { version: '2.0', format: 'RI' })).toBe(
      '[Version] 2.0\n# Hz S RI R 50\n[Number of Ports] 2\n[Two-Port Data Order] 12_21\n[Number of Frequencies] 1\n[Reference] 50 75\n[Network Data]\n1 0 0 0 0 0 0 0 0\n[End]\n',
    )
  })

  it('is refused for what the format cannot hold', () => {
    const complex = { ...four, reference: four.reference.map((value, k) => (k % 2 === 1 ? 5 : value)) }
    expect(() => writeTouchstone(complex, { version: '1', format: 'RI' })).toThrow(
      'Port 1 has a complex reference; renormalise the network to a real one first.',
    )
    const unknown = { ...four, s: four.s.map(() => Number.NaN) }
    expect(() => writeTouchstone(unknown, { version: '1', format: 'RI' })).toThrow('NaN cannot be written.')
  })
})
