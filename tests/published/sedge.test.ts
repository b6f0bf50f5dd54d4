import { describe, expect, it } from 'vitest'
import { byHand, plain, type Row, scenario, withAllowance, withLine } from './byHand'
import { evaluateFile, onlyAllowance } from './straightLink'

/** The example's table (invented link; sums by plain arithmetic, no source). The ± of traces is 8 %, printed rounded. */
const TABLE: readonly Row[] = [
  ['bga-via-a', 0.15, 0.05, 'a-via'],
  ['controller-trace', 2.9, 0.232, 'card'],
  ['header-a', 0.2, 0.05, 'a-via'],
  ['connector-near', 0.6, 0.15, 'conn'],
  ['termination-near', 0.35, 0.1, 'term'],
  ['bulk', 7.05, 0.423, ''],
  ['termination-far', 0.35, 0.1, 'term'],
  ['connector-far', 0.6, 0.15, 'conn'],
  ['header-b', 0.2, 0.05, 'b-via'],
  ['drive-trace', 3.77, 3.77 * 0.08, 'card'],
  ['bga-via-b', 0.15, 0.05, 'b-via'],
]
const file = scenario('sedge')
const evaluation = evaluateFile(file)
const found = onlyAllowance(evaluation)
const hand = byHand(TABLE)

describe('Sedge: 10.3125 Gb/s NRZ over cable, 25 dB TP1 to TP4 (invented example, no source)', () => {
  it('counts what the table prints, line by line; what was taken out or lies outside does not count', () => {
    expect(found.lines.map((line) => line.id)).toEqual(TABLE.map(([line]) => line))
    for (const [n, [line, db, plusMinus]] of TABLE.entries()) {
      expect(found.lines[n]?.countedDb, line).toBeCloseTo(db, 9)
      expect(found.lines[n]?.highDb, line).toBeCloseTo(db + plusMinus, 9)
    }
  })

  it('16.32 dB, margin 8.68: inside', () => {
    expect(evaluation.signalling.nyquist).toBe(5.15625e9)
    expect(hand.total).toBeCloseTo(16.32, 9)
    expect(found.lossDb).toBeCloseTo(hand.total, 9)
    expect(found.marginDb).toBeCloseTo(25 - hand.total, 9)
    expect(found.verdict).toBe('inside')
  })

  it('worst case 17.98 dB, grouped RSS ±0.78 dB', () => {
    expect(hand.worst).toBeCloseTo(17.98, 2)
    expect(hand.grouped).toBeCloseTo(0.78, 2)
    expect(found.worstDb).toBeCloseTo(hand.worst, 9)
    expect(found.rssDb).toBeCloseTo(hand.grouped, 9)
  })

  it('by basis: measured 7.87, datasheet 7.75, simulated 0.70 dB', () => {
    expect(found.byBasis.measured).toBeCloseTo(plain(2.9, 0.6, 0.6, 3.77), 9)
    expect(found.byBasis.datasheet).toBeCloseTo(plain(0.35, 7.05, 0.35), 9)
    expect(found.byBasis.simulated).toBeCloseTo(plain(0.15, 0.2, 0.2, 0.15), 9)
  })

  it('17.14 dB in the hot corner: 13.72 dB of trace and bulk cable grow by 6 %', () => {
    const hot = onlyAllowance(evaluateFile(withAllowance(file, 'tp1-to-tp4', { judgedCorner: 'hot' })))
    const growth = plain(2.9, 7.05, 3.77) * 0.06
    expect(hot.lossDb).toBeCloseTo(hand.total + growth, 9)
    expect(hot.lossDb).toBeCloseTo(17.14, 2)
    expect(hot.verdict).toBe('inside')
  })

  it('a cable assembly of 15.9 dB with its fixtures in, in place of five lines: 23.27 dB, margin 1.73, tight and flagged', () => {
    const replaced = ['connector-near', 'termination-near', 'bulk', 'termination-far', 'connector-far']
    let wrong = withLine(file, 'cable-in-fixtures', { removed: false })
    for (const id of replaced) wrong = withLine(wrong, id, { removed: true })
    const result = evaluateFile(wrong)
    const judged = onlyAllowance(result)
    expect(judged.lossDb).toBeCloseTo(hand.total - plain(0.6, 0.35, 7.05, 0.35, 0.6) + 15.9, 9)
    expect(judged.lossDb).toBeCloseTo(23.27, 9)
    expect(judged.marginDb).toBeCloseTo(1.73, 9)
    expect(judged.verdict).toBe('tight')
    expect(result.flags).toContainEqual(expect.objectContaining({ code: 'fixtures-in', id: 'cable-in-fixtures' }))
  })

  it('says that three maxima have ± on top, and nothing else is wrong', () => {
    expect(evaluation.flags.filter((flag) => flag.severity !== 'notice').map((flag) => [flag.code, flag.id])).toEqual([
      ['maximum-with-tolerance', 'termination-near'],
      ['maximum-with-tolerance', 'bulk'],
      ['maximum-with-tolerance', 'termination-far'],
    ])
  })
})
