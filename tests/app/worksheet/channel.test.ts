import { describe, expect, it } from 'vitest'
import * as Y from 'yjs'
import { addRow, moveRow, removeRow, shownRows } from '../../../app/budgets/[id]/client/deeds/channel'
import { addRecord, inOrder, removedOnes } from '../../../app/budgets/[id]/client/deeds/records'
import { type Budget, budgetSchema } from '../../../lib/budget/schema'
import type { Operation } from '../../../lib/sheet/change'
import { applyEdit } from '../../../lib/sheet/edits'
import { createDoc, readBudget, seedUpdate } from '../../../lib/sheet/seed'

const start = budgetSchema.parse({
  head: { schemaVersion: 1 },
  planes: { tx: { order: 'a0', code: 'tx-ball' }, rx: { order: 'a4', code: 'rx-ball' } },
  lines: {
    one: { order: 'a1', name: 'One' },
    two: { order: 'a2', name: 'Two' },
    three: { order: 'a3', name: 'Three' },
  },
})

/** What the sheet makes of the operations: through the real document, so that its own rules are asked. */
function applied(budget: Budget, operations: readonly Operation[]): Budget {
  const doc = createDoc()
  Y.applyUpdate(doc, seedUpdate(budget))
  const outcome = applyEdit(doc, operations)
  if (!outcome.ok) throw new Error(outcome.reason)
  return readBudget(doc)
}
const ids = (budget: Budget) => shownRows(budget).map((row) => row.id)

describe('rows of the channel', () => {
  it('a new row goes below the one it was asked for, or to the end', () => {
    const between = addRow(start, 'one', { section: 'lines', values: { name: 'New' } })
    expect(ids(applied(start, between.operations))).toEqual(['tx', 'one', between.id, 'two', 'three', 'rx'])
    const last = addRow(start, null, { section: 'lines', values: { name: 'New' } })
    expect(ids(applied(start, last.operations))).toEqual(['tx', 'one', 'two', 'three', 'rx', last.id])
  })
  it('a row moves by one, past planes too, and stops at the ends', () => {
    expect(ids(applied(start, moveRow(start, 'two', -1)))).toEqual(['tx', 'two', 'one', 'three', 'rx'])
    expect(ids(applied(start, moveRow(start, 'two', 1)))).toEqual(['tx', 'one', 'three', 'two', 'rx'])
    expect(ids(applied(start, moveRow(start, 'one', -1)))).toEqual(['one', 'tx', 'two', 'three', 'rx'])
    expect(moveRow(start, 'tx', -1)).toEqual([])
    expect(moveRow(start, 'rx', 1)).toEqual([])
  })
  it('moving passes the shown neighbour even with a removed row between', () => {
    const without = applied(start, removeRow({ section: 'lines', id: 'two' }))
    expect(ids(without)).toEqual(['tx', 'one', 'three', 'rx'])
    expect(ids(applied(without, moveRow(without, 'one', 1)))).toEqual(['tx', 'three', 'one', 'rx'])
    expect(ids(applied(without, moveRow(without, 'three', -1)))).toEqual(['tx', 'three', 'one', 'rx'])
  })
  it('a removed row is kept while somebody types in it', () => {
    const without = applied(start, removeRow({ section: 'lines', id: 'two' }))
    expect(shownRows(without, (row) => row.id === 'two').map((row) => row.id)).toContain('two')
  })
})

describe('records of other sections', () => {
  it('come at the end, also after one that was removed', () => {
    const first = addRecord(start, 'assemblies', { name: 'Card' })
    const one = applied(start, first.operations)
    const gone = applied(one, [{ op: 'set', section: 'assemblies', id: first.id, field: 'removed', value: true }])
    expect(inOrder(gone.assemblies)).toEqual([])
    expect(removedOnes(gone.assemblies).map(([id]) => id)).toEqual([first.id])
    const second = addRecord(gone, 'assemblies', { name: 'Cable' })
    const back = applied(applied(gone, second.operations), [
      { op: 'set', section: 'assemblies', id: first.id, field: 'removed', value: false },
    ])
    expect(inOrder(back.assemblies).map(([, record]) => record.name)).toEqual(['Card', 'Cable'])
  })
})
