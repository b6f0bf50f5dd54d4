import { createHash } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { cascade } from '../../lib/channel/networks'
import { clearCascade } from '../bench/clear/cascade'
import { difference, interleaved, oracle, type Parts } from './networksOracle'

type Case = {
  readonly recipe: {
    readonly seed: number
    readonly stages: number
    readonly nf: number
    readonly refl: number
    readonly t_re0: number
    readonly t_re1: number
    readonly t_im: number
  }
  readonly input_sha256_f64le_re_im_interleaved: string
  readonly expected: Parts
}

const { cases, tolerance } = oracle<{
  cases: Record<string, Case>
  tolerance: { abs: number; rel_s21: number }
}>('o1_cascade')

/** mulberry32, a public-domain generator of 32 bits. */
function mulberry32(seed: number): () => number {
  let state = seed >>> 0
  return () => {
    state = (state + 0x6d2b79f5) >>> 0
    let mixed = Math.imul(state ^ (state >>> 15), state | 1)
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296
  }
}

/** The inputs, drawn as the recipe says: reflections in a square around 0, transmissions in a box turned by a random quarter. */
function rebuilt({ seed, stages, nf, refl, t_re0, t_re1, t_im }: Case['recipe']): Float64Array[] {
  const draw = mulberry32(seed)
  const reflection = () => [refl * (2 * draw() - 1), refl * (2 * draw() - 1)]
  const transmission = () => {
    const re = t_re0 + t_re1 * draw()
    const im = t_im * (2 * draw() - 1)
    const quarter = Math.floor(4 * draw())
    return (
      [
        [re, im],
        [-im, re],
        [-re, -im],
        [im, -re],
      ][quarter] ?? []
    )
  }
  return Array.from({ length: stages }, () =>
    Float64Array.from(
      Array.from({ length: nf }, () => [reflection(), transmission(), transmission(), reflection()]).flat(2),
    ),
  )
}

describe.each(Object.entries(cases))('cascade, case %s (numpy longdouble)', (_, { recipe, expected, ...known }) => {
  const chain = rebuilt(recipe)
  const exact = interleaved(expected)

  it('has the inputs of the reference, byte by byte', () => {
    const hash = createHash('sha256')
    for (const samples of chain) hash.update(new Uint8Array(samples.buffer))
    expect(hash.digest('hex')).toBe(known.input_sha256_f64le_re_im_interleaved)
  })

  it.each([
    ['fast', cascade],
    ['clear', clearCascade],
  ])('the %s one gives the reference, S12 and S21 down to 1e-9 with their own digits', (_, kernel) => {
    const whole = kernel(chain, recipe.nf)
    expect(difference(whole, exact)).toBeLessThan(tolerance.abs)
    for (const part of [2, 4])
      for (let k = part; k < exact.length; k += 8) {
        const error = Math.hypot((whole[k] ?? 0) - (exact[k] ?? 0), (whole[k + 1] ?? 0) - (exact[k + 1] ?? 0))
        expect(error / Math.hypot(exact[k] ?? 0, exact[k + 1] ?? 0)).toBeLessThan(tolerance.rel_s21)
      }
  })
})
