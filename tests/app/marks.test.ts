import { createElement } from 'react'
import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import { LevelDiagram } from '../../app/diagram/LevelDiagram'
import { BasisStroke } from '../../app/marks/BasisStroke'
import { DisciplineGlyph, GLYPH_PATH } from '../../app/marks/DisciplineGlyph'
import { Pennant, personColour } from '../../app/marks/Pennant'
import { strokeShape } from '../../app/marks/strokes'
import { texturesOf } from '../../app/marks/texture'
import { VerdictMark } from '../../app/marks/VerdictMark'
import { BASES, OWNERS, VERDICTS } from '../../lib/budget/schema'
import { tamarack } from './diagram/links'

/** Outside source: WAI-ARIA 1.2, naming of 'img'; WCAG 2.2, 1.4.1 (colour is not the only means). */
describe('marks', () => {
  it('name themselves where no word stands beside them, and keep silent where one does', () => {
    const alone = renderToStaticMarkup(createElement(VerdictMark, { verdict: 'tight', word: false }))
    expect(alone).toContain('role="img"')
    expect(alone).toContain('aria-label="Tight"')
    const beside = renderToStaticMarkup(createElement(VerdictMark, { verdict: 'tight' }))
    expect(beside).toContain('aria-hidden="true"')
    expect(beside).toContain('>Tight<')
    expect(renderToStaticMarkup(createElement(DisciplineGlyph, { owner: 'test', named: true }))).toContain('"test"')
    expect(renderToStaticMarkup(createElement(BasisStroke, { basis: null, named: true }))).toContain('basis not said')
  })

  it('of the four verdicts differ without colour', () => {
    const drawings = VERDICTS.map((verdict) => {
      const html = renderToStaticMarkup(createElement(VerdictMark, { verdict, word: false }))
      return html.slice(html.indexOf('<path')).replace(/ class="[^"]*"/g, '')
    })
    expect(new Set(drawings).size).toBe(VERDICTS.length)
  })

  it('of the disciplines and bases differ in shape', () => {
    expect(new Set(OWNERS.map((owner) => GLYPH_PATH[owner])).size).toBe(OWNERS.length)
    const shapes = [...BASES, 'unsaid' as const].map((basis) => JSON.stringify(strokeShape(basis, 100)))
    expect(new Set(shapes).size).toBe(6)
  })

  it('of a basis stay apart on a short stroke: dashes shorten', () => {
    expect(strokeShape('estimate', 9).dash?.[0]).toBeLessThan(4)
    expect(strokeShape('measured', 9)).toEqual(strokeShape('measured', 100))
  })

  it('of people repeat five colours and underline the own initials', () => {
    expect([0, 1, 4, 5, 11, -1].map(personColour)).toEqual([1, 2, 5, 1, 2, 5])
    const person = { name: 'Maren Kupferloh', initials: 'MK', colour: 0, me: true }
    const html = renderToStaticMarkup(createElement(Pennant, { person }))
    expect(html).toContain('Maren Kupferloh (you)')
    expect(html).toContain('underline')
  })

  it('of boards alternate, so that two that touch are told apart', () => {
    const board = { kind: 'board' } as const
    const textures = texturesOf({ a: board, b: board, c: board, k: { kind: 'cable' } }, ['a', 'k', null, 'b', 'a', 'c'])
    expect([...textures]).toEqual([
      ['a', 'strata'],
      ['k', 'slant'],
      ['b', 'heavy-strata'],
      ['c', 'strata'],
    ])
  })
})

describe('the level diagram on the page', () => {
  const props = { ...tamarack, allowance: 'room', onSelect: () => {}, present: [], width: 1400 }
  const render = (selected: string | null) => renderToStaticMarkup(createElement(LevelDiagram, { ...props, selected }))

  it('says in words what it shows, and offers every line as a choice with one stop for the Tab key', () => {
    const html = render('l7')
    expect(html).toContain('27.20 of 28 dB used')
    expect(html.match(/role="option"/g)).toHaveLength(14)
    expect(html.match(/tabindex="0"/gi)).toHaveLength(1)
    expect(html).toContain('aria-label="7 Backplane stripline L14, 9.20 dB, estimate"')
    expect(html.match(/aria-selected="true"/g)).toHaveLength(1)
  })

  it('hides the picture itself from who cannot see it', () => {
    expect(render(null)).toMatch(/<svg[^>]*aria-hidden="true"/)
  })

  it('gives its patterns ids that no second drawing on the page has', () => {
    const two = renderToStaticMarkup(
      createElement(
        'div',
        null,
        createElement(LevelDiagram, { ...props, selected: null }),
        createElement(LevelDiagram, { ...props, selected: null }),
      ),
    )
    const ids = [...two.matchAll(/ id="([^"]+)"/g)].map(([, id]) => id)
    expect(ids.length).toBeGreaterThan(6)
    expect(new Set(ids).size).toBe(ids.length)
  })
})
