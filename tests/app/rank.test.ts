import { describe, expect, it } from 'vitest'
import { decidingAllowance, worstFirst } from '../../app/home/rank'
import type { Evaluation } from '../../lib/budget/evaluation'
import type { BudgetSummary } from '../../lib/sync/services'
import { osier, sedge, tamarack, upstream } from './diagram/links'

const summary = (name: string, evaluation: Evaluation, locked: string | null = null): BudgetSummary => ({
  id: name,
  name,
  description: '',
  role: 'viewer',
  verdict: evaluation.verdict,
  evaluation,
  seq: 1,
  lastChange: null,
  locked,
})

describe('the list of budgets', () => {
  it('begins with the locked, then over, undecided, tight, inside', () => {
    const given = [
      summary('inside', sedge.evaluation),
      summary('tight', { ...tamarack.evaluation, allowances: tamarack.evaluation.allowances.slice(0, 1) }),
      summary('locked', sedge.evaluation, 'The journal lacks entry 7.'),
      summary('undecided', upstream.evaluation),
      summary('over', osier.evaluation),
    ]
    expect(worstFirst(given).map(({ name }) => name)).toEqual(['locked', 'over', 'undecided', 'tight', 'inside'])
  })

  it('puts the smaller margin first where verdicts are alike, then the name', () => {
    const [allowance] = osier.evaluation.allowances
    if (!allowance) throw new Error('osier has an allowance')
    const worse = { ...osier.evaluation, allowances: [{ ...allowance, marginDb: -4 }] }
    const given = [summary('b', osier.evaluation), summary('a', osier.evaluation), summary('z', worse)]
    expect(worstFirst(given).map(({ name }) => name)).toEqual(['z', 'a', 'b'])
  })

  it('shows the allowance that decides: of those with the verdict of the budget, the one with least air', () => {
    expect(decidingAllowance({ ...tamarack.evaluation, verdict: 'over' })?.id).toBe('hot')
    expect(decidingAllowance({ ...tamarack.evaluation, allowances: [] })).toBeNull()
  })
})
