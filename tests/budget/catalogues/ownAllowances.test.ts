import { describe, expect, it } from 'vitest'
import {
  allowanceEntry,
  allowanceFromCatalogue,
  allowanceToCatalogue,
  PUBLISHED_ALLOWANCES,
} from '../../../lib/budget/catalogues/allowances'
import { signallingOf } from '../../../lib/budget/signalling'
import { link } from '../links'

/** Common practice, no source: what is kept is what was typed. */
describe('an allowance of a budget as an entry of the own catalogue', () => {
  const budget = link({})
  const saved = (changes: Partial<(typeof budget.allowances)[string]> = {}) => {
    const allowance = budget.allowances.limit
    if (!allowance) throw new Error('the link has no allowance')
    return allowanceToCatalogue({ ...allowance, ...changes }, budget, signallingOf(budget.head).evaluation)
  }

  it('keeps limit, source and planes, and the interface of the link', () => {
    expect(saved({ body: 'Alder group', clause: 'Plan 3', note: ' Only with FEC. ' })).toMatchObject({
      name: 'Ball to ball',
      limit: '12 dB',
      at: '10 GHz',
      publishedFrom: 'tx-ball',
      publishedTo: 'rx-ball',
      body: 'Alder group',
      clause: 'Plan 3',
      confidence: 'own',
      bitRate: '20 Gb/s',
      code: 'NRZ',
      nyquist: '10 GHz',
      caution: 'Only with FEC.',
    })
  })

  it('keeps the planes that a source publishes before those of the budget', () => {
    expect(saved({ publishedFrom: 'tp0', from: null, to: null })).toMatchObject({
      publishedFrom: 'tp0',
      publishedTo: null,
    })
  })

  it('fits the schema of an entry, also with a long note that ends inside a character', () => {
    const { caution } = allowanceEntry.parse(saved({ note: `${'x'.repeat(398)}😀😀` }))
    expect(caution).toBe(`${'x'.repeat(398)}…`)
    expect(allowanceEntry.parse(saved()).caution).toBe(null)
  })

  it('comes back the same when it is taken again, and its note does not grow', () => {
    const published = PUBLISHED_ALLOWANCES.find(({ id }) => id === 'ieee-100g-kr4')
    if (!published) throw new Error('no entry')
    const planes = { tx: { order: 'a0', code: 'tp0' as const }, rx: { order: 'a1', code: 'tp5' as const } }
    const empty = link({ planes, allowances: {} })
    const taken = allowanceFromCatalogue(published, empty)
    const { allowances, ...rest } = link({ planes, allowances: { taken: { order: 'a0', ...taken } } })
    if (!allowances.taken) throw new Error('not taken')
    const again = allowanceToCatalogue(allowances.taken, { ...rest, allowances }, signallingOf(rest.head).evaluation)
    const retaken = allowanceFromCatalogue(again, empty)
    expect(retaken).toEqual(taken)
  })
})
