import { describe, expect, it } from 'vitest'
import { evaluate } from '../../lib/budget/evaluate'
import type { BudgetFile } from '../../lib/budget/schema'
import { line, link } from './links'

const { head } = link({})
type Lines = NonNullable<BudgetFile['lines']>

/** The same link with lines under other ids, of which nothing can be remembered. */
function underOtherIds(parts: Partial<BudgetFile>, prefix: string): Partial<BudgetFile> {
  const lines: Lines = {}
  for (const [id, one] of Object.entries(parts.lines ?? {})) lines[`${prefix}${id}`] = one
  return { ...parts, lines }
}

const flags = (parts: Partial<BudgetFile>, prefix = '') =>
  evaluate(link(parts), new Map()).flags.map(
    ({ code, id, message }) => `${code} ${id?.slice(prefix.length)} ${message}`,
  )

const base: Partial<BudgetFile> = {
  evidence: {
    e: { order: 'a0', name: 'part', ports: 2, modes: 'mixed-as-two-ports', reference: '100 Ω', fixtures: 'none' },
  },
  lossClasses: { k: { order: 'a0', name: 'L3', lossPerLength: '0.9 dB/in', at: '10 GHz' } },
  lines: {
    a: line('a1', '1 dB', { kind: 'via', conditionTemperature: '25 °C' }),
    b: line('a2', '1 dB', {
      kind: 'connector',
      covers: 'footprint-via-a mating-interface',
      evidence: 'e',
      grade: 'typical',
    }),
    c: line('a3', null, {
      kind: 'trace',
      at: null,
      model: 'class',
      lossClass: 'k',
      length: '2 in',
      impedance: '100 Ω',
    }),
  },
}
const changed = (section: 'evidence' | 'lossClasses' | 'lines', id: string, fields: object): Partial<BudgetFile> => ({
  ...base,
  [section]: { ...base[section], [id]: { ...base[section]?.[id], ...fields } },
})

describe('what is remembered of a line’s checks', () => {
  it.each<[string, Partial<BudgetFile>]>([
    ['the file that proves it', changed('evidence', 'e', { modes: null })],
    ['the name of that file', changed('evidence', 'e', { name: 'other', reference: '85 Ω' })],
    ['the reference of the link', { ...base, head: { ...head, reference: '85 Ω' } }],
    ['the temperature of the reference corner', { ...base, head: { ...head, referenceTemperature: '40 °C' } }],
    ['its loss class', changed('lossClasses', 'k', { lossPerLength: '0.9 dB/m' })],
    ['its number', changed('lines', 'b', { loss: '0.4 dB' })],
    ['the line before it', changed('lines', 'a', { kind: 'trace' })],
    ['the line after it', changed('lines', 'c', { kind: 'via' })],
  ])('follows %s, there and back', (what, other) => {
    const cold = (parts: Partial<BudgetFile>, n: number) => {
      const prefix = `${what.replace(/[^a-z]/g, '').slice(0, 12)}${n}-`
      return flags(underOtherIds(parts, prefix), prefix)
    }
    const [before, after] = [cold(base, 1), cold(other, 2)]
    expect(after).not.toEqual(before)
    for (const _ of [1, 2]) {
      expect(flags(base)).toEqual(before)
      expect(flags(other)).toEqual(after)
    }
  })
})
