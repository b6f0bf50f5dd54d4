import { describe, expect, it } from 'vitest'
import { lossClass } from '../../../lib/budget/models/lossClass'
import { perLength } from '../../../lib/budget/models/perLength'
import { table } from '../../../lib/budget/models/table'
import { ask, computed, counted, inserted, pieceOf } from './ask'

const terms = {
  kind: 'trace',
  model: 'per-length',
  length: '2 m',
  rootTerm: '0.8 dB/m',
  linearTerm: '0.05 dB/m',
  validFrom: '1 GHz',
  validTo: '15 GHz',
} as const

describe('√f and f terms over their band', () => {
  it('count 2 m × (0.8 √f + 0.05 f) at each frequency, matched (by hand)', () => {
    const piece = pieceOf(ask(perLength, terms))
    for (const ghz of [1, 4, 15]) {
      const db = 2 * (0.8 * Math.sqrt(ghz) + 0.05 * ghz)
      expect(counted(piece, ghz * 1e9)).toBeCloseTo(db, 12)
      expect(inserted(piece, ghz * 1e9)).toBeCloseTo(db, 12)
    }
    expect(piece).toMatchObject({ from: 1e9, to: 15e9, reflects: false, uncertainty: 0 })
  })

  it('may vary in length and terms', () => {
    const answer = ask(perLength, terms)
    expect(computed(answer).values).toEqual({ length: 2, rootTerm: 0.8, linearTerm: 0.05 })
    expect(counted(pieceOf(answer, { length: 1, rootTerm: 1 }), 4e9)).toBeCloseTo(2.2, 12)
  })

  it('reflect with impedance and delay: without loss a quarter wave of 85 Ω in 100 Ω costs 0.11421 dB (physics.md 6.1)', () => {
    const lossless = {
      ...terms,
      rootTerm: '0 dB/m',
      linearTerm: '0 dB/m',
      length: '3.75 mm',
      impedance: '85 Ω',
      delay: '6.6666666667 ps/mm',
    }
    const piece = pieceOf(ask(perLength, lossless))
    expect(piece.reflects).toBe(true)
    expect(inserted(piece, 10e9)).toBeCloseTo(0.11421, 5)
    expect(counted(piece, 10e9)).toBe(0)
    expect(pieceOf(ask(perLength, { ...lossless, delay: null })).reflects).toBe(false)
  })

  it('follow their surroundings: √f with the root of copper’s resistivity, f with the loss tangent (by hand)', () => {
    const warm = pieceOf(ask(perLength, terms, { surroundings: { temperature: 80, dfFactor: 1.3 } }))
    expect(counted(warm, 4e9)).toBeCloseTo(2 * (1.6 * Math.sqrt(1.2358) + 0.26), 12)
    const cold = pieceOf(ask(perLength, terms, { surroundings: { temperature: 0 } }))
    expect(counted(cold, 4e9)).toBeCloseTo(2 * (1.6 * 0.9599 + 0.2), 4)
  })

  it('hold to the ends of their range and no further', () => {
    for (const hz of [1e9, 15e9]) expect(ask(perLength, terms, { hz }).drafts).toEqual([])
    expect(ask(perLength, terms, { hz: 0.999e9 })).toMatchObject({
      found: null,
      drafts: [{ code: 'outside-validity', field: 'validFrom' }],
    })
    expect(ask(perLength, terms, { hz: 15.01e9 })).toMatchObject({
      found: null,
      drafts: [{ code: 'outside-validity', field: 'validTo' }],
    })
  })

  it('give way to a number at a frequency where there are none', () => {
    const number = { ...terms, rootTerm: null, linearTerm: null, lossPerLength: '1 dB/m', at: '10 GHz' }
    expect(ask(perLength, number).found).toEqual({ db: 2, by: 'stated', spreadDb: 0 })
  })
})

describe('points over their band', () => {
  const points = '5 GHz 0.4 dB; 15 GHz 0.6 dB; 25 GHz 1.0 dB'

  it('of a table are straight lines between the points and end with them (by hand)', () => {
    const piece = pieceOf(ask(table, { kind: 'connector', model: 'table', points }))
    const db = piece.attenuation?.(Float64Array.of(5e9, 10e9, 15e9, 20e9, 25e9))
    expect(Array.from(db ?? [])).toEqual([0.4, 0.5, 0.6, 0.8, 1].map((x) => expect.closeTo(x, 12)))
    expect(piece).toMatchObject({ from: 5e9, to: 25e9, reflects: false })
    expect(inserted(piece, 20e9)).toBeCloseTo(0.8, 12)
  })

  it('of a table with length, impedance and delay reflect where the line is uniform, and only there', () => {
    const line = { model: 'table', points, length: '10 mm', impedance: '85 Ω', delay: '6 ps/mm' } as const
    expect(pieceOf(ask(table, { kind: 'trace', ...line })).reflects).toBe(true)
    expect(pieceOf(ask(table, { kind: 'connector', ...line })).reflects).toBe(false)
    expect(pieceOf(ask(table, { kind: 'trace', ...line, length: null })).reflects).toBe(false)
  })

  it('of a class are length times points times the coupon’s factor, and vary with the length (by hand)', () => {
    const answer = ask(
      lossClass,
      { kind: 'trace', model: 'class', lossClass: 'c', length: '5 in' },
      { lossClass: { points: '8 GHz 0.6 dB/in; 16 GHz 1.0 dB/in', scale: '1.1' } },
    )
    const piece = pieceOf(answer)
    expect(counted(piece, 12e9)).toBeCloseTo(5 * 0.8 * 1.1, 12)
    expect(computed(answer).values).toEqual({ length: expect.closeTo(0.127, 12) })
    expect(counted(pieceOf(answer, { length: 0.254 }), 12e9)).toBeCloseTo(10 * 0.8 * 1.1, 12)
  })

  it('of a class reflect with the line’s impedance and delay', () => {
    const line = {
      kind: 'trace',
      model: 'class',
      lossClass: 'c',
      length: '1 in',
      impedance: '85 Ω',
      delay: '170 ps/in',
    } as const
    const piece = pieceOf(ask(lossClass, line, { lossClass: { points: '8 GHz 0.6 dB/in; 16 GHz 1.0 dB/in' } }))
    expect(piece.reflects).toBe(true)
    expect(counted(piece, 8e9)).toBeCloseTo(0.6, 12)
    expect(inserted(piece, 8e9, 85)).toBeCloseTo(0.6, 9)
  })
})
