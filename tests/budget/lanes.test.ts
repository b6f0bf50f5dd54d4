import { describe, expect, it } from 'vitest'
import { evaluate } from '../../lib/budget/evaluate'
import type { BudgetFile } from '../../lib/budget/schema'
import { line, link } from './links'

const HEAD = { ...link({}).head, laneCount: 4 }
const BASE = { ...link({}).allowances.limit, order: 'a0' }
const LOSS_CLASSES = {
  c: { order: 'a0', name: 'L3', lossPerLength: '1 dB/in', at: '10 GHz' },
  d: { order: 'a1', name: 'L5', lossPerLength: '2 dB/in', at: '10 GHz' },
}
const LINES = {
  t: line('a1', null, { kind: 'trace', model: 'class', lossClass: 'c', length: '5 in' }),
  u: line('a2', null, { kind: 'trace', model: 'class', lossClass: 'c', length: '3 in' }),
  v: line('a3', '1 dB', { kind: 'via' }),
}

function run(laneValues: BudgetFile['laneValues'], more: Partial<BudgetFile> = {}) {
  const evaluation = evaluate(
    link({ head: HEAD, lossClasses: LOSS_CLASSES, lines: LINES, laneValues, ...more }),
    new Map(),
  )
  const [allowance] = evaluation.allowances
  if (!allowance) throw new Error('no allowance')
  return { allowance, evaluation, codes: evaluation.flags.map(({ code, id }) => `${code} ${id}`) }
}

describe('lanes', () => {
  it('say instead of their lines; the worst lane decides, whole (by hand)', () => {
    // Lane 1: 5 + 3 + 1 = 9; lane 2: 6 + 2 + 1 = 9; lane 3: 5.5 + 4 + 1 = 10.5; lane 4 stands for no other.
    const { allowance, evaluation } = run({
      't/2/length': '6 in',
      'u/2/length': '2 in',
      't/3/length': '5.5 in',
      'u/3/length': '4 in',
    })
    expect(allowance.lossDb).toBeCloseTo(10.5, 12)
    expect(allowance.judged).toEqual({
      corner: 'reference corner',
      statistic: 'nominal',
      lane: 3,
      lanes: 4,
      shortestLane: expect.any(Number),
      movedDb: null,
      unmovedDb: null,
    })
    expect(allowance.lines.map(({ countedDb }) => countedDb)).toEqual([5.5, 4, 1].map((db) => expect.closeTo(db, 12)))
    expect(evaluation.lines.t).toMatchObject({ lane: 2, loss: { nominalDb: expect.closeTo(6, 12) } })
    expect(evaluation.lines.v).toMatchObject({ lane: null, loss: { nominalDb: 1 } })
  })

  it('that say nothing are all alike', () => {
    expect(run({ 't/2/length': null }).allowance.judged).toMatchObject({ lane: null, lanes: 4 })
  })

  it('are judged at the one that the allowance names', () => {
    const values = { 't/3/length': '7 in' }
    const named = (judgedLane: number) => run(values, { allowances: { limit: { ...BASE, judgedLane } } })
    expect(run(values).allowance).toMatchObject({ lossDb: expect.closeTo(11, 12), judged: { lane: 3 } })
    expect(named(3).allowance.lossDb).toBeCloseTo(11, 12)
    expect(named(1).allowance).toMatchObject({ lossDb: expect.closeTo(9, 12), judged: { lane: 1 } })
    expect(named(5).allowance).toMatchObject({
      verdict: 'undecided',
      words: 'undecided: it is to be judged at lane 5, and the link has 4 lanes',
    })
    expect(named(5).codes).toEqual(['judged-lane-missing limit'])
  })

  it('have their own loss class, loss and skew', () => {
    expect(run({ 't/2/lossClass': 'd' }).allowance.lossDb).toBeCloseTo(14, 12)
    expect(run({ 'v/2/loss': '1.5 dB' }).allowance.lossDb).toBeCloseTo(9.5, 12)
    expect(run({ 'v/2/skew': '10 ps' }).allowance.lossDb).toBeCloseTo(9 - 20 * Math.log10(Math.cos(Math.PI / 10)), 12)
  })

  it('one lane without a number makes the allowance undecided, and one over makes it over', () => {
    const gone = run({ 't/2/lossClass': 'nothing', 't/3/lossClass': 'nothing' })
    expect(gone.allowance).toMatchObject({ verdict: 'undecided', judged: { lane: 2 }, undecidedLines: ['t'] })
    expect(gone.evaluation.flags).toEqual([
      expect.objectContaining({
        code: 'class-missing',
        message: "'Line a1': its loss class does not exist or was taken out. (lanes 2, 3)",
      }),
    ])
    expect(run({ 't/2/lossClass': 'nothing', 't/4/length': '9 in' }).allowance).toMatchObject({
      verdict: 'over',
      judged: { lane: 4 },
    })
  })

  it('the shortest lane is held against the least loss', () => {
    const { allowance } = run({ 't/2/length': '1 in' }, { allowances: { limit: { ...BASE, leastLoss: '6 dB' } } })
    expect(allowance).toMatchObject({
      verdict: 'tight',
      judged: { lane: 2 },
      words: 'tight: 1.00 dB under the least loss of 6.00 dB',
    })
  })

  it('beyond the lane count do not count, and say so', () => {
    const { allowance, codes, evaluation } = run({ 't/5/length': '9 in', 't/7/length': '9 in' })
    expect(allowance.lossDb).toBeCloseTo(9, 12)
    expect(codes).toEqual(['lane-beyond-count t'])
    expect(evaluation.flags[0]?.message).toBe(
      "'Line a1': values are given for lanes 5, 7; the link has 4 lanes, so they do not count.",
    )
  })

  it('without a lane count, the highest lane with a value is the last', () => {
    expect(run({ 't/3/length': '6 in' }, { head: { ...HEAD, laneCount: null } }).allowance.judged).toMatchObject({
      lane: 3,
      lanes: 3,
    })
  })

  it('that all differ leave the line’s own value out', () => {
    const shorter = Object.fromEntries([1, 2, 3, 4].map((lane) => [`t/${lane}/length`, `${lane} in`]))
    expect(run(shorter)).toMatchObject({
      allowance: { lossDb: expect.closeTo(8, 12), judged: { lane: 4 } },
      evaluation: { lines: { t: { loss: { nominalDb: expect.closeTo(4, 12) } } } },
    })
  })
})
