import { describe, expect, it } from 'vitest'
import { cable } from '../../../lib/budget/models/cable'
import { ask, codes, computed, counted, inserted, pieceOf } from './ask'

const terms = {
  kind: 'cable',
  model: 'cable',
  length: '3 m',
  rootTerm: '0.7 dB/m',
  linearTerm: '0.06 dB/m',
  squareTerm: '0.001 dB/m',
  validFrom: '0.05 GHz',
  validTo: '20 GHz',
} as const
const ends = { endLossA: '0.35 dB', endLossB: '0.4 dB', at: '10 GHz' } as const
/** 3 m × (0.7 √10 + 0.06·10 + 0.001·100). */
const BULK = 3 * (0.7 * Math.sqrt(10) + 0.6 + 0.1)

describe('a cable by its terms', () => {
  it('is length times the terms over their band, matched where nothing else is known (by hand)', () => {
    const piece = pieceOf(ask(cable, terms))
    expect(counted(piece, 10e9)).toBeCloseTo(BULK, 12)
    expect(counted(piece, 1e9)).toBeCloseTo(3 * 0.761, 12)
    expect(inserted(piece, 10e9)).toBeCloseTo(BULK, 9)
    expect(piece).toMatchObject({ from: 0.05e9, to: 20e9, reflects: false })
  })

  it('counts without a square term, but not with a root or a linear one alone', () => {
    expect(counted(pieceOf(ask(cable, { ...terms, squareTerm: null })), 10e9)).toBeCloseTo(BULK - 0.3, 12)
    expect(codes(ask(cable, { ...terms, linearTerm: null }))).toEqual(['field-missing'])
    expect(codes(ask(cable, { ...terms, rootTerm: null, linearTerm: null }))).toEqual([
      'field-missing',
      'field-missing',
    ])
  })

  it('reflects with impedance and delay: matched it keeps its loss, else it counts the same and loses more', () => {
    const at100 = pieceOf(ask(cable, { ...terms, impedance: '100 Ω', delay: '4.6 ns/m' }))
    expect(at100.reflects).toBe(true)
    expect(inserted(at100, 10e9)).toBeCloseTo(BULK, 9)
    const s = at100.twoPort(Float64Array.of(1e9), 100)
    expect(Math.atan2(s[5] as number, s[4] as number)).toBeCloseTo(-2 * Math.PI * ((3 * 4.6) % 1) + 2 * Math.PI, 6)
    const low = pieceOf(ask(cable, { ...terms, impedance: '85 Ω', delay: '4.6 ns/m' }))
    expect(counted(low, 10e9)).toBeCloseTo(BULK, 12)
    expect(inserted(low, 10e9)).toBeGreaterThan(BULK)
  })

  it('holds to the ends of its range and no further', () => {
    for (const hz of [0.05e9, 20e9]) expect(ask(cable, terms, { hz }).drafts).toEqual([])
    expect(ask(cable, terms, { hz: 0.0499e9 })).toMatchObject({
      found: null,
      drafts: [{ code: 'outside-validity', field: 'validFrom' }],
    })
    expect(ask(cable, terms, { hz: 20.01e9 })).toMatchObject({
      found: null,
      drafts: [{ code: 'outside-validity', field: 'validTo' }],
    })
  })

  it('follows its surroundings: √f with the root of copper’s resistivity, f with the loss tangent, f² not (by hand)', () => {
    const warm = ask(cable, terms, { surroundings: { temperature: 80, dfFactor: 1.2 } })
    // ρ(80 °C)/ρ(20 °C) = 1 + 0.00393·60 = 1.2358.
    expect(counted(pieceOf(warm), 10e9)).toBeCloseTo(3 * (0.7 * Math.sqrt(10 * 1.2358) + 0.72 + 0.1), 12)
  })
})

describe('the ends of a cable', () => {
  it('are counted, and the piece holds within ±2 % of their frequency, matched', () => {
    const answer = ask(cable, { ...terms, ...ends, impedance: '100 Ω', delay: '4.6 ns/m' })
    const piece = pieceOf(answer)
    expect(counted(piece, 10e9)).toBeCloseTo(BULK + 0.75, 12)
    expect(piece).toMatchObject({ from: expect.closeTo(9.8e9, 0), to: expect.closeTo(10.2e9, 0), reflects: false })
    expect(computed(answer).values).toMatchObject({ endLossA: 0.35, endLossB: 0.4, length: 3 })
    expect(counted(pieceOf(answer, { endLossA: 0.5 }), 10e9)).toBeCloseTo(BULK + 0.9, 12)
  })

  it('never move: 2 % off is counted, more is refused', () => {
    expect(codes(ask(cable, { ...terms, ...ends, at: '9.81 GHz' }))).toEqual([])
    for (const at of ['9.75 GHz', '10.3 GHz']) {
      const refused = ask(cable, { ...terms, ...ends, at })
      expect(refused).toMatchObject({ found: null, drafts: [{ code: 'frequency-too-far', field: 'at' }] })
    }
  })

  it('are two or none, with their frequency', () => {
    expect(codes(ask(cable, { ...terms, endLossA: '0.35 dB', at: '10 GHz' }))).toEqual(['field-missing'])
    expect(codes(ask(cable, { ...terms, endLossA: '0.35 dB', endLossB: '0.35 dB' }))).toEqual(['field-missing'])
  })
})

describe('a cable by a number per length', () => {
  const number = { kind: 'cable', model: 'cable', length: '3 m', lossPerLength: '2.35 dB/m', at: '10 GHz' } as const

  it('is 3.00 m × 2.35 dB/m = 7.05 dB, with its ends 7.80 dB', () => {
    expect(ask(cable, number).found).toEqual({ db: expect.closeTo(7.05, 12), by: 'stated', spreadDb: 0 })
    expect(ask(cable, { ...number, ...ends }).found).toMatchObject({ db: expect.closeTo(7.8, 12), by: 'stated' })
  })

  it('moves its bulk like any uniform line, but not with ends', () => {
    const moved = ask(cable, number, { hz: 12e9 })
    expect(moved.found).toMatchObject({ by: 'moved', db: expect.closeTo((7.05 * (1.2 + Math.sqrt(1.2))) / 2, 12) })
    expect(codes(moved)).toEqual(['moved-with-spread'])
    expect(codes(ask(cable, { ...number, ...ends }, { hz: 12e9 }))).toEqual(['frequency-too-far'])
  })

  it('needs length, number and frequency', () => {
    expect(codes(ask(cable, { kind: 'cable', model: 'cable' }))).toEqual([
      'field-missing',
      'field-missing',
      'field-missing',
    ])
  })
})
