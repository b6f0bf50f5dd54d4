import { describe, expect, it } from 'vitest'
import { crossCheck } from '../../lib/budget/crossCheck'
import { budgetIssues, parseBudget } from '../../lib/budget/parse'
import { line, link } from './links'

const HEAD = { schemaVersion: 1 }
const told = (json: unknown) => budgetIssues(json).map(({ path, message }) => `${path}: ${message}`)

describe('a budget from JSON', () => {
  it('is read with every field of every record, empty where the file says nothing', () => {
    const result = parseBudget({ head: HEAD, lines: { a: { order: 'a0', loss: '1 dB' } } })
    expect(result).toMatchObject({
      budget: { lines: { a: { loss: '1 dB', removed: false, skew: null, note: '' } }, planes: {} },
    })
    expect(budgetIssues({ head: HEAD })).toEqual([])
  })

  it.each([
    [
      'a loss without unit',
      { lines: { l3: { order: 'a0', name: 'Backplane via', loss: '0.6' } } },
      "lines.l3.loss: 'Backplane via' (lines.l3), stated loss: Add a unit: dB.",
    ],
    [
      'a negative loss',
      { lines: { l3: { order: 'a0', loss: '−1 dB' } } },
      'lines.l3.loss: Line without a name (l3) (lines.l3), stated loss: A loss is typed as a positive number of decibels; leave the minus sign out.',
    ],
    [
      'a number for text',
      { assemblies: { b: { order: 'a0', name: 'Card', group: 7 } } },
      "assemblies.b.group: 'Card' (assemblies.b), correlation group of its lines: Write text between quotation marks.",
    ],
    [
      'an unknown kind',
      { lines: { l3: { order: 'a0', name: 'X', kind: 'wire' } } },
      "lines.l3.kind: 'X' (lines.l3), kind of contributor: Write one of: die, package, trace, via, connector, cable, component, reserve, overlap, other.",
    ],
    [
      'an unknown field',
      { lines: { l3: { order: 'a0', name: 'X', los: '1 dB' } } },
      "lines.l3: 'X' (lines.l3): 'los' is not a field here; take it out or correct its name.",
    ],
    ['an unknown section', { line: {} }, ": 'line' is not a field here; take it out or correct its name."],
    [
      'no order',
      { planes: { p: { name: 'TX ball' } } },
      "planes.p.order: 'TX ball' (planes.p), position in the channel: Write a key for the position, such as 'a0'.",
    ],
    [
      'a bad id',
      { lines: { 'L 3': { order: 'a0' } } },
      'lines.L 3: Line without a name (L 3) (lines.L 3): An id has 1 to 40 small letters, digits and hyphens.',
    ],
    ['a list of lines', { lines: [] }, "lines: 'lines': Write the records by their ids, between { and }."],
    [
      'a line that is a text',
      { lines: { a: 'via' } },
      'lines.a: Line without a name (a) (lines.a): Write the fields by their names, between { and }.',
    ],
    [
      'a lane value out of bounds',
      { lines: { a: { order: 'a0', name: 'Via' } }, laneValues: { 'a/2/loss': '300 dB' } },
      "laneValues.a/2/loss: 'Via' (lines.a), lane 2, stated loss: Type a value between 0 and 200 dB.",
    ],
    [
      'a lane value of an unknown field',
      { laneValues: { 'a/2/los': '3 dB' } },
      "laneValues.a/2/los: Lane value 'a/2/los': A lane value's key is 'line/lane/field'.",
    ],
    [
      'a lane value without its line',
      { laneValues: { 'b/2/loss': '3 dB' } },
      ": The lane value 'b/2/loss' names a line that does not exist; add the line first.",
    ],
  ])('%s names the record, the field and what to do', (_, parts, expected) => {
    expect(told({ head: HEAD, ...parts })).toEqual([expected])
  })

  it.each([
    [null, 'This is no budget file: "head" must say "schemaVersion": 1.'],
    [[], 'This is no budget file: "head" must say "schemaVersion": 1.'],
    [{ head: {} }, 'This is no budget file: "head" must say "schemaVersion": 1.'],
    [
      { head: { schemaVersion: 2 } },
      'This budget was written by a newer version (schema 2, this one reads 1); update first.',
    ],
  ])('%j is told from a budget by its version', (json, message) => {
    expect(budgetIssues(json)).toEqual([{ path: 'head.schemaVersion', message }])
  })

  it('tells the head by what the field is', () => {
    expect(told({ head: { ...HEAD, laneCount: 300 } })).toEqual([
      'head.laneCount: The link, lanes of the link: Write a whole number from 1 to 256, without quotation marks.',
    ])
  })

  it('stops after fifty issues', () => {
    const lines = Object.fromEntries(Array.from({ length: 80 }, (_, n) => [`l${n}`, { order: 'a0', loss: 'x' }]))
    expect(budgetIssues({ head: HEAD, lines })).toHaveLength(50)
  })
})

describe('limits across records', () => {
  it('let dangling references pass, because two people may remove and refer at once', () => {
    expect(
      crossCheck(link({ lines: { a: line('a1', '1 dB', { assembly: 'gone', lossClass: 'gone', overlapA: 'gone' }) } })),
    ).toBeNull()
  })

  it('refuse more than 500 lines and lane values of lines that were never made', () => {
    const budget = link({ lines: { a: line('a1', '1 dB', { removed: true }) }, laneValues: { 'a/1/loss': '1 dB' } })
    expect(crossCheck(budget)).toBeNull()
    const { a } = budget.lines
    if (!a) throw new Error('no line')
    const many = Object.fromEntries(Array.from({ length: 501 }, (_, n) => [`l${n}`, a]))
    expect(crossCheck({ ...budget, lines: many, laneValues: {} })).toBe(
      'A budget holds at most 500 lines, those taken out included; this one would hold 501.',
    )
    expect(crossCheck({ ...budget, lines: {} })).toBe(
      "The lane value 'a/1/loss' names a line that does not exist; add the line first.",
    )
  })
})
