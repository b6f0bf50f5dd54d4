import { describe, expect, it } from 'vitest'
import { renormalise, type Waves } from '../../lib/channel/networks'
import { difference, interleaved, type Nested, oracle, type Parts } from './networksOracle'

type Reference = number | { readonly re: readonly Nested[]; readonly im: readonly Nested[] }
type Case = {
  readonly wave_definition: 'power' | 'pseudo' | 'traveling'
  readonly z_old: Reference
  readonly z_new: Reference
  readonly s: { readonly re: readonly Nested[]; readonly im: readonly Nested[] }
  readonly expected: { readonly re: readonly Nested[]; readonly im: readonly Nested[] }
}

const { cases } = oracle<{ cases: Record<string, Case> }>('o5_renorm')

const WAVES: Record<Case['wave_definition'], Waves> = { power: 'power', pseudo: 'pseudo', traveling: 'travelling' }

/** One frequency of what is given per frequency. */
function at(given: { readonly re: readonly Nested[]; readonly im: readonly Nested[] }, k: number): Float64Array {
  return interleaved({ re: given.re[k] ?? [], im: given.im[k] ?? [] } satisfies Parts)
}

function reference(given: Reference, k: number, ports: number): Float64Array {
  if (typeof given !== 'number') return at(given, k)
  return Float64Array.from({ length: 2 * ports }, (_, part) => (part % 2 === 0 ? given : 0))
}

/** The references of some cases differ from frequency to frequency, so each frequency is a network of its own. */
function renormalised({ s, z_old, z_new, wave_definition }: Case, k: number): Float64Array {
  const samples = at(s, k)
  const ports = Math.sqrt(samples.length / 2)
  const old = { ports, hz: Float64Array.of(1e9), s: samples, reference: reference(z_old, k, ports) }
  return renormalise(old, reference(z_new, k, ports), WAVES[wave_definition]).s
}

describe.each(Object.entries(cases))('renormalisation, case %s (numpy, directly in S)', (_, one) => {
  it('gives the reference to 1e-14', () => {
    for (let k = 0; k < one.s.re.length; k++)
      expect(difference(renormalised(one, k), at(one.expected, k))).toBeLessThan(1e-14)
  })
})

describe('a lossless line of a multiple of half a wave', () => {
  it('has |S21| = 1 and no reflection between any references, where it has no impedance matrix (by theory)', () => {
    const half = cases.half_wave_lossless_line
    if (!half) throw new Error('the case of the half wave is missing')
    for (const k of [2, 4]) {
      const [s11r = 1, s11i = 1, , , s21r = 0, s21i = 0] = renormalised(half, k)
      expect(Math.hypot(s11r, s11i)).toBeLessThan(1e-15)
      expect(Math.hypot(s21r, s21i)).toBeCloseTo(1, 15)
    }
  })
})
