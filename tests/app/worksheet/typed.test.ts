import { describe, expect, it } from 'vitest'
import { judgeTyped } from '../../../app/budgets/[id]/client/typed/judge'
import { modelParameters, modelSlips } from '../../../app/budgets/[id]/client/typed/modelSlips'
import { readTolerance, showTolerance } from '../../../app/budgets/[id]/client/typed/tolerance'
import { type Line, MODELS } from '../../../lib/budget/schema'
import { emptyRecord, fieldsOf } from '../../../lib/sheet/layout'

describe('a value as typed', () => {
  it('a bare number gets the unit of its field', () => {
    expect(judgeTyped('lines', 'length', '3.2')).toEqual({ value: '3.2 in' })
    expect(judgeTyped('lines', 'loss', ' 0.6 ')).toEqual({ value: '0.6 dB' })
    expect(judgeTyped('head', 'bitRate', '106.25')).toEqual({ value: '106.25 Gb/s' })
  })
  it('is kept as typed, decimal comma and all', () => {
    expect(judgeTyped('lines', 'length', '3,2 in')).toEqual({ value: '3,2 in' })
    expect(judgeTyped('lines', 'length', '120mil')).toEqual({ value: '120mil' })
  })
  it("asks back '1,234 dB', refuses '-1.2 dB' and a wrong unit", () => {
    expect(judgeTyped('lines', 'loss', '1,234 dB')).toEqual({ reason: expect.stringContaining('Does 1,234 mean') })
    expect(judgeTyped('lines', 'loss', '-1.2 dB')).toEqual({ reason: expect.stringContaining('leave the minus') })
    expect(judgeTyped('lines', 'loss', '3 in')).toEqual({ reason: expect.stringContaining("'in' is not a unit") })
  })
  it('empty is no value, never zero', () => {
    expect(judgeTyped('lines', 'loss', '  ')).toEqual({ value: null })
    expect(judgeTyped('head', 'laneCount', '')).toEqual({ value: null })
  })
  it('whole numbers, choices and flags', () => {
    expect(judgeTyped('head', 'laneCount', '16')).toEqual({ value: 16 })
    expect(judgeTyped('head', 'laneCount', '1.5')).toEqual({ reason: 'Type a whole number between 1 and 256.' })
    expect(judgeTyped('head', 'laneCount', '300')).toEqual({ reason: 'Type a whole number between 1 and 256.' })
    expect(judgeTyped('lines', 'basis', 'measured')).toEqual({ value: 'measured' })
    expect(judgeTyped('lines', 'processIncluded', 'yes')).toEqual({ value: true })
  })
  it('a set may be empty, which is not the same as not said', () => {
    expect(judgeTyped('lines', 'covers', '')).toEqual({ value: '' })
  })
})

describe('a tolerance in one cell', () => {
  it.each([
    ['± 0.15 dB', '0.15 dB', '0.15 dB'],
    ['+-0.15', '0.15 dB', '0.15 dB'],
    ['+/- 0.15 dB', '0.15 dB', '0.15 dB'],
    ['0.15', '0.15 dB', '0.15 dB'],
    ['6 %', '6 %', '6 %'],
    ['±6%', '6 %', '6 %'],
    ['-0.1 +0.2 dB', '0.1 dB', '0.2 dB'],
    ['−0.1 dB, +5 %', '0.1 dB', '5 %'],
    ['+0,2/-0,1 dB', '0,1 dB', '0,2 dB'],
    ['+0.2 dB', '0 dB', '0.2 dB'],
  ])('%s', (typed, minus, plus) => {
    expect(readTolerance(typed)).toEqual({ minus, plus })
  })
  it('empty clears both sides', () => expect(readTolerance(' ')).toEqual({ minus: null, plus: null }))
  it.each(['about 1', '+0.1 +0.2 dB', '± 3 in', '1,234 dB', '-0.1 +0.2 dB more'])('asks back: %s', (typed) => {
    expect(readTolerance(typed)).toEqual({ reason: expect.any(String) })
  })
  it('is shown as it was typed', () => {
    expect(showTolerance({ minus: '0.15 dB', plus: '0.15 dB' })).toBe('± 0.15 dB')
    expect(showTolerance({ minus: '0.1 dB', plus: '0.2 dB' })).toBe('−0.1 +0.2 dB')
    expect(showTolerance({ minus: '0.1 dB', plus: '5 %' })).toBe('−0.1 dB +5 %')
    expect(showTolerance({ minus: null, plus: null })).toBe('')
  })
  it('what is shown is read back to the same', () => {
    for (const tolerance of [
      { minus: '0.15 dB', plus: '0.15 dB' },
      { minus: '0.1 dB', plus: '0.2 dB' },
      { minus: '0.1 dB', plus: '5 %' },
      { minus: '6 %', plus: '6 %' },
    ]) {
      expect(readTolerance(showTolerance(tolerance))).toEqual(tolerance)
    }
  })
})

describe('the slips of a model', () => {
  const line = (values: Partial<Line>) => ({ ...emptyRecord('lines'), order: 'a0', ...values }) as Line
  it('every model has slips, and they are among its parameters', () => {
    for (const model of MODELS) {
      const slips = modelSlips(line({ model }))
      expect(slips.length, model).toBeGreaterThan(0)
      for (const { field } of slips) expect(modelParameters(model), `${model} ${field}`).toContain(field)
    }
  })
  it('only fields of the schema', () => {
    for (const model of MODELS) expect(fieldsOf('lines')).toEqual(expect.arrayContaining([...modelParameters(model)]))
  })
  it('an overlap names its two lines, a reserve its purpose', () => {
    expect(modelSlips(line({ kind: 'overlap' })).map(({ field }) => field)).toContain('overlapB')
    expect(modelSlips(line({ kind: 'reserve' })).map(({ field }) => field)).toContain('purpose')
  })
})
