import { createElement, type ReactNode } from 'react'
import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import { Ranked } from '../../../app/budgets/[id]/client/builds/Ranked'
import { SpreadDrawing } from '../../../app/budgets/[id]/client/builds/SpreadDrawing'
import { SpreadTable } from '../../../app/budgets/[id]/client/builds/SpreadTable'
import { FrequencyPanel } from '../../../app/budgets/[id]/client/frequency/FrequencyPanel'
import { OverFrequency } from '../../../app/budgets/[id]/client/frequency/OverFrequency'
import { LookContext, ReadingContext, ViewContext } from '../../../app/budgets/[id]/client/state/contexts'
import { evaluate } from '../../../lib/budget/evaluate'
import { budgetSchema } from '../../../lib/budget/schema'

const trace = {
  kind: 'trace',
  model: 'per-length',
  length: '5 in',
  rootTerm: '0.12 dB/in',
  linearTerm: '0.04 dB/in',
  validFrom: '0.01 GHz',
  validTo: '60 GHz',
  impedance: '95 Ω',
  delay: '170 ps/in',
  toleranceMinus: '6 %',
  tolerancePlus: '6 %',
}
const budget = budgetSchema.parse({
  head: {
    schemaVersion: 1,
    name: 'Rowan',
    bitRate: '53.125 Gb/s',
    rateType: 'line',
    code: 'PAM4',
    reference: '100 Ω',
    laneCount: 4,
    referenceTemperature: '25 °C',
  },
  planes: { tx: { order: 'a0', code: 'tx-ball' }, rx: { order: 'a9', code: 'rx-ball' } },
  lines: {
    first: { ...trace, order: 'a1', name: 'First trace' },
    bga: { order: 'a2', name: 'BGA via', kind: 'via', model: 'stated', loss: '0.6 dB', at: '13.28125 GHz' },
    second: { ...trace, order: 'a3', name: 'Second trace' },
  },
  allowances: {
    a: { order: 'a0', name: 'Rowan', limit: '12 dB', from: 'tx', to: 'rx', curve: '0.05..20 GHz: 1 + 0.5 sqrt(f)' },
  },
})
const evaluation = evaluate(budget, new Map(), { sweep: true, builds: 500 })
const [allowance] = evaluation.allowances
if (!allowance?.channel) throw new Error('it has an allowance with a cascade')
const { channel } = allowance

function rendered(part: ReactNode): string {
  const nothing = () => {}
  const look = { select: nothing, openDetail: nothing, showAllowance: nothing, goTo: nothing }
  const view = { budgetId: 'b', selected: null, detailOpen: false, allowance: 'a' }
  return renderToStaticMarkup(
    createElement(
      ReadingContext,
      { value: { budget, evaluation } },
      createElement(ViewContext, { value: view }, createElement(LookContext, { value: look }, part)),
    ),
  )
}

/** Outside source: WCAG 2.2, 1.1.1 (what a picture says is said in text) and 2.1.1 (keyboard). */
describe('the panels of the full evaluation', () => {
  it('over frequency: figures, the line that lacks data, and a table stand in text; the drawing is not read out', () => {
    const html = rendered(createElement(OverFrequency, { allowance, channel, evaluation }))
    for (const words of [
      '9.69 of 10.29 dB, 9.69 of it with reflection data',
      'unknown: not every line has reflection data',
      'Unknown: this line has no reflection data: BGA via.',
      'holds at one frequency',
      'missed from',
      'lies below Nyquist',
      '<th scope="col">frequency</th>',
    ])
      expect(html).toContain(words)
    expect(html).toMatch(/<input[^>]*type="range"[^>]*aria-valuetext="13\.2\d GHz: loss 9\.\d\d dB/)
  })
  it('builds: every way to look at the spread is a row, and the drawing is not read out', () => {
    const table = rendered(createElement(SpreadTable, { allowance }))
    expect(table).toContain('nominal, all 4 lanes alike')
    // 6 % of 9.69 dB at their ends: 10.29 + 0.58 dB, by hand.
    expect(table).toMatch(/worst case[^<]*<\/th><td>10\.87/)
    expect(table).toContain('99.7 % of random builds lose at most')
    expect(rendered(createElement(SpreadDrawing, { allowance }))).toMatch(/^<svg[^>]*aria-hidden="true"/)
  })
  it('the ranked tolerances lead to where they are typed', () => {
    const html = rendered(createElement(Ranked, { ranked: allowance.sensitivity ?? [] }))
    expect(html).toMatch(/<button[^>]*>First trace<\/button>/)
    expect(html).toContain('+0.29 dB')
    expect(rendered(createElement(Ranked, { ranked: [] }))).toContain('No line between the planes has a tolerance')
  })
  it('before anything is computed a panel says so', () => {
    const html = rendered(createElement(FrequencyPanel))
    expect(html).toContain('Being computed.')
    expect(html).toContain('aria-busy="true"')
  })
})
