import { describe, expect, it } from 'vitest'
import * as Y from 'yjs'
import { allowanceRow } from '../../../app/budgets/[id]/client/catalogue/allowanceRow'
import { filled } from '../../../app/budgets/[id]/client/catalogue/filled'
import { FOIL_ROWS, laminateRow, packageRow } from '../../../app/budgets/[id]/client/catalogue/lineRows'
import { serverEntries } from '../../../app/budgets/[id]/client/catalogue/ownEntries'
import { type CatalogueRow, matching } from '../../../app/budgets/[id]/client/catalogue/row'
import { addRecord } from '../../../app/budgets/[id]/client/deeds/records'
import { allowanceFromCatalogue, PUBLISHED_ALLOWANCES } from '../../../lib/budget/catalogues/allowances'
import { LAMINATE_CLASSES } from '../../../lib/budget/catalogues/laminates'
import { PUBLISHED_PACKAGES } from '../../../lib/budget/catalogues/packages'
import { applyEdit } from '../../../lib/sheet/edits'
import { createDoc, readBudget, seedUpdate } from '../../../lib/sheet/seed'
import { link } from '../../budget/links'

const planes = { tx: { order: 'a0', code: 'tp0' as const }, rx: { order: 'a1', code: 'rx-ball' as const } }
const budget = link({ planes, allowances: {} })
const NYQUIST = 12.890625e9
const rows = PUBLISHED_ALLOWANCES.map(({ id, ...entry }) => allowanceRow(id, entry, budget, NYQUIST, null))
const row = (id: string) => {
  const found = rows.find((one) => one.id === id)
  if (!found) throw new Error(`no row ${id}`)
  return found
}

describe('the catalogue of allowances on screen', () => {
  it('says limit, frequency, planes, source, confidence and split, and which planes the budget lacks', () => {
    expect(row('ieee-caui4-c2m')).toMatchObject({
      title: 'CAUI-4, 25GAUI chip to module',
      figure: '10 dB at 12.890625 GHz',
      facts: [
        'TX ball to module ball (TX ball and module ball not in this budget)',
        'IEEE 802.3, 802.3bm Annex 83E, 802.3by Annex 109B',
        'NRZ 25.78125 Gb/s',
        'two sources',
        'informative budget',
        'with a limit curve',
        'Split: Host 7.3 dB + Connector 1.2 dB + Module 1.5 dB',
      ],
      fits: true,
    })
    expect(row('ieee-100g-kr4').facts[0]).toBe('TP0 to TP5 (TP5 not in this budget)')
    expect(row('pcie-5').figure).toBe('no single limit at 2.5 GHz')
    expect(row('ieee-100g-cr1').facts.at(-1)).toContain("dB − Mated fixture at the transmitter's end 6.6 dB − ")
  })

  it('shows no address of a web page', () => {
    expect(JSON.stringify(rows)).not.toMatch(/https?:|www\./)
  })

  it('finds entries by any words in any order, those of the rate of the link first', () => {
    const found = matching(rows, ' memory  BALL cei ').map(({ id }) => id)
    expect(found).toContain('oif-112g-mr')
    expect(found.every((id) => id.startsWith('oif-'))).toBe(true)
    expect(matching(rows, 'no such words')).toEqual([])
    const all = matching(rows, '')
    expect(all).toHaveLength(rows.length)
    const firstOther = all.findIndex(({ fits }) => !fits)
    expect(firstOther).toBeGreaterThan(0)
    expect(all.slice(firstOther).some(({ fits }) => fits)).toBe(false)
  })

  it('finds an entry of this server by who added it', () => {
    const own: CatalogueRow<null> = {
      ...{ id: 'own', entry: null, title: 'Alder', figure: '', facts: [], caution: null, fits: false },
      own: { personName: 'Ada', mayRemove: false },
    }
    expect(matching([own], 'ada')).toEqual([own])
  })
})

it.each(PUBLISHED_ALLOWANCES.map((entry) => [entry.id, entry] as const))(
  '%s is taken into the shared document through its own rules',
  (_, entry) => {
    const doc = createDoc()
    Y.applyUpdate(doc, seedUpdate(budget))
    const { operations, id } = addRecord(budget, 'allowances', filled(allowanceFromCatalogue(entry, budget)))
    expect(applyEdit(doc, operations)).toMatchObject({ ok: true })
    expect(readBudget(doc).allowances[id]).toMatchObject({
      name: entry.name,
      limit: entry.limit,
      note: expect.stringContaining('your own copy of the standard wins'),
    })
  },
)

describe('what is suggested for lines', () => {
  it('says values, ranges, basis and how sure they are', () => {
    const [laminate] = LAMINATE_CLASSES.map(({ id, ...entry }) => laminateRow(id, entry, null))
    expect(laminate).toMatchObject({
      figure: 'Dk 4.2 Df 0.02 at 10 GHz',
      facts: ['Dk 4 to 4.6', 'Df 0.015 to 0.025', 'estimate, ±25 %', 'from memory'],
    })
    const bj = PUBLISHED_PACKAGES.filter(({ id }) => id === 'ck-31mm').map(({ id, ...entry }) =>
      packageRow(id, entry, null),
    )
    expect(bj[0]).toMatchObject({ title: 'Package of 802.3ck, 31 mm', figure: '31 mm of 87.5 Ω' })
    expect(bj[0]?.facts).toEqual([
      'then 1.8 mm of 92.5 Ω',
      'ball 87 fF',
      'die pad 120 fF, a line of its own',
      'IEEE 802.3, 802.3ck',
      'from memory',
    ])
    expect(FOIL_ROWS[0]).toMatchObject({ figure: 'Rz 8 µm', facts: ['Rz 6 µm to 10 µm', 'read in a source'] })
  })
})

describe('the entries of this server, as the API answers them', () => {
  const { id: _, ...entry } = PUBLISHED_ALLOWANCES[0] ?? { id: '' }
  const item = { id: 'e1', kind: 'allowance', entry, person: 'p1', personName: 'Ada', time: 1, mayRemove: true }

  it('are read, and what is no entry is left out', () => {
    const broken = [null, 7, { ...item, id: 8 }, { ...item, kind: 'colour' }, { ...item, entry: { limit: 'much' } }]
    expect(serverEntries({ entries: [...broken, item] })).toEqual([
      { id: 'e1', kind: 'allowance', entry, personName: 'Ada', mayRemove: true },
    ])
  })

  it.each([null, 'text', [], {}, { entries: 'text' }])('are none where the answer is %j', (answer) => {
    expect(serverEntries(answer)).toEqual([])
  })
})
