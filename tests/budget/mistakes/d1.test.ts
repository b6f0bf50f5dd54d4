import { describe, expect, it } from 'vitest'
import { line } from '../links'
import { flagged, words } from './flagged'

/** The arithmetic of the mistake is plain; which rows counted twice in real budgets: practice.md A4, A8 (vendor tables, 'including connectors'). */
describe('mistake 1: a footprint via counted in the connector’s data and again as a line, or by nobody (common practice, no source)', () => {
  const channel = (connector: string, ...vias: ('a' | 'b')[]) => ({
    lines: {
      t: line('a1', '1 dB', { kind: 'trace', covers: '' }),
      ...(vias.includes('a') ? { a: line('a2', '0.4 dB', { kind: 'via', covers: '' }) } : {}),
      c: line('a3', '1.2 dB', { kind: 'connector', covers: connector }),
      ...(vias.includes('b') ? { b: line('a4', '0.4 dB', { kind: 'via', covers: '' }) } : {}),
      u: line('a5', '1 dB', { kind: 'trace', covers: '' }),
    },
  })
  const both = 'footprint-via-a footprint-via-b'

  it('in the data and as a line: counted twice, once for each side', () => {
    const parts = channel(`${both} mating-interface`, 'a', 'b')
    expect(flagged('counted-twice', parts)).toEqual(['c covers', 'c covers'])
    expect(flagged('nobody-counts', parts)).toEqual([])
  })

  it('in neither: nobody counts it, at the side where it lacks', () => {
    expect(flagged('nobody-counts', channel('mating-interface', 'a'))).toEqual(['c covers'])
    expect(words('nobody-counts', channel('mating-interface', 'a'))).toMatch(
      /^Nobody counts the footprint via between 'Line a3' and 'Line a5'\. Add a line for the via/,
    )
  })

  it('in exactly one: no flag', () => {
    for (const parts of [channel('mating-interface', 'a', 'b'), channel(`${both} mating-interface`)]) {
      expect(flagged('counted-twice', parts)).toEqual([])
      expect(flagged('nobody-counts', parts)).toEqual([])
    }
  })

  it('a line put between two others is judged at both of its joints, and taken out again at the one that is left', () => {
    const parts = channel(`${both} mating-interface`)
    const with_ = { lines: { ...parts.lines, v: line('a2', '0.4 dB', { kind: 'via', covers: '' }) } }
    expect(flagged('counted-twice', parts)).toEqual([])
    expect(flagged('counted-twice', with_)).toEqual(['c covers'])
    expect(flagged('counted-twice', parts)).toEqual([])
  })
})
