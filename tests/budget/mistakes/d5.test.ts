import { describe, expect, it } from 'vitest'
import type { BudgetFile } from '../../../lib/budget/schema'
import { network } from '../../../lib/channel/networks/network'
import { line } from '../links'
import { flagged, words } from './flagged'

type File = NonNullable<BudgetFile['evidence']>[string]
const SHA = 'e'.repeat(64)
const rests = (file: Partial<File>, rest: object = {}) => ({
  lines: { c: line('a1', '1 dB', { kind: 'connector', covers: 'mating-interface', evidence: 'e', ...rest }) },
  evidence: { e: { order: 'a0', name: 'part', sha256: SHA, fixtures: 'none' as const, ...file } },
})

describe('mistake 5: 85 Ω in 100 Ω, one conductor for a pair, wrong port pairs (practice A7, A18)', () => {
  it('a line’s own impedance more than a tenth from the link’s', () => {
    const of = (impedance: string) =>
      flagged('impedance-differs', { lines: { t: line('a1', '1 dB', { kind: 'trace', impedance }) } })
    expect(of('85 Ω')).toEqual(['t impedance'])
    expect(of('92.5 Ω')).toEqual([])
    expect(of('110 Ω')).toEqual([])
    expect(of('111 Ω')).toEqual(['t impedance'])
  })

  it('a file in another reference; two conductors of 50 Ω are a pair of 100 Ω', () => {
    const of = (file: Partial<File>) => flagged('reference-differs', rests(file))
    expect(of({ ports: 4, modes: 'single-ended', reference: '50 Ω' })).toEqual([])
    expect(of({ ports: 4, modes: 'single-ended', reference: '42.5 Ω' })).toEqual(['c evidence'])
    expect(of({ ports: 2, modes: 'mixed-as-two-ports', reference: '85 Ω' })).toEqual(['c evidence'])
    expect(of({ ports: 2, modes: 'mixed-as-two-ports', reference: '100 Ω' })).toEqual([])
  })

  it('a two-port that does not say what it is, and one that says single-ended', () => {
    expect(flagged('two-port-not-answered', rests({ ports: 2 }))).toEqual(['c evidence'])
    expect(flagged('two-port-not-answered', rests({ ports: 2, modes: 'mixed-as-two-ports' }))).toEqual([])
    expect(flagged('two-port-not-answered', rests({ ports: 4 }))).toEqual([])
    expect(flagged('single-ended-taken-as-differential', rests({ ports: 2, modes: 'single-ended' }))).toEqual([
      'c evidence',
    ])
  })

  /** Two uncoupled conductors, 1 to 3 and 2 to 4, with some coupling between 1 and 2. */
  const fourPort = () => {
    const hz = Float64Array.from({ length: 200 }, (_, k) => (k + 1) * 1e8)
    const s = new Float64Array(32 * hz.length)
    const put = (k: number, a: number, b: number, size: number) => {
      for (const [i, j] of [
        [a, b],
        [b, a],
      ] as const)
        s[32 * k + 2 * (4 * (i - 1) + (j - 1))] = size
    }
    for (let k = 0; k < hz.length; k++) {
      for (const [a, b] of [
        [1, 3],
        [2, 4],
      ] as const)
        put(k, a, b, 0.98 - 0.002 * k)
      for (const [a, b] of [
        [1, 2],
        [3, 4],
      ] as const)
        put(k, a, b, 0.02)
    }
    return network(4, hz, s, 50)
  }

  it('wrong port pairs, by where low frequencies come out', () => {
    const of = (portMap: string) =>
      rests({ ports: 4, modes: 'single-ended' }, { model: 'network', taken: 'discrete', portMap })
    const data = new Map([[SHA, { network: fourPort() }]])
    expect(flagged('port-pairs-doubtful', of('1,2>3,4'), data)).toEqual([])
    expect(flagged('port-pairs-doubtful', of('2,1>4,3'), data)).toEqual([])
    expect(flagged('port-pairs-doubtful', of('3,4>1,2'), data)).toEqual([])
    expect(flagged('port-pairs-doubtful', of('1,3>2,4'), data)).toEqual(['c portMap'])
    expect(words('port-pairs-doubtful', of('1,3>2,4'), data)).toMatch(/as 1,3>2,4; the file looks like 1,2>3,4/)
  })

  /**
   * A line of 50 Ω, a quarter wave long at 10 GHz and without loss, in its own reference: |S21| = 1. In 100 Ω it transforms 100 Ω
   * to 25 Ω: |Γ| = (25−100)/(25+100) = 0.6, so it loses −10 log10(1 − 0.36) = 1.938 dB.
   */
  it('a loss that differs by over 0.2 dB between the file’s reference and the link’s (quarter-wave transformer, any handbook)', () => {
    const hz = Float64Array.from({ length: 201 }, (_, k) => k * 1e8)
    const s = new Float64Array(8 * hz.length)
    for (const [k, f] of hz.entries()) {
      for (const at of [2, 4]) {
        s[8 * k + at] = Math.cos((Math.PI / 2) * (f / 1e10))
        s[8 * k + at + 1] = -Math.sin((Math.PI / 2) * (f / 1e10))
      }
    }
    const of = (ohm: number) =>
      [
        rests(
          { ports: 2, modes: 'mixed-as-two-ports', reference: `${ohm} Ω` },
          { model: 'network', taken: 'discrete', portMap: '1>2' },
        ),
        new Map([[SHA, { network: network(2, hz, s, ohm) }]]),
      ] as const
    expect(flagged('renormalised-differs', ...of(50))).toEqual(['c evidence'])
    expect(words('renormalised-differs', ...of(50))).toMatch(/counts 1\.94 dB in the link's/)
    // 85 Ω: |Γ| = (72.25 − 100)/(72.25 + 100), 0.114 dB (physics.md D13: quarter-wave 85 in 100, recomputed there).
    expect(flagged('renormalised-differs', ...of(85))).toEqual([])
  })
})
