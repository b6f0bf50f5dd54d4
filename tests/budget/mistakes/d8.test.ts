import { describe, expect, it } from 'vitest'
import type { BudgetFile } from '../../../lib/budget/schema'
import { usualCableLoss, usualTraceLoss } from '../../../lib/channel/lines/usualLoss'
import { line } from '../links'
import { flagged, words } from './flagged'

type Kind = 'trace' | 'cable'
const perLength = (kind: Kind, lossPerLength: string, at = '10 GHz') => ({
  lines: {
    t: line('a1', null, {
      kind,
      covers: kind === 'cable' ? 'bulk terminations mated-pairs' : '',
      model: 'per-length',
      length: '3 in',
      lossPerLength,
      at,
    }),
  },
})
const inch = (band: { low: number; high: number } | null) =>
  [band?.low, band?.high].map((db) => (db ?? Number.NaN) * 0.0254)

describe('mistake 8: bulk cable for a cable assembly, one unit for another (common practice, no source)', () => {
  it('a cable without its ends is no assembly', () => {
    const cable = (covers: string) => ({ lines: { c: line('a1', '7 dB', { kind: 'cable', covers }) } })
    expect(flagged('nobody-counts', cable('bulk'))).toEqual(['c covers'])
    expect(flagged('nobody-counts', cable('bulk terminations mated-pairs'))).toEqual([])
    expect(flagged('nobody-counts', cable('bulk paddle-cards mated-pairs'))).toEqual([])
  })

  it('published figures lie inside what is usual, and far from where it is asked (READ in physics.md 2.6; cable from memory)', () => {
    const inside = (db: number, band: { low: number; high: number } | null) =>
      band !== null && db > band.low && db < band.high
    // FR-4 stripline 0.5 dB/in at 5 GHz; FR-4 microstrip 10 dB per 20 cm at 10 GHz; the three example links' traces.
    for (const [ghz, db] of [
      [5, 0.5],
      [10, 1.27],
      [4, 0.41],
      [4, 0.3],
      [26.5625, 0.95],
      [26.5625, 0.8],
      [16, 1.25],
      [5.15625, 0.58],
    ] as const)
      expect(inside(db / 0.0254, usualTraceLoss(ghz * 1e9)), `${db} dB/in at ${ghz} GHz`).toBe(true)
    // 26 AWG 3.3 to 34 AWG 8 dB/m at 12.89 GHz; 28 AWG 2.35 dB/m at 5.15625 GHz.
    for (const [ghz, db] of [
      [12.89, 3.3],
      [12.89, 8],
      [26.56, 12],
      [5.15625, 2.35],
    ] as const)
      expect(inside(db, usualCableLoss(ghz * 1e9)), `${db} dB/m at ${ghz} GHz`).toBe(true)
    expect(usualTraceLoss(4e8)).toBeNull()
  })

  it('dB/in typed as dB/m, and dB/m typed as dB/in or dB/ft, are named', () => {
    expect(flagged('unit-suspected', perLength('trace', '0.9 dB/m'))).toEqual(['t lossPerLength'])
    expect(words('unit-suspected', perLength('trace', '0.9 dB/m'))).toMatch(/usual in dB\/in and was typed in dB\/m/)
    expect(words('unit-suspected', perLength('cable', '3.5 dB/in'))).toMatch(/usual in dB\/m and was typed in dB\/in/)
    expect(words('unit-suspected', perLength('cable', '0.9 dB/in'))).toMatch(/usual in dB\/ft|usual in dB\/m/)
    expect(flagged('unit-suspected', perLength('trace', '0.9 dB/in'))).toEqual([])
  })

  it('outside 0.2 to 2 times the usual band it is asked about, whatever the unit', () => {
    const [low = 0, high = 0] = inch(usualTraceLoss(10e9))
    const raised = (text: string) => [
      ...flagged('per-length-unusual', perLength('trace', text)),
      ...flagged('unit-suspected', perLength('trace', text)),
    ]
    expect(raised(`${(2.02 * high).toFixed(4)} dB/in`)).toEqual(['t lossPerLength'])
    expect(raised(`${(1.98 * high).toFixed(4)} dB/in`)).toEqual([])
    expect(flagged('per-length-unusual', perLength('trace', '2000 dB/m'))).toEqual(['t lossPerLength'])
    expect(raised(`${(0.198 * low).toFixed(4)} dB/in`)).toEqual(['t lossPerLength'])
    expect(raised(`${(0.202 * low).toFixed(4)} dB/in`)).toEqual([])
  })

  it('in √f and f terms, and in a loss class, as well', () => {
    const terms = {
      model: 'per-length',
      length: '3 in',
      rootTerm: '0.2 dB/m',
      linearTerm: '0.05 dB/m',
      validFrom: '1 GHz',
      validTo: '20 GHz',
    } as const
    expect(
      flagged('unit-suspected', { lines: { t: line('a1', null, { kind: 'trace', at: null, ...terms }) } }),
    ).toEqual(['t rootTerm'])
    const parts: Partial<BudgetFile> = {
      lossClasses: { c: { order: 'a0', name: 'L3', lossPerLength: '0.8 dB/m', at: '10 GHz' } },
      lines: { t: line('a1', null, { kind: 'trace', at: null, model: 'class', lossClass: 'c', length: '3 in' }) },
    }
    expect(flagged('unit-suspected', parts)).toEqual(['t lossClass'])
  })

  it('a length that another unit would bring to the others: mil as mm (×39.4), in as mm (÷25.4)', () => {
    const trace = (order: string, length: string) =>
      line(order, null, { kind: 'trace', covers: '', model: 'per-length', length, lossPerLength: '1 dB/in' })
    const link = (length: string) => ({
      lines: { a: trace('a1', '5 in'), b: trace('a2', '7 in'), c: trace('a3', '6 in'), d: trace('a4', length) },
    })
    expect(flagged('unit-suspected', link('5900 mm'))).toEqual(['d length'])
    expect(words('unit-suspected', link('5900 mm'))).toMatch(/in mil it would be like them/)
    expect(words('unit-suspected', link('6 mm'))).toMatch(/in in it would be like them/)
    // A breakout of half an inch, and a length four times the others', are no mistake of a unit.
    expect(flagged('unit-suspected', link('0.6 in'))).toEqual([])
    expect(flagged('unit-suspected', link('24 in'))).toEqual([])
  })
})
