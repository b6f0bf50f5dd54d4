import { describe, expect, it } from 'vitest'
import { besideWords } from '../../app/words/beside'
import { counted } from '../../app/words/count'
import { decibels, frequencyWords, plainDecibels, signedDecibels } from '../../app/words/decibels'
import { cornerWords, headline, judgedWords, movedWords } from '../../app/words/judged'
import { planeWords } from '../../app/words/terms'
import { tamarack, upstream } from './diagram/links'

describe('decibels', () => {
  it('have two decimals and a real minus sign (Unicode U+2212), and never a negative zero', () => {
    expect([0.8, -0.19, -0.004, 27.2, 0].map((db) => decibels(db))).toEqual(['0.80', '−0.19', '0.00', '27.20', '0.00'])
    expect([0.46, -1.89, 0, -0.001].map((db) => signedDecibels(db))).toEqual(['+0.46', '−1.89', '±0.00', '±0.00'])
  })

  it('of a limit stand as a person writes them', () => {
    expect([28, 1.5, 25.25, 36.0, -3].map(plainDecibels)).toEqual(['28', '1.5', '25.25', '36', '−3'])
  })
})

describe('words', () => {
  it('of frequencies', () => {
    expect(frequencyWords(26.5625e9)).toBe('26.5625 GHz')
    expect(frequencyWords(2.5e8)).toBe('250 MHz')
  })

  it('of planes: the own name, else the code', () => {
    expect(planeWords({ code: 'tx-ball', name: null })).toBe('TX ball')
    expect(planeWords({ code: 'tx-ball', name: 'line card' })).toBe('line card')
  })

  it('of judged conditions: corner, statistic and lane stand together', () => {
    const [room] = tamarack.evaluation.allowances
    if (!room) throw new Error('tamarack has an allowance')
    expect(judgedWords(room, tamarack.budget)).toBe('25 °C, dry · nominal · lane 11, the worst of 16')
    const alike = { ...room, judged: { ...room.judged, lane: null } }
    expect(judgedWords(alike, tamarack.budget)).toContain('all 16 lanes alike')
  })

  it('of a corner: its name and temperature, else the temperature of the reference', () => {
    const head = { ...tamarack.budget.head, referenceTemperature: '25 °C' }
    const judged = {
      corner: 'reference corner',
      statistic: 'nominal',
      lane: null,
      lanes: 1,
      shortestLane: null,
      movedDb: null,
      unmovedDb: null,
    } as const
    expect(cornerWords({ id: 'x', judged }, { ...tamarack.budget, head })).toBe('25 °C')
  })

  it('of what a corner moves, and of what it cannot; none in the reference corner', () => {
    const [room] = tamarack.evaluation.allowances
    if (!room) throw new Error('tamarack has an allowance')
    const moved = (movedDb: number | null, unmovedDb: number | null) =>
      movedWords({ ...room, judged: { ...room.judged, movedDb, unmovedDb } })
    expect(moved(0.99, 5.4)).toBe('the corner moves +0.99 dB; 5.40 dB cannot be moved')
    expect(moved(-0.2, 0)).toBe('the corner moves −0.20 dB')
    expect(moved(null, null)).toBe('')
  })

  it('of what stands beside a loss: a mismatch has its sign', () => {
    expect(besideWords({ by: 'computed', beside: [{ what: 'mismatch', db: -0.03 }] })).toEqual([
      { term: 'found', value: 'computed' },
      { term: "by mismatch in the link's reference", value: '−0.03 dB' },
    ])
    expect(besideWords({ by: null, beside: [] })).toEqual([])
  })

  it('of the headline: a margin, or what is left and for how many lines', () => {
    const [room] = tamarack.evaluation.allowances
    const [open] = upstream.evaluation.allowances
    if (!room || !open) throw new Error('both have an allowance')
    expect(headline(room)).toEqual({ figure: '0.80', unit: 'dB margin', sentence: '27.20 of 28 dB used' })
    expect(headline(open)).toEqual({
      figure: '9.19',
      unit: 'dB left',
      sentence: '3 lines without a number; 26.81 of 36 dB used by the other 9',
    })
    expect(headline({ ...room, limitDb: null }).figure).toBe('?')
  })

  it('of a count', () => {
    expect([0, 1, 5, 13].map((count) => counted(count, 'budget', 'budgets'))).toEqual([
      'No budgets',
      'One budget',
      'Five budgets',
      '13 budgets',
    ])
  })
})
