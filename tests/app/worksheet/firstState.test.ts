import { readFileSync } from 'node:fs'
import { createElement } from 'react'
import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import type { FirstState } from '../../../app/budgets/[id]/client/state/useSheet'
import { Worksheet } from '../../../app/budgets/[id]/client/Worksheet'
import { type Budget, budgetSchema } from '../../../lib/budget/schema'
import type { Role } from '../../../lib/sheet/wire'

const scenario = new URL('../../../seed-scenarios/tamarack.json', import.meta.url)
const tamarack = budgetSchema.parse(JSON.parse(readFileSync(scenario, 'utf8')))

/** The page as the server sends it: before any script has run. */
function sent(budget: Budget, role: Role = 'editor'): string {
  const first: FirstState = { budgetId: 'tamarack', person: 'maren', role, budget, trail: [] }
  return renderToStaticMarkup(createElement(Worksheet, { first }))
}
const count = (page: string, pattern: RegExp) => page.match(pattern)?.length ?? 0

describe('the worksheet before its socket is open', () => {
  const page = sent(tamarack)
  it('shows the verdict of practice.md, example C1, and its sums', () => {
    expect(page).toContain('Tight')
    expect(page).toContain('0.80')
    expect(page).toContain('27.20 of 28 dB used')
    expect(page).toContain('worst case 29.78 dB')
  })
  it('has a row for every line and plane, in channel order', () => {
    const rows = [...page.matchAll(/data-row="([^"]+)"/g)].map((match) => match[1])
    expect(rows).toHaveLength(Object.keys(tamarack.lines).length + Object.keys(tamarack.planes).length)
    expect(page.indexOf('TX package')).toBeLessThan(page.indexOf('RX package'))
  })
  it('sets lines outside the allowance in brackets', () => {
    expect(page).toContain('(3.10)')
    expect(page).not.toContain('(4.75)')
  })
  it('cannot be typed in, and claims nothing about saving', () => {
    expect(page).not.toMatch(/<(input|select|textarea)[^>]*data-unsaved/)
    expect(count(page, /aria-readonly="false"/g)).toBe(0)
    expect(page).toContain('Connecting')
    expect(page).not.toContain('Everything saved')
  })
  it('never says compliant', () => expect(page.toLowerCase()).not.toContain('compliant'))
})

describe('a line without a number', () => {
  it('is a question mark, and the allowance says what is left for how many lines', () => {
    const id = Object.keys(tamarack.lines).find((each) => tamarack.lines[each]?.name === 'Backplane via, near')
    if (id === undefined) throw new Error('The scenario has lost its backplane via.')
    const line = tamarack.lines[id]
    if (!line) throw new Error(`There is no line ${id}.`)
    const page = sent({ ...tamarack, lines: { ...tamarack.lines, [id]: { ...line, loss: null } } })
    expect(page).toContain('Undecided')
    expect(page).toContain('no number')
    // 28 − (27.20 − 0.65) = 1.45
    expect(page).toContain('1.45')
    expect(page).toContain('1 line without a number')
  })
})

describe('an empty budget', () => {
  it('says that there is nothing to judge by, and opens the signalling', () => {
    const page = sent(budgetSchema.parse({ head: { schemaVersion: 1 } }))
    expect(page).toContain('no allowance yet')
    expect(page).toContain('Nyquist unknown')
    expect(page).toMatch(/<details[^>]* open/)
  })
})
