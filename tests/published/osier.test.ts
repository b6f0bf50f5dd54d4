import { describe, expect, it } from 'vitest'
import { byHand, plain, type Row, scenario, withLine, withLossPerLength } from './byHand'
import { evaluateFile, onlyAllowance } from './straightLink'

/** The example's table (invented link; sums by plain arithmetic, no source). Its ± of traces are 7 % and 8 %, printed rounded. */
const TABLE: readonly Row[] = [
  ['root-package', 8.4, 0.4, ''],
  ['system-bga-via', 0.45, 0.1, 'sys-via'],
  ['breakout', 0.69, 0.69 * 0.07, 'sys'],
  ['system-l3', 15.07, 15.07 * 0.07, 'sys'],
  ['ac-capacitor', 0.4, 0.1, ''],
  ['slot-via', 0.55, 0.15, 'sys-via'],
  ['slot-connector', 1.5, 0.2, ''],
  ['edge-finger', 0.45, 0.1, ''],
  ['card-via', 0.35, 0.1, 'crd-via'],
  ['card-stripline', 4.5, 0.36, 'crd'],
  ['card-bga-via', 0.45, 0.1, 'crd-via'],
  ['endpoint-package', 4.3, 0.3, ''],
]
const file = scenario('osier')
const evaluation = evaluateFile(file)
const found = onlyAllowance(evaluation)
const hand = byHand(TABLE)

describe('Osier: 32 GT/s NRZ, 36 dB bump to bump (invented example, no source)', () => {
  it('counts what the table prints, line by line', () => {
    expect(found.lines.map((line) => line.id)).toEqual(TABLE.map(([line]) => line))
    for (const [n, [line, db, plusMinus]] of TABLE.entries()) {
      expect(found.lines[n]?.countedDb, line).toBeCloseTo(db, 9)
      expect(found.lines[n]?.highDb, line).toBeCloseTo(db + plusMinus, 9)
    }
  })

  it('37.11 dB, margin −1.11: over', () => {
    expect(evaluation.signalling.nyquist).toBe(16e9)
    expect(hand.total).toBeCloseTo(37.11, 9)
    expect(found.lossDb).toBeCloseTo(hand.total, 9)
    expect(found.marginDb).toBeCloseTo(36 - hand.total, 9)
    expect(found.verdict).toBe('over')
  })

  it('worst case 40.12 dB, grouped RSS ±1.33 dB', () => {
    expect(hand.worst).toBeCloseTo(40.12, 2)
    expect(hand.grouped).toBeCloseTo(1.33, 2)
    expect(found.worstDb).toBeCloseTo(hand.worst, 9)
    expect(found.rssDb).toBeCloseTo(hand.grouped, 9)
  })

  it('shares: root 8.40 of 9.0, system board 17.16 of 16.0, slot 1.50 of 1.5, card 10.05 of 9.5', () => {
    const expected = [
      ['root', 9, 8.4],
      ['system-board', 16, plain(0.45, 0.69, 15.07, 0.4, 0.55)],
      ['slot', 1.5, 1.5],
      ['card', 9.5, plain(0.45, 0.35, 4.5, 0.45, 4.3)],
    ] as const
    expect(expected.map(([, , used]) => Number(used.toFixed(2)))).toEqual([8.4, 17.16, 1.5, 10.05])
    expect(found.shares).toHaveLength(4)
    for (const [n, [assembly, share, used]] of expected.entries()) {
      expect(found.shares[n]?.of).toEqual({ kind: 'assembly', ref: assembly })
      expect(found.shares[n]?.shareDb).toBeCloseTo(share, 9)
      expect(found.shares[n]?.usedDb).toBeCloseTo(used, 9)
    }
  })

  it('by basis: simulated 26.12, estimate 4.99, target 4.50, datasheet 1.50 dB', () => {
    expect(found.byBasis.simulated).toBeCloseTo(plain(8.4, 0.45, 15.07, 0.4, 0.55, 0.45, 0.35, 0.45), 9)
    expect(found.byBasis.estimate).toBeCloseTo(plain(0.69, 4.3), 9)
    expect(found.byBasis.target).toBeCloseTo(4.5, 9)
    expect(found.byBasis.datasheet).toBeCloseTo(1.5, 9)
  })

  it('ways out: 0.95 dB/in leaves 0.945 dB and is still tight; 1.1 in less is 35.90, 2.4 in less 34.47 and inside', () => {
    const laminate = onlyAllowance(evaluateFile(withLossPerLength(file, 'system-l3', '0.95 dB/in')))
    expect(laminate.lossDb).toBeCloseTo(hand.total - 13.7 * (1.1 - 0.95), 9)
    expect(laminate.marginDb).toBeCloseTo(0.945, 9)
    expect(laminate.verdict).toBe('tight')
    const shorter = (length: string) => onlyAllowance(evaluateFile(withLine(file, 'system-l3', { length })))
    expect(shorter('12.6 in').lossDb).toBeCloseTo(hand.total - 1.1 * 1.1, 9)
    expect(shorter('12.6 in').lossDb).toBeCloseTo(35.9, 9)
    expect(shorter('12.6 in').verdict).toBe('tight')
    expect(shorter('11.3 in').lossDb).toBeCloseTo(34.47, 9)
    expect(shorter('11.3 in').verdict).toBe('inside')
  })

  it('says which shares are passed, that the shares leave no reserve, and that a maximum has ± on top', () => {
    const raised = evaluation.flags.filter((flag) => flag.severity !== 'notice').map((flag) => [flag.code, flag.id])
    expect(raised).toHaveLength(4)
    expect(raised).toEqual(
      expect.arrayContaining([
        ['maximum-with-tolerance', 'slot-connector'],
        ['share-exceeded', 'system-board'],
        ['share-exceeded', 'card'],
        ['shares-exceed-allowance', 'bump-to-bump'],
      ]),
    )
  })
})
