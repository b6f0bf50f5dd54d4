import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import * as Y from 'yjs'
import { LIMITS } from '../../lib/budget/schema'
import type { Operation } from '../../lib/sheet/change'
import { applyEdit, editSize } from '../../lib/sheet/edits'
import { emptyRecord, fieldsOf } from '../../lib/sheet/layout'
import { readBudget, seedUpdate } from '../../lib/sheet/seed'
import { canonical, canonicalDoc, docOf, operations, sampleBudget, sampleDoc } from './sample'

const setLoss = (value: string): Operation => ({ op: 'set', section: 'lines', id: 'via', field: 'loss', value })
const add = (id: string, values = {}): Operation => ({
  op: 'add',
  section: 'lines',
  id,
  values: { order: 'a3', ...values },
})

describe('seed and read', () => {
  test('[W1.61] a seeded document reads back as the budget it was made of', () => {
    expect(canonicalDoc(sampleDoc())).toBe(canonical(sampleBudget()))
  })

  test('[W1.62] every record has every field of its section, null where empty', () => {
    const budget = readBudget(sampleDoc())
    expect(Object.keys(budget.lines.trace ?? {}).sort()).toEqual([...fieldsOf('lines')].sort())
    expect(budget.lines.trace?.capacitance).toBeNull()
  })

  test('a given client id is the only one in the seed', () => {
    expect([...Y.parseUpdateMeta(seedUpdate(sampleBudget(), 7)).from.keys()]).toEqual([7])
  })
})

describe('an edit', () => {
  test('[W1.63] is one update that brings another document to the same content', () => {
    const doc = sampleDoc()
    const other = docOf(Y.encodeStateAsUpdate(doc))
    const edit = applyEdit(doc, [
      setLoss('0.4 dB'),
      add('cable', { name: 'Cable', kind: 'cable', note: 'Sample B' }),
      { op: 'set', section: 'lines', id: 'cable', field: 'loss', value: '5 dB' },
      { op: 'note', section: 'lines', id: 'cable', field: 'note', text: 'Sample C' },
      { op: 'lane', line: 'cable', lane: 3, field: 'skew', value: '2 ps' },
    ])
    if (!edit.ok || edit.update === null) throw new Error('refused')
    Y.applyUpdate(other, edit.update)
    expect(canonicalDoc(other)).toBe(canonicalDoc(doc))
    const { lines, laneValues } = readBudget(other)
    expect(lines.via?.loss).toBe('0.4 dB')
    expect(lines.cable).toEqual({
      ...emptyRecord('lines'),
      order: 'a3',
      name: 'Cable',
      kind: 'cable',
      loss: '5 dB',
      note: 'Sample C',
    })
    expect(laneValues['cable/3/skew']).toBe('2 ps')
  })

  test('[W1.64] a set of one field costs tens of bytes', () => {
    const edit = applyEdit(sampleDoc(), [setLoss('0.4 dB')])
    expect(edit.ok && edit.update?.length).toBeLessThan(60)
  })

  test('what already stands so is left out, and an edit of nothing else makes no update', () => {
    const doc = sampleDoc()
    const before = Y.encodeStateVector(doc)
    const same = applyEdit(doc, [
      { op: 'set', section: 'lines', id: 'trace', field: 'length', value: '6 in' },
      { op: 'note', section: 'lines', id: 'via', field: 'note', text: 'Back-drilled' },
      { op: 'lane', line: 'trace', lane: 2, field: 'length', value: '6.4 in' },
      { op: 'lane', line: 'trace', lane: 3, field: 'length', value: null },
    ])
    expect(same).toEqual({ ok: true, update: null, operations: [], bases: [], writes: [] })
    expect(Y.encodeStateVector(doc)).toEqual(before)
  })

  test('[W1.76] of several writes of one field the last one counts; a lane value that ends empty is not made', () => {
    const doc = sampleDoc()
    const edit = applyEdit(doc, [
      setLoss('1 dB'),
      { op: 'lane', line: 'trace', lane: 1, field: 'skew', value: '1 ps' },
      setLoss('2 dB'),
      { op: 'lane', line: 'trace', lane: 1, field: 'skew', value: null },
    ])
    expect(edit).toMatchObject({ ok: true, operations: [setLoss('2 dB')], bases: [null] })
    expect(Object.keys(readBudget(doc).laneValues)).toEqual(['trace/2/length'])
  })

  test('says which values it was made on', () => {
    const edit = applyEdit(sampleDoc(), [
      { op: 'set', section: 'lines', id: 'trace', field: 'length', value: '7 in' },
      add('x'),
      { op: 'note', section: 'lines', id: 'via', field: 'note', text: 'Drilled' },
    ])
    expect(edit.ok && edit.bases).toEqual(['6 in', null, 'Back-drilled'])
  })

  test('cannot be made inside a transaction or an observer', () => {
    const doc = sampleDoc()
    expect(() => doc.transact(() => applyEdit(doc, [setLoss('1 dB')]))).toThrow('inside a transaction')
    let thrown: unknown
    doc.on('update', () => {
      try {
        applyEdit(doc, [setLoss('2 dB')])
      } catch (error) {
        thrown = error
      }
    })
    applyEdit(doc, [setLoss('3 dB')])
    expect(String(thrown)).toContain('observer')
  })

  test('[W1.65] its size is bounded before it is made (seeds of fast-check)', () => {
    fc.assert(
      fc.property(fc.array(operations, { minLength: 1, maxLength: 8 }), (edit) => {
        const applied = applyEdit(sampleDoc(), edit)
        if (applied.ok && applied.update) expect(applied.update.length).toBeLessThanOrEqual(editSize(edit))
      }),
      { numRuns: 100 },
    )
  })
})

describe('refusals: which operation, why, and the document untouched', () => {
  const cases: [string, Operation, RegExp][] = [
    ['a loss typed negative', setLoss('-3 dB'), /positive/],
    [
      'a field of another section',
      { op: 'set', section: 'lines', id: 'via', field: 'limit', value: '3 dB' },
      /not a field/,
    ],
    [
      '__proto__ as a field',
      { op: 'set', section: 'lines', id: 'via', field: '__proto__', value: '3 dB' },
      /not a field/,
    ],
    [
      'a record that is not there',
      { op: 'set', section: 'lines', id: 'gone', field: 'loss', value: '3 dB' },
      /no record/,
    ],
    [
      'the version of the schema',
      { op: 'set', section: 'head', id: null, field: 'schemaVersion', value: 1 },
      /not set by hand/,
    ],
    ['no order', { op: 'set', section: 'lines', id: 'via', field: 'order', value: null }, /./],
    ['removed as text', { op: 'set', section: 'lines', id: 'via', field: 'removed', value: 'yes' }, /./],
    ['a note by set', { op: 'set', section: 'lines', id: 'via', field: 'note', value: 'x' }, /'note'/],
    ['half a character', { op: 'note', section: 'lines', id: 'via', field: 'note', text: '\ud83d' }, /half/],
    ['minus zero', { op: 'set', section: 'head', id: null, field: 'laneCount', value: -0 }, /minus/],
    ['an id taken', add('via'), /already/],
    ['an id not matching', add('Via 2'), /small letters/],
    ['added removed', add('x', { removed: true }), /removed/],
    ['added without order', { op: 'add', section: 'lines', id: 'x', values: {} }, /order/],
    ['lane 0', { op: 'lane', line: 'trace', lane: 0, field: 'length', value: '1 in' }, /lane/],
    ['a field that lanes share', { op: 'lane', line: 'trace', lane: 1, field: 'name', value: 'x' }, /lane to lane/],
    ['a lane value of the wrong unit', { op: 'lane', line: 'trace', lane: 1, field: 'length', value: '1 dB' }, /unit/],
  ]
  test.each(cases)('%s', (_name, operation, reason) => {
    const doc = sampleDoc()
    const before = Y.encodeStateAsUpdate(doc)
    const result = applyEdit(doc, [setLoss('1 dB'), operation])
    if (result.ok) throw new Error('was not refused')
    expect(result.index).toBe(1)
    expect(result.reason).toMatch(reason)
    expect(Y.encodeStateAsUpdate(doc)).toEqual(before)
  })

  test('[W1.66] line 501', () => {
    const doc = sampleDoc()
    const room = LIMITS.lines - doc.getMap('lines').size
    const fill = Array.from({ length: room }, (_, index) => add(`fill-${index}`))
    expect(applyEdit(doc, [...fill, add('one-too-many')])).toMatchObject({ ok: false, index: room })
    expect(applyEdit(doc, fill).ok).toBe(true)
    expect(applyEdit(doc, [add('one-too-many')])).toMatchObject({ ok: false, index: 0 })
  })

  test('[W1.65] an edit over 4 MB; one just under it is made', () => {
    const notes = (count: number): Operation[] => {
      const text = 'x'.repeat(4000)
      return Array.from({ length: count }, () => ({ op: 'note', section: 'lines', id: 'via', field: 'note', text }))
    }
    const doc = sampleDoc()
    expect(applyEdit(doc, notes(1100))).toMatchObject({ ok: false, reason: expect.stringContaining('4 MB') })
    expect(readBudget(doc).lines.via?.note).toBe('Back-drilled')
    expect(applyEdit(doc, notes(1000)).ok).toBe(true)
  })

  test('[W1.65] every lane of a wide link pasted into 60 lines fits into one edit, within its bound', () => {
    const doc = sampleDoc()
    const lines = Array.from({ length: 60 }, (_, index) => add(`line-${index}`))
    const lanes = lines.flatMap((line): Operation[] =>
      Array.from({ length: 256 }, (_, lane) => ({
        op: 'lane',
        line: line.op === 'add' ? line.id : '',
        lane: lane + 1,
        field: 'length',
        value: `${lane}.25 mm`,
      })),
    )
    const edit = applyEdit(doc, [...lines, ...lanes])
    if (!edit.ok || !edit.update) throw new Error('refused')
    expect(edit.update.length).toBeLessThanOrEqual(editSize([...lines, ...lanes]))
    expect(edit.update.length).toBeLessThan(LIMITS.editBytes)
  })
})
