import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { Budget } from '../../lib/budget/schema'
import { budgetSchema } from '../../lib/budget/schema'
import { applyEdit } from '../../lib/sheet/edits'
import { refuseValue } from '../../lib/sheet/layout'
import { orderBetween, orderForInsert, rowsInOrder } from '../../lib/sheet/order'
import { readBudget, seedUpdate } from '../../lib/sheet/seed'
import { docOf, sampleBudget } from './sample'

const ids = (budget: Budget) => rowsInOrder(budget).map((row) => row.id)

function withLines(orders: Record<string, string>): Budget {
  const lines = Object.fromEntries(Object.entries(orders).map(([id, order]) => [id, { order }]))
  return budgetSchema.parse({ head: { schemaVersion: 1 }, lines })
}

/** Inserts a line as a screen does, and returns the ids in channel order. */
function insert(budget: Budget, id: string, after: string | null): Budget {
  const doc = docOf(seedUpdate(budget))
  const { order, shifts } = orderForInsert(budget, after)
  const edit = applyEdit(doc, [...shifts, { op: 'add', section: 'lines', id, values: { order } }])
  if (!edit.ok) throw new Error(edit.reason)
  return readBudget(doc)
}

describe('channel order', () => {
  test('lines and planes share one space, ties go by id, order is that of code units', () => {
    expect(ids(sampleBudget())).toEqual(['start', 'package', 'trace', 'via', 'end'])
    expect(ids(withLines({ b: 'a1', a: 'a1', c: 'Zz', d: 'aV' }))).toEqual(['c', 'a', 'b', 'd'])
  })

  test('a key lies between its neighbours, or there is none because they are equal or unusable (seeds of fast-check)', () => {
    const key = fc.stringMatching(/^[A-Za-z][0-9A-Za-z]{1,5}$/)
    let found = 0
    fc.assert(
      fc.property(fc.option(key), fc.option(key), (a, b) => {
        const made = orderBetween(a, b)
        if (made === null) return
        found++
        if (a !== null) expect(made > a).toBe(true)
        if (b !== null) expect(made < b).toBe(true)
        expect(refuseValue('lines', 'order', made)).toBeNull()
      }),
      { numRuns: 500 },
    )
    expect(found).toBeGreaterThan(20)
    expect(orderBetween('a1', 'a1')).toBeNull()
    expect(orderBetween('a10', null)).toBeNull()
  })

  test('insert at the start, in the middle, at the end', () => {
    expect(ids(insert(sampleBudget(), 'new', null))[0]).toBe('new')
    expect(ids(insert(sampleBudget(), 'new', 'trace'))).toEqual(['start', 'package', 'trace', 'new', 'via', 'end'])
    expect(ids(insert(sampleBudget(), 'new', 'end')).at(-1)).toBe('new')
  })

  test('[W1.69] two people inserted at once and got equal keys: a third line still goes exactly between them', () => {
    const budget = withLines({ a: 'a0', left: 'a1', right: 'a1', z: 'a2' })
    expect(ids(insert(budget, 'mid', 'left'))).toEqual(['a', 'left', 'mid', 'right', 'z'])
    expect(ids(insert(budget, 'mid', 'right'))).toEqual(['a', 'left', 'right', 'mid', 'z'])
    expect(ids(insert(budget, 'mid', 'a'))).toEqual(['a', 'mid', 'left', 'right', 'z'])
  })

  test('a move does not count the moved row as its own neighbour', () => {
    expect(orderForInsert(sampleBudget(), 'package', 'trace')).toEqual({ order: orderBetween('a1', 'a4'), shifts: [] })
  })

  test('random insertions land where they were meant, beside keys of any kind (seeds of fast-check)', () => {
    fc.assert(
      fc.property(fc.array(fc.nat({ max: 30 }), { maxLength: 20 }), (places) => {
        let budget = withLines({ a: 'a10', b: 'a1', c: 'a1', d: 'b1' })
        for (const [index, place] of places.entries()) {
          const before = ids(budget)
          const at = place % (before.length + 1)
          budget = insert(budget, `n${index}`, before[at - 1] ?? null)
          expect(ids(budget)).toEqual([...before.slice(0, at), `n${index}`, ...before.slice(at)])
        }
      }),
      { numRuns: 15 },
    )
  })

  test('moving rows past each other for ever: keys are given anew before they grow over the limit of 128', () => {
    const orders = new Map([
      ['a', 'a0'],
      ['b', 'a1'],
      ['c', 'a2'],
    ])
    let respaced = 0
    for (let move = 0; move < 2000; move++) {
      const budget = withLines(Object.fromEntries(orders))
      // The last of the three goes right behind the first, so the gap behind the first halves each time.
      const moving = ids(budget).at(-1) ?? ''
      const { order, shifts } = orderForInsert(budget, 'a', moving)
      if (shifts.length > 0) respaced++
      for (const shift of shifts) if (shift.op === 'set' && shift.id !== null) orders.set(shift.id, String(shift.value))
      orders.set(moving, order)
      expect(order.length).toBeLessThanOrEqual(128)
      expect(rowsInOrder(withLines(Object.fromEntries(orders)))[1]?.id).toBe(moving)
    }
    expect(respaced).toBeGreaterThan(0)
  })
})
