import { describe, expect, it } from 'vitest'
import { PAD_BOUNDS, pad } from '../../../lib/budget/models/pad'
import { ask, codes, computed, counted, edgesOf, pieceOf } from './ask'

const fields = { kind: 'component', model: 'pad', capacitance: '100 fF' } as const

describe('a pad', () => {
  it('is 100 fF in 50 Ω per conductor: 0.17451 dB at 12.890625 GHz (physics.md W10), over the band from 0 Hz to its corner', () => {
    const piece = pieceOf(ask(pad, fields))
    expect(counted(piece, 12.890625e9)).toBeCloseTo(0.17451, 5)
    expect(piece).toMatchObject({ from: 0, reflects: true, attenuation: null })
    // 1/(2π·25 Ω·100 fF).
    expect(piece.to / 1e9).toBeCloseTo(63.662, 3)
  })

  it('may vary in its capacitance', () => {
    const answer = ask(pad, fields)
    expect(computed(answer).values).toEqual({ capacitance: expect.closeTo(1e-13, 25) })
    expect(counted(pieceOf(answer, { capacitance: 250e-15 }), 10e9)).toBeCloseTo(0.62286, 5)
  })

  it('needs its capacitance, and leaves a missing reference to whoever asks', () => {
    expect(codes(ask(pad, { ...fields, capacitance: null }))).toEqual(['field-missing'])
    expect(pieceOf(ask(pad, fields, { reference: null })).to).toBe(3e11)
  })

  it.each(edgesOf(PAD_BOUNDS, { capacitance: 1e-13, hz: 10e9, reference: 100 }))(
    '$bound.what, $end: counts just inside, is flagged just outside',
    ({ bound, inside, outside }) => {
      const typed = (x: number) => ask(pad, { ...fields, [bound.field]: `${x * 1e15} fF` })
      expect(typed(inside).drafts).toEqual([])
      expect(typed(outside)).toMatchObject({ found: null, drafts: [{ code: 'outside-validity', field: bound.field }] })
    },
  )
})
