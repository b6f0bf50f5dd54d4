import { createElement } from 'react'
import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import { BudgetRow } from '../../app/home/BudgetRow'
import type { BudgetSummary } from '../../lib/sync/services'
import { type Link, osier, tamarack, upstream } from './diagram/links'

const summary = ({ evaluation }: Link, locked: string | null = null): BudgetSummary => ({
  id: 'b1',
  name: 'Osier',
  description: 'accelerator slot',
  role: 'viewer',
  verdict: evaluation.verdict,
  evaluation,
  seq: 3,
  lastChange: { personName: 'Maren Kupferloh', time: Date.UTC(2025, 10, 3, 14, 31) },
  locked,
})
const render = (link: Link, locked: string | null = null, budget: Link['budget'] | null = link.budget) =>
  renderToStaticMarkup(createElement(BudgetRow, { summary: summary(link, locked), budget }))

describe('one budget in the list', () => {
  it('says verdict, margin, conditions, overrun shares, basis and who changed it last', () => {
    const html = render(osier)
    for (const words of [
      'Over',
      '−1.11',
      '25 °C, dry · nominal · lane 11, the worst of 16',
      '37.11 of 36 dB used',
      'System board: 1.16 dB past its share',
      '26.12 simulated',
      'Maren Kupferloh',
      'href="/budgets/b1"',
    ]) {
      expect(html).toContain(words)
    }
  })

  it('says what is left where lines have no number', () => {
    const html = render(upstream)
    expect(html).toContain('Undecided')
    expect(html).toContain('9.19')
    expect(html).toContain('dB left')
  })

  it('that is locked says why, shows no verdict and opens nothing', () => {
    const html = render(osier, 'The journal lacks entry 7. Tell the administrator.')
    expect(html).toContain('Locked')
    expect(html).toContain('The journal lacks entry 7.')
    expect(html).not.toContain('href=')
    expect(html).not.toContain('−1.11')
    expect(render(osier, null, null)).not.toContain('−1.11')
  })

  it('without an allowance says so and claims no margin', () => {
    const link = { ...tamarack, evaluation: { ...tamarack.evaluation, verdict: 'undecided' as const, allowances: [] } }
    const html = render(link)
    expect(html).toContain('No allowance yet')
    expect(html).not.toContain('dB margin')
  })
})
