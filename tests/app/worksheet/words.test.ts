import { describe, expect, it } from 'vitest'
import { wordOf } from '../../../app/budgets/[id]/client/words/choices'
import { LABELS, labelOf } from '../../../app/budgets/[id]/client/words/labels'
import { readableTime } from '../../../app/words/client/readerTime'
import { fieldsOf, metaOf, SECTION_NAMES } from '../../../lib/sheet/layout'

const sections = ['head', ...SECTION_NAMES] as const

describe('words of the fields', () => {
  it('every field of the schema has a label, and there is no label without a field', () => {
    for (const section of sections) expect(Object.keys(LABELS[section]).sort()).toEqual([...fieldsOf(section)].sort())
  })
  it('no two fields of a record share a label', () => {
    for (const section of sections) {
      const labels = Object.values(LABELS[section])
      expect(new Set(labels).size, section).toBe(labels.length)
    }
  })
  it('no code is shown with the look of a code', () => {
    for (const section of sections) {
      for (const field of fieldsOf(section)) {
        const meta = metaOf(section, field)
        if (meta?.kind !== 'choice' && meta?.kind !== 'set') continue
        for (const code of meta.choices) {
          const word = wordOf(code)
          if (code.includes('-') && code !== 'single-ended') expect(word, `${section}.${field}: ${code}`).not.toBe(code)
        }
      }
    }
  })
  it('a value of a lane is named by its lane', () => {
    expect(labelOf('laneValues', '11/length')).toBe('length of lane 11')
  })
})

describe('times for reading', () => {
  it('times in the zone of the reader', () => {
    const at = (text: string) => new Date(text).getTime()
    expect(readableTime(at('2026-12-01T14:31:00'), at('2026-12-01T14:31:20'))).toBe('just now')
    expect(readableTime(at('2026-12-01T00:05:00'), at('2026-12-01T14:31:20'))).toBe('00:05 today')
    expect(readableTime(at('2026-11-30T23:59:00'), at('2026-12-01T00:31:20'))).toBe('23:59 yesterday')
    expect(readableTime(at('2026-11-28T12:00:00'), at('2026-12-01T14:31:20'))).toBe('28 Nov')
    expect(readableTime(at('2024-11-28T12:00:00'), at('2026-12-01T14:31:20'))).toBe('28 Nov 2024')
  })
})
