import { describe, expect, it } from 'vitest'
import { type BudgetFile, budgetSchema, LIMITS } from '../../lib/budget/schema'

type Loose = Record<string, Record<string, unknown>>

/** A budget with one line 'a'; `change` puts in what is to be judged. */
function withChange(change: (budget: Loose) => void): unknown {
  const budget: Loose = { head: { schemaVersion: 1 }, lines: { a: { order: 'a0' } } }
  change(budget)
  return budget
}
const lineWith = (field: string, value: unknown) =>
  withChange((budget) => {
    budget.lines = { a: { order: 'a0', [field]: value } }
  })
const headWith = (field: string, value: unknown) =>
  withChange((budget) => {
    budget.head = { ...budget.head, [field]: value }
  })

/** Every message; empty when the budget is accepted. */
function refusals(candidate: unknown): string[] {
  const result = budgetSchema.safeParse(candidate)
  if (result.success) return []
  return result.error.issues.map((issue) => issue.message)
}

const accepted: [string, unknown][] = [
  ['loss', '0 dB'],
  ['loss', '200 dB'],
  ['loss', '1,35 dB'],
  ['loss', null],
  ['length', '5 in'],
  ['length', '127 mm'],
  ['dk', '3.6'],
  ['toleranceMinus', '6 %'],
  ['toleranceMinus', '0.285 dB'],
  ['conditionTemperature', '−40 °C'],
  ['name', 'x'.repeat(120)],
  ['name', 'Ω 😀'],
  ['kind', 'via'],
  ['covers', ''],
  ['covers', 'breakout-a footprint-via-b'],
  ['processIncluded', true],
  ['removed', true],
  ['count', 64],
  ['assembly', 'line-card-2'],
  ['order', 'a0V'],
  ['note', 'x'.repeat(4000)],
]

const refused: [string, unknown, string][] = [
  ['loss', '-1 dB', 'A loss is typed as a positive number of decibels; leave the minus sign out.'],
  ['loss', '201 dB', 'Type a value between 0 and 200 dB.'],
  ['loss', '3', 'Add a unit: dB.'],
  ['loss', '3 in', "'in' is not a unit for this field; use dB."],
  ['loss', '', 'Type a number with its unit.'],
  ['loss', 'about 3 dB', 'Start with a number, such as 3.6 dB.'],
  ['loss', '1,234 dB', 'Does 1,234 mean 1234 or 1.234? Type it without the comma or with a point.'],
  ['loss', 3, 'Write the number and its unit as text, such as "1.35 dB".'],
  ['loss', `${'0'.repeat(40)}3 dB`, 'Write the number and its unit in at most 40 characters.'],
  ['length', '101 m', 'Type a value between 0 and 100 m.'],
  ['toleranceMinus', '1001 %', 'Type a share between 0 % and 1000 %.'],
  ['conditionTemperature', '-61 °C', 'Type a value between -60 and 200 °C.'],
  ['name', 'x'.repeat(121), 'Write at most 120 characters.'],
  ['name', 7, 'Write text between quotation marks.'],
  ['name', 'half \ud83d', 'The text has half of a character pair in it; type it again.'],
  ['note', '\ude00 half', 'The text has half of a character pair in it; type it again.'],
  ['note', 'x'.repeat(4001), 'Write at most 4000 characters.'],
  ['kind', 'vias', 'Write one of: die, package, trace, via, connector, cable, component, reserve, overlap, other.'],
  ['covers', 'footprint-via-b breakout-a', 'List the codes in this order, one space between: die-pad'],
  ['covers', 'breakout-a breakout-a', 'List the codes in this order'],
  ['covers', 'everything', 'List the codes in this order'],
  ['processIncluded', 'yes', 'Write true or false.'],
  ['removed', null, 'Write true or false.'],
  ['count', 0, 'Write a whole number from 1 to 64, without quotation marks.'],
  ['count', 65, 'Write a whole number from 1 to 64, without quotation marks.'],
  ['count', 1.5, 'Write a whole number from 1 to 64, without quotation marks.'],
  ['count', Number.NaN, 'Write a whole number from 1 to 64, without quotation marks.'],
  ['count', '2', 'Write a whole number from 1 to 64, without quotation marks.'],
  ['assembly', 'Line card', "Name an id of 'assemblies'."],
  ['order', '0a', "An order key starts with a letter, such as 'a0'."],
  ['order', null, "Write a key for the position, such as 'a0'."],
  ['colour', 'red', 'Unrecognized key: "colour"'],
]

describe('the schema of a budget', () => {
  it.each(accepted)('accepts %s: %j', (field, value) => {
    expect(refusals(lineWith(field, value))).toEqual([])
  })

  it.each(refused)('refuses %s: %j and says what to do', (field, value, message) => {
    expect(refusals(lineWith(field, value))).toEqual([expect.stringContaining(message)])
  })

  it('keeps a quantity as it was typed', () => {
    for (const typed of ['1.350 dB', '1,35 dB', '1.35dB']) {
      expect(budgetSchema.parse(lineWith('loss', typed)).lines.a?.loss).toBe(typed)
    }
  })

  it('fills every field of a record, so that two people can type into it at once', () => {
    const line = budgetSchema.parse(lineWith('loss', '1 dB')).lines.a
    expect(line).toMatchObject({ removed: false, note: '', loss: '1 dB', at: null, covers: null })
  })

  it('refuses another version of the schema, and a head that is not there', () => {
    expect(refusals(headWith('schemaVersion', 2))).toHaveLength(1)
    expect(refusals({ lines: {} })).toHaveLength(1)
    expect(refusals(headWith('laneCount', 257))).toEqual([
      'Write a whole number from 1 to 256, without quotation marks.',
    ])
  })

  it.each([['Via 1'], [''], ['-a'], ['a'.repeat(41)], ['constructor ']])('refuses %j as an id', (id) => {
    const candidate = withChange((budget) => {
      budget.lines = { [id]: { order: 'a0' } }
    })
    expect(refusals(candidate)).toEqual(['An id has 1 to 40 small letters, digits and hyphens.'])
  })

  it.each([
    ['lines', '{"order": "a0"}'],
    ['laneValues', '"4.9 in"'],
  ])('refuses __proto__ as an id in %s, and does not drop what stands under it', (section, value) => {
    const candidate = JSON.parse(`{"head": {"schemaVersion": 1}, "${section}": {"__proto__": ${value}}}`)
    expect(refusals(candidate)).toEqual(["'__proto__' cannot be an id; choose another."])
  })

  it('takes names of built-in properties as ids without harm', () => {
    const budget = budgetSchema.parse(JSON.parse('{"head":{"schemaVersion":1},"lines":{"constructor":{"order":"a0"}}}'))
    expect(Object.keys(budget.lines)).toEqual(['constructor'])
    expect(({} as Record<string, unknown>).order).toBeUndefined()
  })

  it(`takes ${LIMITS.lines} lines and not one more`, () => {
    const lines = (count: number) =>
      withChange((budget) => {
        budget.lines = Object.fromEntries(Array.from({ length: count }, (_, n) => [`line-${n}`, { order: 'a0' }]))
      })
    expect(refusals(lines(LIMITS.lines))).toEqual([])
    expect(refusals(lines(LIMITS.lines + 1))).toEqual(['At most 500 records.'])
  })

  it.each([
    ['a/1/length', '4.9 in', null],
    ['a/256/skew', '2 ps', null],
    ['a/3/lossClass', 'l5', null],
    ['a/3/length', null, null],
    ['a/257/length', '4.9 in', 'A link has at most 256 lanes.'],
    ['a/0/length', '4.9 in', "A lane value's key is 'line/lane/field'."],
    ['a/1/name', 'x', "A lane value's key is 'line/lane/field'."],
    ['a/1', '4.9 in', "A lane value's key is 'line/lane/field'."],
    ['a/1/length', '-4.9 in', 'Type a value between 0 and 100 m.'],
    ['a/1/length', '4.9', 'Add a unit: m, cm, mm, µm, in, mil, ft.'],
    ['a/1/lossClass', 'L 5', "Name an id of 'lossClasses'."],
    ['a/1/length', 4.9, 'Write the value of the lane as text, with its unit.'],
  ])('lane value %j: %j → %j', (key, value, message) => {
    const candidate = withChange((budget) => {
      budget.laneValues = { [key]: value }
    })
    expect(refusals(candidate)).toEqual(message === null ? [] : [message])
  })
})

it('refuses a lane value longer than any quantity', () => {
  const candidate = withChange((budget) => {
    budget.laneValues = { 'a/1/length': `${'0'.repeat(40)}4 in` }
  })
  expect(refusals(candidate)).toContain('Write at most 40 characters.')
})

/** The type that people outside write against needs only what is set. */
const smallest: BudgetFile = { head: { schemaVersion: 1 } }
it('accepts the smallest budget file', () => expect(refusals(smallest)).toEqual([]))
