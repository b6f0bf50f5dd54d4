import { describe, expect, it } from 'vitest'
import { moveIn, nearestRow } from '../../../app/budgets/[id]/client/rows/gridMoves'

// Keys as the ARIA authoring practices give them for a grid; Tab as common practice in worksheets, no source.
const grid = [
  ['row', 'name', 'code'],
  ['row', 'name', 'loss', 'at', 'tolerance'],
  ['row', 'name', 'length', 'lossClass', 'tolerance'],
]
const go = (row: number, cell: number, key: string, ctrl = false, shift = false) =>
  moveIn(grid, { row, cell }, key, { ctrl, shift })

describe('keys in the rows', () => {
  it('arrows go to the neighbour and stop at the edges', () => {
    expect(go(1, 1, 'ArrowRight')).toEqual({ row: 1, cell: 2 })
    expect(go(1, 4, 'ArrowRight')).toBeNull()
    expect(go(1, 0, 'ArrowLeft')).toBeNull()
    expect(go(0, 1, 'ArrowUp')).toBeNull()
    expect(go(2, 1, 'ArrowDown')).toBeNull()
  })
  it('up and down keep the field where both rows have it, else the place', () => {
    expect(go(1, 4, 'ArrowDown')).toEqual({ row: 2, cell: 4 })
    expect(go(1, 2, 'ArrowDown')).toEqual({ row: 2, cell: 2 })
    expect(go(1, 4, 'ArrowUp')).toEqual({ row: 0, cell: 2 })
  })
  it('Home, End and the pages', () => {
    expect(go(1, 3, 'Home')).toEqual({ row: 1, cell: 0 })
    expect(go(1, 3, 'Home', true)).toEqual({ row: 0, cell: 0 })
    expect(go(0, 0, 'End', true)).toEqual({ row: 2, cell: 4 })
    expect(go(0, 0, 'PageDown')).toEqual({ row: 2, cell: 0 })
    expect(go(2, 1, 'PageUp')).toEqual({ row: 0, cell: 1 })
  })
  it('Tab goes along the row and then out', () => {
    expect(go(1, 3, 'Tab')).toEqual({ row: 1, cell: 4 })
    expect(go(1, 4, 'Tab')).toBeNull()
    expect(go(1, 1, 'Tab', false, true)).toEqual({ row: 1, cell: 0 })
    expect(go(1, 0, 'Tab', false, true)).toBeNull()
  })
  it('leaves every other key alone', () => expect(go(1, 1, 'q')).toBeNull())
})

describe('where the focus goes when its row is gone', () => {
  it('to the next row, at the end to the one before', () => {
    expect(nearestRow('b', ['a', 'b', 'c'], ['a', 'c'])).toBe('c')
    expect(nearestRow('c', ['a', 'b', 'c'], ['a', 'b'])).toBe('b')
    expect(nearestRow('b', ['a', 'b', 'c', 'd'], ['a', 'd'])).toBe('d')
  })
  it('stays where it is if only the cell is gone, and begins at the top if nothing is known', () => {
    expect(nearestRow('b', ['a', 'b'], ['a', 'b'])).toBe('b')
    expect(nearestRow('', [], ['a', 'b'])).toBe('a')
    expect(nearestRow('b', ['b'], [])).toBeNull()
  })
})
