import { describe, expect, it } from 'vitest'
import { variedOf } from '../../../lib/budget/builds'
import { Findings } from '../../../lib/budget/findings'
import type { FlagDraft } from '../../../lib/budget/flags'
import type { Values } from '../../../lib/budget/models/piece'
import { line, link } from '../links'
import { formula } from './lines'

const VALUES = { width: 1e-4, dk: 3.6, stub: 2e-4, heightBelow: 1.2e-4, gap: 0, packageTau: 0.006 }

function read(varies: string | null, implied?: Values) {
  const drafts: FlagDraft[] = []
  const record = link({ lines: { a: line('a1', null, { varies }) } }).lines.a
  if (!record) throw new Error('no line')
  const fields = Findings.ofLine('a', record, drafts)
  const computed = { ...formula(VALUES, () => 1), ...(implied ? { varies: implied } : {}) }
  return { varied: variedOf(fields, computed), drafts }
}

describe('what a line says varies', () => {
  it('is read with units or in % of the value, and bounded by what its field allows', () => {
    const { varied, drafts } = read('width 10 %; dk ±0.1;stub 0,05 mm;\n Height below +/- 1 mil ; packageTau 5%;')
    expect(drafts).toEqual([])
    expect(varied).toEqual([
      { field: 'width', nominal: 1e-4, tolerance: expect.closeTo(1e-5, 15), min: 0, max: 0.05 },
      { field: 'dk', nominal: 3.6, tolerance: 0.1, min: 1, max: 20 },
      { field: 'stub', nominal: 2e-4, tolerance: expect.closeTo(5e-5, 15), min: 0, max: 0.05 },
      { field: 'heightBelow', nominal: 1.2e-4, tolerance: expect.closeTo(2.54e-5, 15), min: 0, max: 0.05 },
      {
        field: 'packageTau',
        nominal: 0.006,
        tolerance: expect.closeTo(0.0003, 12),
        min: Number.NEGATIVE_INFINITY,
        max: Number.POSITIVE_INFINITY,
      },
    ])
  })

  it('is nothing where nothing is said, or where it varies by nothing', () => {
    expect(read(null)).toEqual({ varied: [], drafts: [] })
    expect(read(' ; ')).toEqual({ varied: [], drafts: [] })
    expect(read('width 0 %; gap 0 %')).toEqual({ varied: [], drafts: [] })
  })

  it('takes from other fields of the line what the text does not name', () => {
    expect(read('dk 3 %', { stub: 1e-4 }).varied?.map(({ field, tolerance }) => [field, tolerance])).toEqual([
      ['dk', expect.closeTo(0.108, 12)],
      ['stub', 1e-4],
    ])
    expect(read('stub 0.2 mm', { stub: 1e-4 }).varied?.map(({ tolerance }) => tolerance)).toEqual([2e-4])
    expect(read('stub 0 mm', { stub: 1e-4 }).varied).toEqual([])
  })

  it.each([
    ['width', "'width' does not say what varies and by how much.", "Type it like 'width 10 %; dk 3 %; stub 0.1 mm'."],
    ['10 %', "'10 %' does not say what varies and by how much.", "Type it like 'width 10 %; dk 3 %; stub 0.1 mm'."],
    [
      'colour 3 %',
      "'colour' is nothing that this number rests on.",
      'What can vary here: dk, gap, heightBelow, packageTau, stub, width.',
    ],
    [
      'constructor 3 %',
      "'constructor' is nothing that this number rests on.",
      'What can vary here: dk, gap, heightBelow, packageTau, stub, width.',
    ],
    ['width 3 %; WIDTH 1 mil', "'width' is said to vary twice.", 'Leave one of the two.'],
    ['width 3', "by how much 'width' varies, '3', cannot be read.", 'Add a unit: m, cm, mm, µm, in, mil, ft, %.'],
    ['width -3 %', "'width' cannot vary by less than nothing.", 'Type the limit without a sign.'],
    ['width 130 %', "'width' cannot vary by more than all of it, '130 %'.", 'Type 100 % or less.'],
    ['gap 5 %', "'gap' is 0, and a share of it is nothing.", 'Type by how much it varies in its unit.'],
    ['packageTau 0.001', "by how much 'packageTau' varies, '0.001', cannot be read.", 'Add a unit: %.'],
  ])("'%s' is flagged", (text, what, todo) => {
    const { varied, drafts } = read(text)
    expect(varied).toBeNull()
    expect(drafts).toEqual([
      {
        code: 'unreadable-value',
        section: 'lines',
        id: 'a',
        field: 'varies',
        message: `'Line a1': ${what}`,
        todo,
      },
    ])
  })
})
