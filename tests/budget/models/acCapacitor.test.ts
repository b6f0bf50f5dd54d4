import { describe, expect, it } from 'vitest'
import { AC_CAPACITOR_BOUNDS, acCapacitor } from '../../../lib/budget/models/acCapacitor'
import { ask, codes, computed, counted, edgesOf, pieceOf } from './ask'

const fields = {
  kind: 'component',
  model: 'ac-capacitor',
  capacitance: '220 nF',
  resistance: '0.05 Ω',
  inductance: '150 pH',
  padCapacitance: '40 fF',
} as const

describe('an AC capacitor', () => {
  it('blocks what is slow: 3.01 dB at 1/(2πC(R + R_s)) = 7.23 kHz, everything at 0 Hz (by hand)', () => {
    const piece = pieceOf(ask(acCapacitor, { ...fields, resistance: '0 Ω' }))
    expect(counted(piece, 1 / (2 * Math.PI * 220e-9 * 100))).toBeCloseTo(10 * Math.log10(2), 6)
    expect(counted(piece, 0)).toBe(Number.POSITIVE_INFINITY)
    expect(piece.from).toBe(0)
  })

  it('with nothing beside a large capacitance is the through', () => {
    const ideal = { ...fields, capacitance: '100 µF', resistance: '0 Ω', inductance: '0 pH', padCapacitance: '0 fF' }
    expect(counted(pieceOf(ask(acCapacitor, ideal)), 10e9)).toBeCloseTo(0, 12)
  })

  it('at its series resonance is its resistance and both pads side by side (by hand)', () => {
    const resonance = 1 / (2 * Math.PI * Math.sqrt(220e-9 * 150e-12))
    const piece = pieceOf(ask(acCapacitor, { ...fields, padCapacitance: '0 fF', resistance: '1 Ω' }))
    expect(counted(piece, resonance)).toBeCloseTo(20 * Math.log10(1.01), 9)
  })

  it('reflects, and holds up to the corner of its pads or its inductance', () => {
    const piece = pieceOf(ask(acCapacitor, fields))
    expect(piece.reflects).toBe(true)
    expect(piece.to).toBeCloseTo(100 / (2 * Math.PI * 150e-12), 0)
    expect(pieceOf(ask(acCapacitor, { ...fields, padCapacitance: '80 fF' })).to).toBeCloseTo(
      2 / (Math.PI * 80e-15 * 100),
      0,
    )
  })

  it('needs all four, for an empty one could be forgotten', () => {
    expect(codes(ask(acCapacitor, { kind: 'component', model: 'ac-capacitor' }))).toEqual(
      Array(4).fill('field-missing'),
    )
  })

  const edges = edgesOf(AC_CAPACITOR_BOUNDS, { ...computed(ask(acCapacitor, fields)).values, hz: 10e9, reference: 100 })
  const units = {
    capacitance: [1e9, 'nF'],
    resistance: [1, 'Ω'],
    inductance: [1e12, 'pH'],
    padCapacitance: [1e15, 'fF'],
  } as const

  it('has five ends of its range', () => {
    expect(edges.length).toBe(5)
  })

  it.each(edges)('$bound.what, $end: counts just inside, is flagged just outside', ({ bound, inside, outside }) => {
    const [factor, unit] = units[bound.field as keyof typeof units]
    const typed = (x: number) => ask(acCapacitor, { ...fields, [bound.field]: `${x * factor} ${unit}` })
    expect(typed(inside).drafts).toEqual([])
    expect(typed(outside)).toMatchObject({ found: null, drafts: [{ code: 'outside-validity', field: bound.field }] })
  })
})
