import { describe, expect, it } from 'vitest'
import { cascadeFacts, curveWords, returnLossWords } from '../../../app/budgets/[id]/client/frequency/cascadeFacts'
import { chartRows, drawnOf, frameOf } from '../../../app/budgets/[id]/client/frequency/chartRows'
import { drawnPoints, nearest } from '../../../app/budgets/[id]/client/frequency/drawn'
import { noReflectionWords, withoutBand, withoutReflection } from '../../../app/budgets/[id]/client/frequency/lacking'
import { nothingWords } from '../../../app/budgets/[id]/client/frequency/nothingWords'
import { powerOf } from '../../../app/budgets/[id]/client/frequency/power'
import { readoutWords, tableRows } from '../../../app/budgets/[id]/client/frequency/readoutWords'
import { wholeWords } from '../../../app/budgets/[id]/client/whole/wholeWords'
import { evaluate } from '../../../lib/budget/evaluate'
import type { ChannelEvaluation } from '../../../lib/budget/evaluation'
import { budgetSchema } from '../../../lib/budget/schema'

/** Two traces by their terms, a via that is only stated, and a limit curve that the cascade misses at the top of its range. */
function link(lines: Readonly<Record<string, object>>, allowance: object = {}) {
  const budget = budgetSchema.parse({
    head: {
      schemaVersion: 1,
      name: 'Rowan',
      bitRate: '53.125 Gb/s',
      rateType: 'line',
      code: 'PAM4',
      reference: '100 Ω',
      referenceTemperature: '25 °C',
    },
    planes: { tx: { order: 'a0', code: 'tx-ball' }, rx: { order: 'az', code: 'rx-ball' } },
    lines: Object.fromEntries(
      Object.entries(lines).map(([id, line], at) => [id, { order: `a${at + 1}`, name: id, kind: 'trace', ...line }]),
    ),
    allowances: { a: { order: 'a0', name: 'Rowan', limit: '12 dB', from: 'tx', to: 'rx', ...allowance } },
  })
  const evaluation = evaluate(budget, new Map(), { sweep: true, builds: 0 })
  const [first] = evaluation.allowances
  if (!first) throw new Error('it has an allowance')
  return { budget, evaluation, allowance: first }
}

const terms = {
  model: 'per-length',
  length: '5 in',
  rootTerm: '0.12 dB/in',
  linearTerm: '0.04 dB/in',
  validFrom: '0.01 GHz',
  validTo: '30 GHz',
}
const via = { kind: 'via', model: 'stated', loss: '0.6 dB', at: '13.28125 GHz' }

function channelOf({ allowance }: ReturnType<typeof link>): ChannelEvaluation {
  if (!allowance.channel) throw new Error('there is a cascade')
  return allowance.channel
}

describe('which points of a trace are drawn', () => {
  it('a notch of one point is drawn, however few points there are', () => {
    const values = Array.from({ length: 2000 }, (_, at) => (at === 1234 ? 60 : at / 200))
    const drawn = drawnPoints(2000, [values], [], 100)
    expect(drawn.length).toBeLessThanOrEqual(100)
    expect(drawn).toContain(1234)
    expect([drawn[0], drawn.at(-1)]).toEqual([0, 1999])
    expect(drawn).toEqual([...new Set(drawn)].sort((a, b) => a - b))
  })
  it('a gap stays a gap, and what is asked for is among them', () => {
    const values = Array.from({ length: 2000 }, (_, at) => (at === 777 ? null : 1))
    expect(drawnPoints(2000, [values, values], [1500], 60)).toEqual(expect.arrayContaining([777, 1500]))
  })
  it('a short trace is drawn whole', () => {
    expect(drawnPoints(5, [[1, 2, 3, 4, 5]], [], 400)).toEqual([0, 1, 2, 3, 4])
  })
  it('the nearest point of a grid', () => {
    expect([0, 12, 26, 99].map((hz) => nearest([10, 20, 30], hz))).toEqual([0, 0, 2, 2])
  })
})

describe('the cascade over frequency', () => {
  const one = link({ first: terms, bga: via, second: terms }, { curve: '0.05..20 GHz: 1 + 0.5 sqrt(f) + 0.1 f' })
  const channel = channelOf(one)
  const marks = [one.allowance.atHz, channel.curve?.missed?.worstAtHz]
  const drawn = drawnOf(channel, marks)
  const frame = frameOf(one.allowance.limitDb, channel, one.evaluation.signalling.symbolRate)
  const rows = chartRows(channel, drawn, frame, null)

  it('is drawn with at most 400 points and those that are spoken of, each a point of the evaluation', () => {
    expect(channel.trace.hz.length).toBeGreaterThan(400)
    expect(rows.length).toBeLessThanOrEqual(400)
    rows.forEach(({ hz, loss, limit }, row) => {
      const at = drawn[row] ?? -1
      expect([hz, loss, limit]).toEqual([
        channel.trace.hz[at],
        channel.trace.lossDb[at],
        channel.trace.limitDb?.[at] ?? null,
      ])
    })
    const step = (channel.trace.hz[1] ?? 0) - (channel.trace.hz[0] ?? 0)
    for (const mark of marks) expect(Math.min(...rows.map(({ hz }) => Math.abs(hz - (mark ?? 0))))).toBeLessThan(step)
  })
  it('the drawn fit is the evaluated one at the frequency of the allowance, and ends at the symbol rate', () => {
    const at = channel.trace.hz.map((hz) => Math.abs(hz - 13.28125e9))
    const [row] = chartRows(channel, [at.indexOf(Math.min(...at))], frame, null)
    expect(row?.fitted).toBeCloseTo(channel.fittedDb ?? Number.NaN, 1)
    for (const { hz, fitted } of rows) expect(fitted === null).toBe(hz > 26.5625e9)
  })
  it('the whole ground lies between the limit and the foot', () => {
    for (const { ground } of rows) if (ground) expect(ground[0]).toBeLessThanOrEqual(ground[1])
    expect(frame.footDb).toBeGreaterThan(12)
  })
  it('says which lines are not in it, which do not reflect, and what to give', () => {
    expect(withoutBand(one.budget, one.allowance)).toEqual([
      { id: 'bga', name: 'bga', give: expect.stringContaining('holds at one frequency') },
    ])
    expect(withoutReflection(one.budget, one.allowance).map(({ id, give }) => [id, give])).toEqual([
      ['first', 'give its impedance, delay and length'],
      ['second', 'give its impedance, delay and length'],
    ])
  })
  it('an unknown return loss names the lines that it fails on', () => {
    expect(noReflectionWords(one.budget, one.allowance)).toBe(
      'Unknown: these lines have no reflection data: bga, first, second.',
    )
  })
  it('its figures in words: unknown is said, not passed', () => {
    const facts = new Map(cascadeFacts(one.allowance, channel).map(({ term, value }) => [term, value]))
    // 2 × 5 in × (0.12 √13.28125 + 0.04 × 13.28125) dB/in = 9.69 dB, by hand; the via adds 0.60 to the whole.
    expect(facts.get('in the cascade')).toBe('9.69 of 10.29 dB, 0.00 of it with reflection data')
    expect(facts.get('return loss')).toBe('unknown: not every line has reflection data')
    expect(facts.get('deviation from the fit')).toBe('unknown: not every line has reflection data')
    expect(facts.get('loss at 13.28125 GHz')).toBe('cascade 9.69 dB, fitted 9.69 dB, sum of the same lines 9.69 dB')
  })
  it('a missed curve is named with where and by how much', () => {
    expect(channel.curve?.missed).not.toBeNull()
    expect(curveWords({ ...channel, curve: { whole: true, missed: null } })).toBe('kept over its whole range')
    expect(curveWords({ ...channel, curve: { whole: false, missed: null } })).toContain('unknown')
    expect(curveWords({ ...channel, curve: null })).toBeNull()
    expect(curveWords(channel)).toMatch(
      /^missed from [\d.]+ GHz to 20 GHz, most at [\d.]+ GHz, by [\d.]+ dB; not every line/,
    )
  })
  it('the readout names the figures of one point, and on which side of the ground it lies', () => {
    const row = { hz: 13.28125e9, ghz: 13.28125, loss: 9.7, fitted: 9.69, limit: 9.5, back: null }
    expect(readoutWords({ ...row, ground: null, cloud: null })).toBe(
      '13.28 GHz: loss 9.70 dB · fitted 9.69 dB · limit 9.50 dB · under the ground',
    )
    expect(readoutWords({ ...row, loss: null, limit: null, back: 12, ground: null, cloud: null })).toBe(
      '13.28 GHz: nothing passes · fitted 9.69 dB · return loss 12.00 dB',
    )
  })
  it('the table has some rows over the band and those that are spoken of', () => {
    const shown = tableRows(rows, marks)
    expect(shown.length).toBeGreaterThan(8)
    expect(shown.length).toBeLessThan(16)
    for (const row of shown) expect(rows).toContain(row)
  })
})

describe('a return loss in words', () => {
  const lossless = { impedance: '100 Ω', delay: '170 ps/in' }
  it('known where every line reflects', () => {
    const { budget, allowance } = link({ only: { ...terms, impedance: '90 Ω', delay: '170 ps/in' } })
    const channel = channelOf({ budget, allowance } as ReturnType<typeof link>)
    expect(returnLossWords(channel)).toMatch(/^[\d.]+ dB at Nyquist, worst [\d.]+ dB at [\d.]+ [GM]Hz up to Nyquist$/)
    expect(withoutReflection(budget, allowance)).toEqual([])
  })
  it('what does not come back is no number', () => {
    const channel = channelOf(link({ only: { ...terms, ...lossless } }))
    const returnLoss = { whole: false, atNyquistDb: null, worstDb: null, worstAtHz: 1e9 }
    expect(returnLossWords({ ...channel, returnLoss })).toMatch(/^nothing comes back as far as the data reach/)
  })
})

describe('nothing to join', () => {
  it('numbers at one frequency: which lines, and what to give', () => {
    const { budget, evaluation, allowance } = link({ bga: via, more: { model: null } })
    expect(allowance.channel).toBeNull()
    const lacking = withoutBand(budget, allowance)
    expect(lacking.map(({ id }) => id)).toEqual(['bga', 'more'])
    expect(lacking[1]?.give).toBe('say how its loss is found')
    expect(nothingWords(budget, evaluation, allowance, 2)).toContain('no line between the planes has data')
  })
  it('what the link lacks comes first', () => {
    const { budget, evaluation, allowance } = link({ bga: via })
    const without = { ...budget, head: { ...budget.head, reference: null } }
    expect(nothingWords(without, evaluation, allowance, 1)).toContain('reference impedance')
    expect(nothingWords(budget, evaluation, { ...allowance, from: null }, 1)).toContain('Choose its planes')
    const signalling = { ...evaluation.signalling, symbolRate: null }
    expect(nothingWords(budget, { signalling }, allowance, 1)).toContain('rate and the code')
  })
})

describe('the power of the data', () => {
  const { budget, evaluation } = link({ bga: via })
  it('without an edge 77.4 % lies below Nyquist (∫ sinc² from 0 to 1/2 over 1/2, from memory: 0.7737)', () => {
    const power = powerOf(evaluation.signalling, budget.head, [0, 26.5625e9])
    expect(power?.density[0]).toBe(1)
    expect(power?.density[1]).toBeCloseTo(0, 12)
    expect(power?.words).toMatch(/^77\.4 % of the power of random data lies below Nyquist\. .*steps are taken\.$/)
  })
  it('an edge has its knee (0.2206 over 20 to 80 %, ln 4/2π); one longer than a symbol is not computed', () => {
    const edge = (edgeTime: string) => powerOf(evaluation.signalling, { ...budget.head, edgeTime }, [0])?.words
    expect(edge('10 ps')).toContain('its knee lies at 22.06 GHz')
    expect(edge('40 ps')).toContain('longer than a symbol; steps are taken')
  })
  it('without a rate there is none', () => {
    expect(powerOf({ ...evaluation.signalling, symbolRate: null }, budget.head, [0])).toBeNull()
  })
})

describe('where the full evaluation stands', () => {
  const { evaluation } = link({ bga: via })
  it('is said in every state but the latest', () => {
    expect(wholeWords({ evaluation, working: false, failed: null })).toBeNull()
    expect(wholeWords({ evaluation: null, working: true, failed: null })).toBe('Being computed.')
    expect(wholeWords({ evaluation, working: true, failed: null })).toContain('the state before it')
    expect(wholeWords({ evaluation, working: false, failed: 'the file is gone' })).toBe(
      'It could not be computed: the file is gone. What stands here is of an earlier state.',
    )
  })
})
