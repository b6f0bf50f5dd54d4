import { describe, expect, it } from 'vitest'
import { evaluate } from '../../lib/budget/evaluate'
import type { BudgetFile } from '../../lib/budget/schema'
import { link } from './links'

type LineFile = NonNullable<BudgetFile['lines']>[string]
type ClassFile = NonNullable<BudgetFile['lossClasses']>[string]

/** One line of a link whose Nyquist frequency is 10 GHz, and what is said about it. */
function one(fields: Partial<LineFile>, lossClass?: Partial<ClassFile>, head?: Partial<BudgetFile['head']>) {
  const base = link({}).head
  const budget = link({
    head: { ...base, ...head },
    lines: { l: { order: 'a1', name: 'Piece', kind: 'trace', ...fields } },
    lossClasses: lossClass ? { c: { order: 'a0', name: 'L3', ...lossClass } } : {},
  })
  const evaluation = evaluate(budget, new Map())
  const { loss, lengthM } = evaluation.lines.l ?? {}
  return {
    db: loss?.nominalDb ?? null,
    low: loss?.lowDb,
    high: loss?.highDb,
    by: loss?.by,
    lengthM,
    flags: evaluation.flags,
  }
}
const codes = ({ flags }: ReturnType<typeof one>) => flags.map(({ code }) => code)

describe('a stated number', () => {
  const via = { kind: 'via', model: 'stated', loss: '0.6 dB' } as const

  it('counts within ±2 % of its frequency', () => {
    expect(one({ ...via, at: '10 GHz' })).toMatchObject({ db: 0.6, by: 'stated' })
    expect(one({ ...via, at: '9.85 GHz' }).db).toBe(0.6)
  })

  it('of a discrete never moves, and the usual wrong frequency is named', () => {
    const found = one({ ...via, at: '20 GHz' })
    expect(found.db).toBeNull()
    expect(codes(found)).toEqual(['frequency-too-far', 'usual-wrong-frequency'])
    expect(found.flags[0]).toMatchObject({
      section: 'lines',
      id: 'l',
      field: 'at',
      severity: 'problem',
      message:
        "'Piece': the number holds at 20 GHz and is asked for at 10 GHz; a discrete is never moved to another frequency. 20 GHz is the bit rate, which is the symbol rate; the Nyquist frequency is half of it.",
      todo: 'Give the loss at 10 GHz, or a table of points that reaches it.',
    })
  })

  it('of a trace moves by the mean of the √f and the f law: silently to 0.9, then with the spread (by hand)', () => {
    const little = one({ model: 'stated', loss: '4 dB', at: '9.2 GHz' })
    expect(little).toMatchObject({ by: 'moved', flags: [] })
    expect(little.db).toBeCloseTo((4 / 0.92 + 4 / Math.sqrt(0.92)) / 2, 12)
    expect(little.high).toBe(little.db)
    const far = one({ model: 'stated', loss: '4 dB', at: '7.5 GHz', tolerancePlus: '0.1 dB' })
    expect(far.db).toBeCloseTo((16 / 3 + 8 / Math.sqrt(3)) / 2, 12)
    expect(far.high).toBeCloseTo(16 / 3 + 0.1, 12)
    expect(far.low).toBeCloseTo(8 / Math.sqrt(3) - 0.1, 12)
    expect(codes(far)).toEqual(['moved-with-spread'])
    expect(codes(one({ model: 'stated', loss: '4 dB', at: '6.6 GHz' }))).toContain('frequency-too-far')
  })

  it('of a cable moves, of a wire termination it does not', () => {
    const cable = { kind: 'cable', model: 'stated', loss: '4 dB', at: '9.5 GHz' } as const
    expect(one({ ...cable, covers: 'bulk' }).by).toBe('moved')
    expect(one({ ...cable, covers: 'terminations' }).db).toBeNull()
    expect(one({ ...cable, covers: 'terminations', length: '0.2 m' }).by).toBe('moved')
    expect(one({ ...cable, covers: null }).by).toBe('moved')
  })

  it('needs a loss and a frequency, and says which field lacks', () => {
    const found = one({ model: 'stated' })
    expect(found.flags.map(({ code, field, message }) => [code, field, message])).toEqual([
      ['field-missing', 'loss', "'Piece': the stated loss is not given."],
      ['field-missing', 'at', "'Piece': the frequency of the stated loss is not given."],
    ])
    expect(found.flags[1]?.todo).toBe('Type it with its unit: Hz, kHz, MHz, GHz.')
  })

  it('a reserve is held back at every frequency unless it says one', () => {
    expect(one({ kind: 'reserve', model: 'stated', loss: '1 dB' }).db).toBe(1)
    expect(one({ kind: 'reserve', model: 'stated', loss: '1 dB', at: '5 GHz' }).db).toBeNull()
  })
})

describe('a loss class', () => {
  const trace = { model: 'class', lossClass: 'c', length: '5 in' } as const

  it('is length times attenuation, 5.00 in × 0.95 dB/in = 4.75 dB, times the coupon’s factor', () => {
    expect(one(trace, { lossPerLength: '0.95 dB/in', at: '10 GHz' }).db).toBeCloseTo(4.75, 12)
    expect(one(trace, { lossPerLength: '0.95 dB/in', at: '10 GHz', scale: '1.1' }).db).toBeCloseTo(5.225, 12)
    expect(one(trace, { lossPerLength: '0.95 dB/in', at: '10 GHz' }).lengthM).toBeCloseTo(0.127, 12)
  })

  it('moves like a stated number, and the flag names line and class', () => {
    const found = one(trace, { lossPerLength: '0.95 dB/in', at: '7.5 GHz' })
    expect(found.db).toBeCloseTo((4.75 * (4 / 3 + 2 / Math.sqrt(3))) / 2, 12)
    expect(found.flags[0]).toMatchObject({ code: 'moved-with-spread', section: 'lines', id: 'l', field: 'lossClass' })
    expect(found.flags[0]?.message).toMatch(/^'Piece', by its loss class 'L3': moved from 7.5 GHz to 10 GHz/)
  })

  it('interpolates its points, its own number among them, and never goes beyond', () => {
    const points = { lossPerLength: '0.6 dB/in', at: '8 GHz', points: '16 GHz 1.0 dB/in' }
    expect(one(trace, points)).toMatchObject({ by: 'table', db: expect.closeTo(5 * 0.7, 12) })
    expect(codes(one(trace, { points: '4 GHz 0.4 dB/in; 8 GHz 0.6 dB/in' }))).toEqual(['outside-table'])
    expect(codes(one(trace, { points: '4 GHz 0.4 dB' }))).toEqual(['unreadable-value'])
    expect(codes(one(trace, { points: '16 GHz 1 dB/in', lossPerLength: '0.6 dB/in' }))).toEqual(['field-missing'])
  })

  it('hands down basis, grade, conditions and tolerance where the line says nothing', () => {
    const lossClass = {
      lossPerLength: '1 dB/in',
      at: '10 GHz',
      basis: 'measured',
      grade: 'typical',
      conditionTemperature: '85 °C',
      toleranceMinus: '4 %',
      tolerancePlus: '6 %',
    } as const
    const found = one(trace, lossClass)
    expect([found.low, found.db, found.high]).toEqual([4.8, 5, 5.3].map((db) => expect.closeTo(db, 12)))
    expect(codes(found)).toEqual(['typical-not-maximum', 'other-conditions'])
    const own = one({ ...trace, grade: 'nominal', conditionTemperature: '25 °C', tolerancePlus: '0.2 dB' }, lossClass)
    expect([own.low, own.high]).toEqual([expect.closeTo(4.8, 12), expect.closeTo(5.2, 12)])
    expect(codes(own)).toEqual([])
  })

  it('is missed where none is chosen, and where it was taken out', () => {
    expect(codes(one({ model: 'class', length: '5 in' }))).toEqual(['class-missing'])
    const gone = one(trace, { lossPerLength: '1 dB/in', at: '10 GHz', removed: true })
    expect(gone.flags[0]?.message).toBe("'Piece': its loss class does not exist or was taken out.")
  })
})

describe('an attenuation per length', () => {
  it('at a frequency counts like a class: 3.00 m × 2.35 dB/m = 7.05 dB', () => {
    const cable = { kind: 'cable', covers: 'bulk terminations', model: 'per-length', length: '3.00 m' } as const
    expect(one({ ...cable, lossPerLength: '2.35 dB/m', at: '10 GHz' }).db).toBeCloseTo(7.05, 12)
  })

  const terms = {
    model: 'per-length',
    length: '2 m',
    rootTerm: '0.8 dB/m',
    linearTerm: '0.05 dB/m',
    validFrom: '1 GHz',
    validTo: '15 GHz',
  } as const

  it('of √f and f terms is computed inside its range: 2 m × (0.8 √10 + 0.05 × 10) (by hand)', () => {
    expect(one(terms)).toMatchObject({ by: 'computed', db: expect.closeTo(2 * (0.8 * Math.sqrt(10) + 0.5), 12) })
  })

  it('is refused outside its range, and without both terms and both ends', () => {
    expect(codes(one({ ...terms, validTo: '9 GHz' }))).toEqual(['outside-validity'])
    expect(codes(one({ ...terms, validFrom: '11 GHz' }))).toEqual(['outside-validity'])
    expect(codes(one({ ...terms, linearTerm: null, validTo: null }))).toEqual(['field-missing', 'field-missing'])
  })
})

describe('a table', () => {
  it('is interpolated and never continued', () => {
    const points = '5 GHz 0.4 dB; 15 GHz 0.6 dB'
    expect(one({ kind: 'connector', covers: '', model: 'table', points })).toMatchObject({ db: 0.5, by: 'table' })
    expect(codes(one({ model: 'table', points: '1 GHz 0.2 dB; 5 GHz 0.4 dB' }))).toEqual(['outside-table'])
    expect(one({ model: 'table', points: '1 GHz 0.2' }).flags[0]).toMatchObject({
      code: 'unreadable-value',
      todo: "Point 1 ('1 GHz 0.2'): Add a unit: dB.",
    })
    expect(codes(one({ model: 'table' }))).toEqual(['field-missing'])
  })

  it('warns where its points lie far apart', () => {
    expect(codes(one({ model: 'table', points: '1 GHz 0.3 dB; 25 GHz 7.5 dB' }))).toEqual([])
    expect(codes(one({ model: 'table', points: '1 GHz 0.3 dB; 25 GHz 1.5 dB' }))).toEqual(['coarse-table'])
  })
})

describe('a pad', () => {
  const pad = { kind: 'component', model: 'pad', capacitance: '100 fF' } as const

  it('100 fF in 100 Ω at 12.890625 GHz is 0.17451 dB (physics.md W10)', () => {
    expect(one(pad, undefined, { bitRate: '25.78125 Gb/s' }).db).toBeCloseTo(0.17451, 5)
  })

  it('depends on the differential reference, and has no number without it', () => {
    expect(one(pad, undefined, { reference: '85 Ω' }).db).toBeLessThan(one(pad).db ?? 0)
    expect(codes(one(pad, undefined, { reference: null }))).toEqual(['field-missing'])
  })
})

describe('a line without a model', () => {
  it('has no number', () => {
    expect(codes(one({}))).toEqual(['model-missing'])
  })
})

describe('skew inside the pair', () => {
  it('is part of the line: 2 ps at 10 GHz add 0.0172 dB (by hand)', () => {
    const found = one({ model: 'stated', loss: '4 dB', at: '10 GHz', skew: '2 ps' })
    expect(found.db).toBeCloseTo(4 - 20 * Math.log10(Math.cos(Math.PI * 0.02)), 12)
    expect(found.db).toBeCloseTo(4.01716, 5)
  })

  it('of half a period leaves no number', () => {
    expect(codes(one({ model: 'stated', loss: '4 dB', at: '10 GHz', skew: '50 ps' }))).toEqual(['skew-too-large'])
  })
})
