import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { evaluate } from '../../lib/budget/evaluate'
import { budgetSchema, head, SECTIONS } from '../../lib/budget/schema'

/** Frozen: written once, with a value for every field of version 1. Never make it anew to please a test; files like it exist. */
type Records = Record<string, Record<string, unknown>>
type Document = { head: Record<string, unknown>; laneValues: Record<string, unknown> } & Record<string, Records>
const frozen = (): Document =>
  JSON.parse(readFileSync(new URL('./example.frozen.json', import.meta.url), 'utf8')) as Document

const isEmpty = (value: unknown) => value === null || value === undefined || value === ''
const recordsOf = (document: Document, section: string) =>
  section === 'head' ? { head: document.head } : (document[section] ?? {})

describe('a budget file of version 1, frozen', () => {
  it.each([
    ['head', head.shape],
    ...Object.entries(SECTIONS).map(([name, section]) => [name, section.shape] as const),
  ] as const)('has a value for every field of %s', (section, shape) => {
    const records = Object.values(recordsOf(frozen(), section))
    const without = Object.keys(shape).filter((field) => records.every((record) => isEmpty(record[field])))
    expect(without).toEqual([])
  })

  it('parses, and every value comes back as it was typed; everything else is empty', () => {
    const written = frozen()
    const read = budgetSchema.parse(frozen()) as unknown as Document
    expect(Object.keys(read).sort()).toEqual(Object.keys(written).sort())
    for (const section of ['head', ...Object.keys(SECTIONS)]) {
      const before = recordsOf(written, section)
      const after = recordsOf(read, section)
      expect(Object.keys(after)).toEqual(Object.keys(before))
      for (const [id, record] of Object.entries(after)) {
        for (const [field, value] of Object.entries(record)) {
          const typed = before[id]?.[field]
          const empty = field === 'removed' ? false : field === 'note' ? '' : null
          expect(value, `${section}.${id}.${field}`).toBe(typed === undefined ? empty : typed)
        }
      }
    }
    expect(read.laneValues).toEqual(written.laneValues)
  })

  it('is the same after a second reading, byte for byte', () => {
    const once = JSON.stringify(budgetSchema.parse(frozen()))
    expect(JSON.stringify(budgetSchema.parse(JSON.parse(once)))).toBe(once)
  })

  it.each(['head', ...Object.keys(SECTIONS)])('refuses an unknown field in %s', (section) => {
    const document = frozen()
    const [record] = Object.values(recordsOf(document, section))
    if (!record) throw new Error(`No record in '${section}'.`)
    record.colour = 'red'
    const result = budgetSchema.safeParse(document)
    expect(result.error?.issues.map((issue) => issue.message)).toEqual(['Unrecognized key: "colour"'])
  })

  it('refuses an unknown section', () => {
    expect(budgetSchema.safeParse({ ...frozen(), colours: {} }).success).toBe(false)
  })

  it('evaluates to numbers that are finite or unknown, never anything else', () => {
    const evaluation = evaluate(budgetSchema.parse(frozen()), new Map())
    let numbers = 0
    const walk = (value: unknown, path: string): void => {
      if (typeof value === 'number') {
        numbers++
        expect(Number.isFinite(value), path).toBe(true)
      } else if (typeof value === 'object' && value !== null) {
        for (const [key, inner] of Object.entries(value)) walk(inner, `${path}.${key}`)
      } else expect(value, path).not.toBeUndefined()
    }
    walk(evaluation, 'evaluation')
    expect(numbers).toBeGreaterThan(30)
    // 50 Gb/s × 257/256 × 544/514 = 53.125 Gb/s, two bits a symbol, half of that.
    expect(evaluation.signalling.nyquist).toBeCloseTo(13.28125e9, 0)
    expect(Object.keys(evaluation.lines)).toHaveLength(13)
  })
})
