import { describe, expect, it } from 'vitest'
import { byHand, plain, type Row, scenario, withAllowance, withLossPerLength } from './byHand'
import { evaluateFile, onlyAllowance } from './straightLink'

/** The example's table as printed (invented link; sums by plain arithmetic, no source). */
const TABLE: readonly Row[] = [
  ['bga-via-tx', 0.6, 0.15, 'card-via-bga'],
  ['line-card-l5', 4.75, 0.285, 'card'],
  ['press-fit-tx', 0.45, 0.12, 'card-via-conn'],
  ['connector-near', 1.35, 0.2, 'conn'],
  ['backplane-via-near', 0.65, 0.15, 'bp-via'],
  ['backplane-l14', 9.2, 0.552, 'bp'],
  ['backplane-via-far', 0.65, 0.15, 'bp-via'],
  ['connector-far', 1.35, 0.2, 'conn'],
  ['press-fit-rx', 0.45, 0.12, 'card-via-conn'],
  ['switch-card-l7', 6.65, 0.399, 'card'],
  ['ac-capacitor', 0.5, 0.1, ''],
  ['bga-via-rx', 0.6, 0.15, 'card-via-bga'],
]
const file = scenario('tamarack')
const evaluation = evaluateFile(file)
const found = onlyAllowance(evaluation)
const hand = byHand(TABLE)

describe('Tamarack: 106.25 Gb/s PAM4, 28 dB ball to ball (invented example, no source)', () => {
  it('counts what the table prints, line by line, between the balls only', () => {
    expect(found.lines.map((line) => line.id)).toEqual(TABLE.map(([line]) => line))
    for (const [n, [line, db, plusMinus]] of TABLE.entries()) {
      expect(found.lines[n]?.countedDb, line).toBeCloseTo(db, 9)
      expect(found.lines[n]?.highDb, line).toBeCloseTo(db + plusMinus, 9)
      expect(found.lines[n]?.lowDb, line).toBeCloseTo(db - plusMinus, 9)
    }
  })

  it('27.20 dB in the worst of 16 lanes, margin 0.80: tight under 1.5 dB', () => {
    expect(evaluation.signalling.nyquist).toBe(26.5625e9)
    expect(hand.total).toBeCloseTo(27.2, 9)
    expect(found.lossDb).toBeCloseTo(hand.total, 9)
    expect(found.marginDb).toBeCloseTo(28 - hand.total, 9)
    expect(found.verdict).toBe('tight')
    expect(found.judged).toMatchObject({ statistic: 'nominal', lane: 7, lanes: 16 })
  })

  it('worst case 29.78 dB, grouped RSS ±1.09 dB', () => {
    expect(hand.worst).toBeCloseTo(29.78, 2)
    expect(hand.grouped).toBeCloseTo(1.09, 2)
    expect(found.worstDb).toBeCloseTo(hand.worst, 9)
    expect(found.rssDb).toBeCloseTo(hand.grouped, 9)
  })

  it('measured 11.40, simulated 3.90, datasheet 2.70, estimate 9.20 dB', () => {
    expect(found.byBasis.measured).toBeCloseTo(plain(4.75, 6.65), 9)
    expect(found.byBasis.simulated).toBeCloseTo(plain(0.6, 0.45, 0.65, 0.65, 0.45, 0.5, 0.6), 9)
    expect(found.byBasis.datasheet).toBeCloseTo(plain(1.35, 1.35), 9)
    expect(found.byBasis.estimate).toBeCloseTo(9.2, 9)
    expect(found.byBasis.target + found.byBasis.unsaid).toBe(0)
  })

  it('28.19 dB and over in the hot corner: 20.60 dB of trace grow by 0.12 %/K over 40 K', () => {
    const hot = onlyAllowance(evaluateFile(withAllowance(file, 'ball-to-ball', { judgedCorner: 'hot' })))
    const growth = plain(4.75, 9.2, 6.65) * 0.0012 * (65 - 25)
    expect(growth).toBeCloseTo(0.9888, 9)
    expect(hot.lossDb).toBeCloseTo(hand.total + growth, 9)
    expect(hot.lossDb).toBeCloseTo(28.19, 2)
    expect(hot.verdict).toBe('over')
  })

  it('a backplane of 0.76 dB/in: 26.74 dB, hot 27.71 dB', () => {
    const better = withLossPerLength(file, 'backplane-l14', '0.76 dB/in')
    const nominal = plain(hand.total, -9.2, 11.5 * 0.76)
    expect(onlyAllowance(evaluateFile(better)).lossDb).toBeCloseTo(nominal, 9)
    const hot = onlyAllowance(evaluateFile(withAllowance(better, 'ball-to-ball', { judgedCorner: 'hot' })))
    expect(hot.lossDb).toBeCloseTo(nominal + plain(4.75, 11.5 * 0.76, 6.65) * 0.048, 9)
    expect([nominal, hot.lossDb]).toEqual([expect.closeTo(26.74, 9), expect.closeTo(27.71, 2)])
  })

  it('33.0 dB from bump to bump, with both packages', () => {
    const bumps = withAllowance(file, 'ball-to-ball', { from: 'tx-bump', to: 'rx-bump', limit: '40 dB' })
    const planes = {
      ...file.planes,
      'tx-bump': { order: 'Zz', code: 'tx-bump' },
      'rx-bump': { order: 'b00', code: 'rx-bump' },
    } as const
    const whole = onlyAllowance(evaluateFile({ ...bumps, planes }))
    expect(whole.lossDb).toBeCloseTo(plain(hand.total, 3.1, 2.7), 9)
    expect(whole.lossDb).toBeCloseTo(33.0, 9)
  })

  it('no other lane is longer than lane 7, computed from the lengths in the file', () => {
    const inches = (key: string) => Number((file.laneValues?.[key] ?? '').replace(' in', ''))
    const totals = Array.from({ length: 16 }, (_, n) => {
      const lane = n + 1
      return plain(
        0.95 * inches(`line-card-l5/${lane}/length`),
        0.8 * inches(`backplane-l14/${lane}/length`),
        0.95 * inches(`switch-card-l7/${lane}/length`),
      )
    })
    expect(totals.indexOf(Math.max(...totals)) + 1).toBe(7)
    expect(totals[6]).toBeCloseTo(20.6, 9)
    for (const [n, total] of totals.entries()) {
      const lane = withAllowance(file, 'ball-to-ball', { judgedLane: n + 1 })
      expect(onlyAllowance(evaluateFile(lane)).lossDb).toBeCloseTo(total + 6.6, 9)
    }
  })

  it('says that it is inside on the backplane’s estimate, that both connectors are typical values, and nothing else is wrong', () => {
    expect(evaluation.flags.filter((flag) => flag.severity !== 'notice').map((flag) => [flag.code, flag.id])).toEqual([
      ['inside-on-guesses', evaluation.allowances[0]?.id],
      ['typical-not-maximum', 'connector-near'],
      ['typical-not-maximum', 'connector-far'],
    ])
  })
})
