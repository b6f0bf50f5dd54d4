import fc from 'fast-check'
import { createElement } from 'react'
import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import { LevelDiagram } from '../../../app/diagram/LevelDiagram'
import { layoutLanding } from '../../../app/diagram/layoutLanding'
import { layoutLevels } from '../../../app/diagram/layoutLevels'
import { linkOf } from './links'

/** No outside source: whatever people type, the drawing has a place for every line and no number that is none. */
const loss = fc.option(fc.double({ min: 0, max: 60, noNaN: true }), { freq: 6 })
const length = fc.option(fc.double({ min: 0, max: 4000, noNaN: true }))
const row = fc.tuple(loss, length, fc.constantFrom('trace', 'via', 'overlap', 'reserve'), fc.constantFrom('a', 'b', ''))
const link = fc
  .record({
    rows: fc.array(row, { maxLength: 55 }),
    from: fc.nat(60),
    to: fc.nat(60),
    limitDb: fc.option(fc.double({ min: 0, max: 80, noNaN: true })),
    requiredMarginDb: fc.double({ min: 0, max: 10, noNaN: true }),
    sigma: fc.option(fc.double({ min: 0, max: 8, noNaN: true })),
    marginDb: fc.option(fc.double({ min: -60, max: 60, noNaN: true })),
  })
  .map(({ rows, from, to, limitDb, requiredMarginDb, sigma, marginDb }) => {
    const lines: Parameters<typeof linkOf>[2][number][] = rows.map(([db, inches, kind, assembly], at) => [
      `Line ${at}`,
      kind,
      assembly,
      db,
      'estimate',
      inches,
      0.1,
      `g${at % 4}`,
      'layout',
    ])
    const first = Math.min(from, lines.length)
    lines.splice(first, 0, 'p-from')
    lines.splice(Math.max(Math.min(to, lines.length), first + 1), 0, 'p-to')
    return linkOf('Any', { a: ['A', 'board'], b: ['B', 'cable'] }, lines, [
      { id: 'any', from: 'p-from', to: 'p-to', limitDb, requiredMarginDb, rssDb: sigma, marginDb, leftDb: limitDb },
    ])
  })

const numbersIn = (value: unknown): number[] => {
  if (typeof value === 'number') return [value]
  if (value instanceof Map) return []
  return typeof value === 'object' && value !== null ? Object.values(value).flatMap(numbersIn) : []
}

describe('any link', () => {
  it('has a drawing with a place for every line, and no number that is none', () => {
    fc.assert(
      fc.property(link, fc.integer({ min: 280, max: 1700 }), ({ budget, evaluation }, width) => {
        const state = { selected: 'l0', present: [], was: { marginDb: 1, words: 'x', line: 'l1' } }
        const geometry = layoutLevels(evaluation, budget, 'any', { width, height: 300 }, state)
        expect(numbersIn(geometry).filter((number) => !Number.isFinite(number))).toEqual([])
        expect(geometry.pieces).toHaveLength(Object.keys(budget.lines).length)
        for (const piece of geometry.pieces) {
          expect(piece.from.x).toBeGreaterThanOrEqual(-1e-6)
          expect(piece.to.x).toBeLessThanOrEqual(width + 1e-6)
          if (piece.place === 'inside') expect(piece.to.y).toBeLessThanOrEqual(300)
        }
        const landing = layoutLanding(evaluation, budget, 'any', { width: 200, height: 200 })
        expect(numbersIn(landing).filter((number) => !Number.isFinite(number))).toEqual([])
      }),
      { seed: 20252, numRuns: 150 },
    )
  })

  it('is rendered without NaN in its paths', () => {
    fc.assert(
      fc.property(link, fc.constantFrom(366, 1400), ({ budget, evaluation }, width) => {
        const props = { budget, evaluation, allowance: 'any', selected: null, onSelect: () => {}, present: [], width }
        const html = renderToStaticMarkup(createElement(LevelDiagram, props))
        expect(html).not.toMatch(/NaN|Infinity|undefined/)
      }),
      { seed: 20253, numRuns: 40 },
    )
  })
})
