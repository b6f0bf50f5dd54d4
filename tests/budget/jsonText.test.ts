import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { readJson } from '../../lib/budget/jsonText'

/** The engine's own parser is the reference: it knows no places, and forgets the first of two equal names. */
function builtIn(text: string): { value: unknown } | null {
  try {
    return { value: JSON.parse(text) }
  } catch {
    return null
  }
}

/** Every character that JSON gives a meaning to, so that a random change is likely to matter. */
const meaningful = fc.constantFrom(...'{}[]:,"\\0123456789.-+eEtrufalsn \t\n\r\'/é\u0001')

describe('reading JSON with the place of what is wrong', () => {
  it('reads every value that JSON.stringify writes, as JSON.parse does', () => {
    fc.assert(
      fc.property(fc.jsonValue({ maxDepth: 6 }), fc.constantFrom(0, 2), (value, indent) => {
        const text = JSON.stringify(value, null, indent)
        fc.pre(!text.includes('"__proto__"'))
        expect(readJson(text)).toEqual({ value: JSON.parse(text) })
      }),
      { numRuns: 500 },
    )
  })

  it('accepts a text with one character changed exactly if JSON.parse does', () => {
    let accepted = 0
    let refused = 0
    const sample =
      '{"head": {"schemaVersion": 1, "name": "a\\u00e9\\n\\"b"},\n "n": [-1.5e+3, 0, true, false, null, {}, []]}'
    fc.assert(
      fc.property(fc.nat(sample.length - 1), meaningful, fc.boolean(), (at, put, replace) => {
        const text = sample.slice(0, at) + put + sample.slice(replace ? at + 1 : at)
        const mine = readJson(text)
        const reference = builtIn(text)
        if ('value' in mine) accepted++
        else refused++
        expect('value' in mine ? { value: mine.value } : null, text).toEqual(reference)
      }),
      { numRuns: 3000 },
    )
    expect(Math.min(accepted, refused)).toBeGreaterThan(100)
  })

  it.each([
    ['', 1, 1, 'The text ends too early. Put a value here'],
    ['{"a": 1,\n "b": tru}', 2, 7, 'Put a value here'],
    ['{"a": 1,\n}', 2, 1, 'no comma after the last'],
    ['{"a": 1\n "b": 2}', 2, 2, 'Put a comma between two values'],
    ['{"a" 1}', 1, 6, "Put a colon after the name 'a'"],
    ['[1, 2', 1, 6, "The text ends too early. Put a comma between two values, or ']' at the end."],
    ['{"a": "x\n"}', 1, 7, 'End this text with a double quotation mark'],
    ['{"a": "C:\\x"}', 1, 7, 'write a backslash as \\\\'],
    ["{'a': 1}", 1, 2, 'Put a name in double quotation marks here'],
    ['{"a": \'x\'}', 1, 7, 'Use double quotation marks.'],
    ['{"a": 01}', 1, 8, "Put a comma between two values, or '}' at the end."],
    ['{} {}', 1, 4, 'Take out what follows the end'],
  ])('refuses %j at line %i, column %i', (text, line, column, message) => {
    expect(readJson(text)).toEqual({ problem: { line, column, message: expect.stringContaining(message) } })
    expect(builtIn(text)).toBeNull()
  })

  it('refuses a name that stands twice, which JSON.parse would forget in silence', () => {
    const text = '{"lines": {"via": {"loss": "1 dB"},\n "via": {"loss": "2 dB"}}}'
    expect(builtIn(text)).toEqual({ value: { lines: { via: { loss: '2 dB' } } } })
    expect(readJson(text)).toEqual({
      problem: { line: 2, column: 2, message: "The name 'via' stands twice here; keep one of them." },
    })
    expect(readJson('{"a": {"x": 1}, "b": {"x": 2}, "c": [{"x": 1}, {"x": 2}]}')).toHaveProperty('value')
    expect(readJson('{"a": 1, "\\u0061": 2}')).toHaveProperty('problem.column', 10)
  })

  it('refuses __proto__ as a name, also when it is escaped', () => {
    expect(readJson('{"__proto__": {}}')).toHaveProperty('problem.message', expect.stringContaining('choose another'))
    expect(readJson('{"\\u005f_proto__": {}}')).toHaveProperty('problem.column', 2)
  })

  it('takes a byte-order mark, a text of six megabytes and no tower of brackets', () => {
    expect(readJson('\ufeff{"a": 1}')).toEqual({ value: { a: 1 } })
    const long = 'x\\"'.repeat(2_000_000)
    expect(readJson(JSON.stringify({ note: long }))).toEqual({ value: { note: long } })
    expect(readJson('['.repeat(1_000_000))).toHaveProperty('problem.message', 'Nest at most 32 levels.')
  })
})
