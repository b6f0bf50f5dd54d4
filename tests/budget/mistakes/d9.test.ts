import { describe, expect, it } from 'vitest'
import type { BudgetFile } from '../../../lib/budget/schema'
import { line, link } from '../links'
import { evaluated, flagged, words } from './flagged'

const { head } = link({})
const board: Partial<BudgetFile> = {
  assemblies: { b: { order: 'a0', name: 'Board' } },
  layers: {
    l3: { order: 'a1', name: 'L3', assembly: 'b', role: 'signal' },
    l5: { order: 'a2', name: 'L5', assembly: 'b', role: 'signal' },
  },
  lossClasses: {
    c3: { order: 'a0', name: 'L3 5 mil', assembly: 'b', layer: 'L3', lossPerLength: '1 dB/in', at: '10 GHz' },
    c9: { order: 'a1', name: 'L9 5 mil', assembly: 'b', layer: 'L9', lossPerLength: '1.2 dB/in', at: '10 GHz' },
  },
}
const trace = (rest: object = {}) =>
  line('a1', null, { kind: 'trace', at: null, assembly: 'b', model: 'class', lossClass: 'c3', length: '5 in', ...rest })

describe('mistake 9: lanes on another layer, stubs from the wrong side, lanes apart from the others (common practice, no source)', () => {
  it('a layer that its assembly does not have, by the line, its class or a lane’s class', () => {
    expect(flagged('layer-not-in-assembly', { ...board, lines: { t: trace() } })).toEqual([])
    expect(flagged('layer-not-in-assembly', { ...board, lines: { t: trace({ layer: 'l3 ' }) } })).toEqual([])
    expect(flagged('layer-not-in-assembly', { ...board, lines: { t: trace({ lossClass: 'c9' }) } })).toEqual([
      't lossClass',
    ])
    const stated = line('a1', '5 dB', { kind: 'trace', assembly: 'b', layer: 'L7' })
    expect(flagged('layer-not-in-assembly', { ...board, lines: { t: stated } })).toEqual(['t layer'])
    const lanes = {
      ...board,
      head: { ...head, laneCount: 4 },
      lines: { t: trace() },
      laneValues: { 't/3/lossClass': 'c9' },
    }
    expect(flagged('layer-not-in-assembly', lanes)).toEqual(['t lossClass'])
    expect(words('layer-not-in-assembly', lanes)).toMatch(
      /run on L9 in lane 3, which the stack-up of 'Board' does not have/,
    )
  })

  it('a loss class of another layer than the line’s', () => {
    expect(flagged('class-of-other-layer', { ...board, lines: { t: trace({ layer: 'L5' }) } })).toEqual(['t lossClass'])
    expect(flagged('class-of-other-layer', { ...board, lines: { t: trace({ layer: 'L3' }) } })).toEqual([])
  })

  const via = (usedDepth: string, stub: string, rest: object = {}) => ({
    lines: { v: line('a1', '0.5 dB', { kind: 'via', boardThickness: '3 mm', usedDepth, stub, ...rest }) },
  })
  it('used depth and stub that do not make up the board, unless the rest is drilled away', () => {
    expect(flagged('stub-depth-mismatch', via('2 mm', '1 mm'))).toEqual([])
    expect(flagged('stub-depth-mismatch', via('2 mm', '1.08 mm'))).toEqual([])
    expect(flagged('stub-depth-mismatch', via('2 mm', '2 mm'))).toEqual(['v stub'])
    expect(flagged('stub-depth-mismatch', via('2 mm', '0.25 mm'))).toEqual(['v stub'])
    expect(flagged('stub-depth-mismatch', via('2 mm', '0.25 mm', { drillTolerance: '0.1 mm' }))).toEqual([])
    expect(flagged('stub-depth-mismatch', via('2 mm', '2 mm', { drillTolerance: '0.1 mm' }))).toEqual(['v stub'])
  })

  const sixteen = (values: Record<number, string>, rest: object = {}) => ({
    ...board,
    head: { ...head, laneCount: 16 },
    lines: { t: trace(rest) },
    laneValues: Object.fromEntries(Object.entries(values).map(([lane, value]) => [`t/${lane}/length`, value])),
  })
  const lanesOf = (special: Record<number, string> = {}) =>
    sixteen({
      ...Object.fromEntries(
        Array.from({ length: 16 }, (_, k) => [k + 1, `${(5 + ((k * 7) % 16) / 40).toFixed(3)} in`]),
      ),
      ...special,
    })

  it('a lane over three robust standard deviations away, by 1.4826 times the median absolute deviation (Rousseeuw and Croux, 1993)', () => {
    // Lengths 5.000, 5.025 … 5.375 in: median 5.1875, MAD 0.1, three sigmas 0.4448.
    expect(flagged('lane-outlier', lanesOf())).toEqual([])
    expect(flagged('lane-outlier', lanesOf({ 4: '5.60 in' }))).toEqual([])
    expect(flagged('lane-outlier', lanesOf({ 4: '5.75 in' }))).toEqual(['t length'])
    expect(words('lane-outlier', lanesOf({ 4: '5.75 in' }))).toMatch(
      /in lane 4; the lanes have 5\.2\d* in in the middle/,
    )
  })

  it('a lane in another unit is named', () => {
    expect(words('lane-outlier', lanesOf({ 4: '5.2 mm' }))).toMatch(
      /length of 5\.2 mm in lane 4; .* in in it would be like them/,
    )
    expect(words('lane-outlier', lanesOf({ 9: '5200 mm' }))).toMatch(/in mil it would be like them/)
  })

  it('alike lanes are not outliers of each other; one of sixteen is, when it differs by more than 2 %', () => {
    expect(flagged('lane-outlier', sixteen({ 3: '5.09 in' }))).toEqual([])
    expect(flagged('lane-outlier', sixteen({ 3: '5.11 in' }))).toEqual(['t length'])
    const four = { ...sixteen({ 3: '9 in' }), head: { ...head, laneCount: 4 } }
    expect(flagged('lane-outlier', four)).toEqual([])
  })

  it('a difference inside the pair is turned into decibels: −20 log10 cos(π f Δt), 5 ps at 10 GHz cost 0.1077 dB', () => {
    const parts = { lines: { t: line('a1', '1 dB', { kind: 'trace', skew: '5 ps' }) } }
    expect(evaluated(parts).lines.t?.loss.nominalDb).toBeCloseTo(1 - 20 * Math.log10(Math.cos(Math.PI * 0.05)), 12)
    expect(evaluated(parts).lines.t?.loss.nominalDb).toBeCloseTo(1.1076, 4)
  })
})
