import { describe, expect, it } from 'vitest'
import { lineGroups } from '../../../app/budgets/[id]/client/detail/lineGroups'
import { judgeTyped } from '../../../app/budgets/[id]/client/typed/judge'
import { canVary, modelParameters } from '../../../app/budgets/[id]/client/typed/modelParameters'
import { modelSlips } from '../../../app/budgets/[id]/client/typed/modelSlips'
import { readTolerance, showTolerance } from '../../../app/budgets/[id]/client/typed/tolerance'
import { laneFieldsNotRead } from '../../../lib/budget/models'
import { LANE_FIELDS, type Line, MODELS } from '../../../lib/budget/schema'
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
  const choices: readonly Partial<Line>[] = [
    {},
    { rootTerm: '0.1 dB/in', linearTerm: '0.02 dB/in' },
    { squareTerm: '0.001 dB/m' },
    { structure: 'microstrip', roughness: 'smooth' },
    { structure: 'coupled-stripline', roughness: 'huray' },
    { roughness: 'cannonball' },
    { taken: 'per-length' },
    { taken: 'discrete' },
  ]
  const each = MODELS.flatMap((model) => choices.map((choice) => line({ model, ...choice })))
  it('every model has slips, and they are among its parameters', () => {
    for (const one of each) {
      expect(modelSlips(one).length, one.model ?? '').toBeGreaterThan(0)
      for (const { field } of modelSlips(one)) expect(modelParameters(one), `${one.model} ${field}`).toContain(field)
    }
  })
  it('only fields of the schema, each once, and once in the whole detail', () => {
    for (const one of each) {
      expect(fieldsOf('lines')).toEqual(expect.arrayContaining([...modelParameters(one)]))
      const shown = lineGroups(one).flatMap(({ fields }) => fields)
      expect(new Set(shown).size, one.model ?? '').toBe(shown.length)
    }
  })
  it('what may differ from lane to lane and the model reads can be typed', () => {
    for (const one of each) {
      const read = LANE_FIELDS.filter((field) => !laneFieldsNotRead(one).includes(field))
      expect(modelParameters(one), one.model ?? '').toEqual(expect.arrayContaining(read))
    }
  })
  it('what a choice rules out is not offered', () => {
    const geometry = (choice: Partial<Line>) => modelParameters(line({ model: 'geometry', ...choice }))
    expect(geometry({ structure: 'microstrip' })).not.toContain('gap')
    expect(geometry({ structure: 'microstrip' })).not.toContain('heightAbove')
    expect(geometry({ structure: 'coupled-stripline' })).toEqual(expect.arrayContaining(['gap', 'heightAbove']))
    expect(geometry({ roughness: 'huray' })).toEqual(expect.arrayContaining(['areaRatio', 'nodules']))
    expect(geometry({ roughness: 'cannonball' })).not.toContain('nodules')
    const network = (taken: Line['taken']) => modelParameters(line({ model: 'network', taken }))
    expect(network('per-length')).toEqual(expect.arrayContaining(['shortEvidence', 'lengthDifference']))
    expect(network('discrete')).not.toContain('shortEvidence')
  })
  it('terms and a number at a frequency exclude each other, and either can be begun', () => {
    const perLength = (rootTerm: string | null) => modelParameters(line({ model: 'per-length', rootTerm }))
    expect(perLength(null)).toEqual(expect.arrayContaining(['lossPerLength', 'at', 'rootTerm', 'linearTerm']))
    expect(perLength('0.1 dB/in')).toEqual(expect.arrayContaining(['validFrom', 'validTo']))
    expect(perLength('0.1 dB/in')).not.toContain('lossPerLength')
  })
  it('what varies is asked of a model that computes, and kept in sight where it was typed', () => {
    const varies = (values: Partial<Line>) => lineGroups(line(values)).some(({ fields }) => fields.includes('varies'))
    expect(canVary(line({ model: 'via' }))).toBe(true)
    expect(varies({ model: 'via' })).toBe(true)
    expect(varies({ model: 'stated' })).toBe(false)
    expect(varies({ model: 'stated', varies: 'width 10 %' })).toBe(true)
  })
  it('an overlap names its two lines, a reserve its purpose', () => {
    expect(modelSlips(line({ kind: 'overlap' })).map(({ field }) => field)).toContain('overlapB')
    expect(modelSlips(line({ kind: 'reserve' })).map(({ field }) => field)).toContain('purpose')
  })
})
