import { describe, expect, it } from 'vitest'
import type { BudgetFile, PlaneCode } from '../../../lib/budget/schema'
import { type Network, network } from '../../../lib/channel/networks/network'
import { line } from '../links'
import { flagged, type Lines, words } from './flagged'

type File = NonNullable<BudgetFile['evidence']>[string]
const file = (rest: Partial<File> = {}): NonNullable<BudgetFile['evidence']> => ({
  e: { order: 'a0', name: 'part.s2p', sha256: 'f'.repeat(64), ports: 2, modes: 'mixed-as-two-ports', ...rest },
})
const cable = (rest: Lines[string] | object = {}) =>
  line('a1', '4 dB', { kind: 'cable', covers: 'bulk terminations mated-pairs', evidence: 'e', ...rest })
const planes = (from: PlaneCode, to: PlaneCode) => ({
  tx: { order: 'Zz', code: from },
  rx: { order: 'z0', code: to },
})

describe('mistake 2: test fixtures left in, removed twice, or removed where the limit contains them (common practice, no source)', () => {
  it('left in, by the file’s own word', () => {
    expect(flagged('fixtures-in', { lines: { c: cable() }, evidence: file({ fixtures: 'in' }) })).toEqual([
      'c evidence',
    ])
    expect(flagged('fixtures-in', { lines: { c: cable() }, evidence: file({ fixtures: 'none' }) })).toEqual([])
  })

  it('belong in where the limit goes from test point to test point behind a fixture, and are missed there if removed (IEEE 802.3, from memory)', () => {
    const parts = (fixtures: 'in' | 'removed') => ({
      lines: { c: cable() },
      evidence: file({ fixtures }),
      planes: planes('tp1', 'tp4'),
    })
    expect(flagged('fixtures-in', parts('in'))).toEqual([])
    expect(flagged('fixtures-removed-within-planes', parts('in'))).toEqual([])
    expect(flagged('fixtures-removed-within-planes', parts('removed'))).toEqual(['c evidence'])
    expect(words('fixtures-removed-within-planes', parts('removed'))).toMatch(/ends 'Ball to ball' at tp1 and tp4/)
  })

  it('are no part of a limit from ball to ball, nor of a line with others at both sides', () => {
    const evidence = file({ fixtures: 'removed' })
    expect(flagged('fixtures-removed-within-planes', { lines: { c: cable() }, evidence })).toEqual([])
    const between = { a: line('a0', '1 dB', { kind: 'via' }), c: cable(), b: line('a2', '1 dB', { kind: 'via' }) }
    const parts = { lines: between, evidence, planes: planes('tp1', 'tp4') }
    expect(flagged('fixtures-removed-within-planes', parts)).toEqual([])
  })

  it('removed from the file, and once more by an overlap or by a fixture file', () => {
    const evidence = {
      ...file({ fixtures: 'removed', fixturesRemovedBy: '2x-thru' }),
      f: { order: 'a1', name: 'thru' },
    }
    const other = line('a3', '1 dB')
    const overlap = line('a2', '0.5 dB', { kind: 'overlap', overlapA: 'c', overlapB: 'o' })
    const twice = { lines: { c: cable(), v: overlap, o: other }, evidence }
    expect(flagged('fixtures-removed-twice', twice)).toEqual(['c evidence'])
    expect(words('fixtures-removed-twice', twice)).toMatch(/removed \(by 2x-thru\), and an overlap line subtracts/)
    expect(flagged('fixtures-removed-twice', { lines: { c: cable({ fixture: 'f' }) }, evidence })).toEqual([
      'c fixture',
    ])
    expect(flagged('fixtures-removed-twice', { lines: { c: cable() }, evidence })).toEqual([])
  })

  it('whether they are in a network file must be said', () => {
    expect(flagged('fixtures-not-said', { lines: { c: cable() }, evidence: file() })).toEqual(['c evidence'])
    expect(flagged('fixtures-not-said', { lines: { c: cable() }, evidence: file({ ports: null }) })).toEqual([])
  })
})

/** A matched two-port from 10 MHz to 20 GHz in 10 MHz: dB of loss over GHz, and a delay. */
function synthetic(loss: (ghz: number) => number, delay: number): Network {
  const hz = Float64Array.from({ length: 2000 }, (_, k) => (k + 1) * 1e7)
  const s = new Float64Array(8 * hz.length)
  for (const [k, f] of hz.entries()) {
    const size = 10 ** (-loss(f / 1e9) / 20)
    for (const at of [2, 4]) {
      s[8 * k + at] = size * Math.cos(2 * Math.PI * f * delay)
      s[8 * k + at + 1] = -size * Math.sin(2 * Math.PI * f * delay)
    }
  }
  return network(2, hz, s, 100)
}

describe('mistake 2, from the numbers of a file (made here from a loss and a delay; thresholds common practice, no source)', () => {
  const parts = (rest: object, fixtures: File['fixtures'] = 'none') => ({
    lines: { c: line('a1', null, { kind: 'trace', model: 'network', taken: 'discrete', evidence: 'e', ...rest }) },
    evidence: file({ fixtures, reference: '100 Ω' }),
  })
  const data = (read: Network) => new Map([['f'.repeat(64), { network: read }]])
  const plain = (ghz: number) => Math.sqrt(ghz) + 0.1 * ghz
  const typed = { length: '100 mm', delay: '6 ps/mm' }

  it('a delay more than 10 % or 30 ps over that of the declared length is asked about', () => {
    const at = (ps: number, rest: object = typed) =>
      flagged('delay-longer-than-length', parts(rest), data(synthetic(plain, ps * 1e-12)))
    expect(at(629)).toEqual([])
    expect(at(631)).toEqual(['c evidence'])
    // Of 120 ps the tenth is the smaller.
    expect(at(131, { length: '20 mm', delay: '6 ps/mm' })).toEqual([])
    expect(at(133, { length: '20 mm', delay: '6 ps/mm' })).toEqual(['c evidence'])
    // √4 / c over 100 mm is 667 ps; without a Dk, the slowest board (Dk 4.7) takes 723 ps.
    expect(at(700, { length: '100 mm', dk: '4' })).toEqual(['c evidence'])
    expect(at(750, { length: '100 mm' })).toEqual([])
    expect(at(760, { length: '100 mm' })).toEqual(['c evidence'])
  })

  it('more than 0.3 dB at the low end is asked about; a long lossy line has none', () => {
    const at = (constant: number, rest: object = typed) =>
      flagged('loss-at-low-end', parts(rest), data(synthetic((ghz) => constant + 5 * Math.sqrt(ghz), 6e-10)))
    expect(at(0)).toEqual([])
    expect(at(0.28)).toEqual([])
    expect(at(0.32)).toEqual(['c evidence'])
    expect(at(3, { kind: 'component' })).toEqual([])
  })

  it('a loss that falls with frequency, or a gain, after fixtures were removed', () => {
    const falling = synthetic((ghz) => 3 - 0.1 * ghz, 6e-10)
    const gaining = synthetic((ghz) => 0.05 * ghz - 0.1, 6e-10)
    expect(flagged('rises-after-removal', parts(typed, 'removed'), data(falling))).toEqual(['c evidence'])
    expect(flagged('rises-after-removal', parts(typed, 'none'), data(falling))).toEqual([])
    expect(flagged('gain-after-removal', parts(typed, 'removed'), data(gaining))).toEqual(['c evidence'])
    // 0.1 dB at most: 10^(0.1/20) = 1.0116, at the lowest point 0.0995 dB.
    expect(words('gain-after-removal', parts(typed, 'removed'), data(gaining))).toMatch(/up to 1\.01[12] times/)
    expect(flagged('gain-after-removal', parts(typed, 'removed'), data(synthetic(plain, 6e-10)))).toEqual([])
    expect(flagged('rises-after-removal', parts(typed, 'removed'), data(synthetic(plain, 6e-10)))).toEqual([])
  })
})
