import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { evaluate } from '../../lib/budget/evaluate'
import { readJson } from '../../lib/budget/jsonText'
import { parseBudget } from '../../lib/budget/parse'
import { LANE_FIELDS, MODELS, SECTIONS } from '../../lib/budget/schema'

const README = readFileSync(new URL('../../lib/budget/README.md', import.meta.url), 'utf8')

function exampleOf(markdown: string): unknown {
  const read = readJson(/```json\n([\s\S]*?)```/.exec(markdown)?.[1] ?? '')
  if ('problem' in read) throw new Error(JSON.stringify(read.problem))
  return read.value
}

describe('the example of lib/budget/README.md', () => {
  const parsed = parseBudget(exampleOf(README))
  if ('issues' in parsed) throw new Error(parsed.issues.map(({ message }) => message).join('\n'))
  const evaluation = evaluate(parsed.budget, new Map())

  it('comes to what the text beneath it says (arithmetic, no source)', () => {
    const total = 0.5 + 7 * 0.85 + 1.2 + 9
    expect(total).toBeCloseTo(16.65, 9)
    expect(README).toContain('0.5 + 7 × 0.85 + 1.2 + 9 = 16.65 dB, margin 3.35 dB, inside')
    expect(evaluation.verdict).toBe('inside')
    expect(evaluation.allowances).toHaveLength(1)
    expect(evaluation.allowances[0]?.lossDb).toBeCloseTo(total, 9)
    expect(evaluation.allowances[0]?.marginDb).toBeCloseTo(20 - total, 9)
    expect(evaluation.allowances[0]?.judged.lane).toBe(2)
  })

  it('names lane 1 as it is without its lane value', () => {
    const { laneValues: _, ...budget } = parsed.budget
    const first = evaluate({ ...budget, laneValues: {} }, new Map())
    expect(first.allowances[0]?.lossDb).toBeCloseTo(0.5 + 6 * 0.85 + 1.2 + 9, 9)
    expect(README).toContain('loses 15.80 dB')
  })

  it('raises no flag but the one it wants to show', () => {
    const loud = evaluation.flags.filter(({ severity }) => severity !== 'notice')
    expect(loud.map(({ code, id }) => [code, id])).toEqual([['typical-not-maximum', 'connector']])
  })
})

describe('the rules of lib/budget/README.md', () => {
  it('name every model and every field that a lane may set', () => {
    for (const word of [...MODELS, ...LANE_FIELDS]) expect(README).toContain(`\`${word}\``)
    expect(Object.keys(SECTIONS)).toEqual(expect.arrayContaining(['lines', 'planes']))
  })
})
