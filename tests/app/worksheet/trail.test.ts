import { describe, expect, it } from 'vitest'
import { marginSteps, roundTicks } from '../../../app/budgets/[id]/client/trail/margins'
import { deedsOf, effectWords, touches } from '../../../app/budgets/[id]/client/trail/trailWords'
import { joined } from '../../../app/budgets/[id]/client/trail/useTrail'
import { budgetSchema } from '../../../lib/budget/schema'
import type { Change } from '../../../lib/sheet/change'
import type { Effect, EffectSide, TrailEntry } from '../../../lib/sheet/wire'

const budget = budgetSchema.parse({
  head: { schemaVersion: 1, name: 'Tamarack' },
  planes: { tx: { order: 'a0', code: 'tx-ball' } },
  lines: { l14: { order: 'a1', name: 'Backplane stripline L14', covers: 'breakout-a' } },
})
const change = (values: Partial<Change>): Change =>
  ({ section: 'lines', id: 'l14', field: 'lossPerLength', kind: 'set', before: null, after: null, ...values }) as Change
const what = (...changes: Change[]) => deedsOf({ kind: 'edit', changes }, budget).map((deed) => deed.what)
const side = (marginDb: number | null, verdict = 'tight', knownDb = 20): EffectSide => ({ verdict, marginDb, knownDb })
const effect = (before: EffectSide, after: EffectSide): Effect => ({ allowance: 'a', name: 'Fabric', before, after })
const entry = (seq: number, effects: Effect[] = [], changes: Change[] = []): TrailEntry => ({
  seq,
  epoch: 1,
  kind: 'edit',
  editId: `e${seq}`,
  person: 'maren',
  personName: 'Maren',
  door: 'screen',
  time: seq * 1000,
  changes,
  effects,
  hash: '',
})

describe('what an entry did, in words', () => {
  it('names the field as the worksheet does, and says from what to what', () => {
    expect(what(change({ before: '0.84 dB/in', after: '0.80 dB/in' }))).toEqual([
      'loss per length 0.84 dB/in → 0.80 dB/in',
    ])
    expect(what(change({ field: 'basis', before: null, after: 'measured' }))).toEqual(['basis nothing → measured'])
    expect(what(change({ field: 'covers', before: '', after: 'breakout-a breakout-b' }))).toEqual([
      'covers nothing → breakout A, breakout B',
    ])
  })
  it('a new record is one deed, whatever it came with', () => {
    const added = ['name', 'kind', 'loss'].map((field) => change({ kind: 'add', field, after: 'via' }))
    expect(what(...added)).toEqual(['new line'])
  })
  it('taking out, putting back and moving have words of their own', () => {
    expect(what(change({ field: 'removed', before: false, after: true }))).toEqual(['taken out'])
    expect(what(change({ field: 'removed', before: true, after: false }))).toEqual(['put back'])
    expect(what(change({ field: 'order', before: 'a1', after: 'a2' }))).toEqual(['moved'])
  })
  it('an overtaken write says what stands', () => {
    expect(what(change({ kind: 'overtaken', before: '1 dB/in', after: '2 dB/in', written: '3 dB/in' }))).toEqual([
      'loss per length: 3 dB/in arrived late, 2 dB/in stands',
    ])
  })
  it('a value of a lane belongs to its line', () => {
    const lane = change({ section: 'laneValues', field: '7/length', before: '5 in', after: '6 in' })
    expect(deedsOf({ kind: 'edit', changes: [lane] }, budget)).toMatchObject([
      { subject: 'Backplane stripline L14', what: 'length of lane 7 5 in → 6 in' },
    ])
    expect(touches({ changes: [lane] }, 'lines', 'l14')).toBe(true)
    expect(touches({ changes: [lane] }, 'lines', 'other')).toBe(false)
  })
})

describe('what an entry did to a margin', () => {
  it('is signed, towards the ground or away from it', () => {
    expect(effectWords(effect(side(0.34), side(0.8)))).toMatchObject({ figure: '+0.46', sign: 'better' })
    expect(effectWords(effect(side(1.91), side(0.02)))).toMatchObject({ figure: '−1.89', sign: 'worse' })
    expect(effectWords(effect(side(0.34), side(0.34)))).toBeNull()
  })
  it('says when the verdict changed, also with the same margin', () => {
    expect(effectWords(effect(side(0.3), side(-0.2, 'over')))).toMatchObject({
      said: 'margin of Fabric, tight → over',
    })
    expect(effectWords(effect(side(2), side(2, 'inside')))).toMatchObject({ figure: '±0.00', sign: 'same' })
  })
  it('of an undecided allowance it is the known loss, where more is worse', () => {
    expect(effectWords(effect(side(null, 'undecided', 20), side(null, 'undecided', 21)))).toMatchObject({
      figure: '+1.00',
      sign: 'worse',
    })
  })
  it('the first margin stands for itself', () => {
    expect(effectWords(effect(null, side(0.8)))).toMatchObject({ figure: '0.80', said: 'first margin of Fabric' })
  })
})

describe('the margin over the trail', () => {
  it('goes from old to new, and is broken where it was undecided', () => {
    const entries = [
      entry(4, [effect(side(null, 'undecided'), side(0.8))]),
      entry(3, [effect(side(1), side(null, 'undecided'))]),
      entry(2),
      entry(1, [effect(null, side(1))]),
    ]
    expect(marginSteps(entries, 'a').map(({ seq, marginDb }) => [seq, marginDb])).toEqual([
      [1, 1],
      [3, null],
      [4, 0.8],
    ])
    expect(marginSteps(entries, 'other')).toEqual([])
  })
  it('two stretches of the trail become one', () => {
    expect(joined([entry(5), entry(4)], [entry(4), entry(2)]).map(({ seq }) => seq)).toEqual([5, 4, 2])
  })
  it('its axis has few and round numbers', () => {
    expect(roundTicks(-0.4, 1.7)).toEqual([0, 0.5, 1, 1.5])
    expect(roundTicks(-12, 3)).toEqual([-10, -5, 0])
    expect(roundTicks(-0.05, 0.3)).toEqual([0, 0.1, 0.2, 0.3])
  })
})
