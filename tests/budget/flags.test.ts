import { describe, expect, it } from 'vitest'
import { evaluate } from '../../lib/budget/evaluate'
import { FLAGS, type FlagCode } from '../../lib/budget/flags'
import type { BudgetFile } from '../../lib/budget/schema'
import { line, link } from './links'

const { head, allowances, planes: ends } = link({})
const limit = { ...allowances.limit, order: 'a0' }
const PLANES = { tx: { ...ends.tx, order: 'a0' }, rx: { ...ends.rx, order: 'z0' } }
const trace = { kind: 'trace' } as const
const a = (rest: Parameters<typeof line>[2], loss: string | null = '4 dB') => ({ lines: { a: line('a1', loss, rest) } })
const judged = (rest: Partial<typeof limit>) => ({ allowances: { limit: { ...limit, ...rest } } })
const corner = (rest: object) => ({
  ...judged({ judgedCorner: 'c' }),
  corners: { c: { order: 'a0', name: 'Hot', ...rest } },
})
const planes = (from: object, to: object) => ({
  planes: { tx: { ...PLANES.tx, ...from }, rx: { ...PLANES.rx, ...to } },
})

/** For every flag that exists, a budget that raises it, and where it hangs: section, id, field. */
const RAISED: Readonly<Record<FlagCode, readonly [Partial<BudgetFile>, string, string | null, string | null]>> = {
  'signalling-incomplete': [{ head: { ...head, bitRate: null } }, 'head', null, 'bitRate'],
  'signalling-impossible': [{ head: { ...head, codedBits: 2, codedSymbols: 1 } }, 'head', null, 'codedBits'],
  'rate-type-not-said': [{ head: { ...head, rateType: null } }, 'head', null, 'rateType'],
  'no-allowance': [{ allowances: {} }, 'head', null, null],
  'model-missing': [a({ model: null }), 'lines', 'a', 'model'],
  'field-missing': [a({}, null), 'lines', 'a', 'loss'],
  'unreadable-value': [a({ model: 'table', points: 'x' }), 'lines', 'a', 'points'],
  'class-missing': [a({ model: 'class', length: '1 in' }), 'lines', 'a', 'lossClass'],
  'frequency-too-far': [a({ at: '11 GHz' }), 'lines', 'a', 'at'],
  'outside-table': [a({ model: 'table', points: '1 GHz 1 dB' }), 'lines', 'a', 'points'],
  'outside-validity': [
    a({
      model: 'per-length',
      length: '1 m',
      rootTerm: '1 dB/m',
      linearTerm: '0 dB/m',
      validFrom: '1 GHz',
      validTo: '2 GHz',
    }),
    'lines',
    'a',
    'validTo',
  ],
  'skew-too-large': [a({ skew: '60 ps' }), 'lines', 'a', 'skew'],
  'overlap-unnamed': [a({ kind: 'overlap' }), 'lines', 'a', 'overlapA'],
  'limit-missing': [judged({ limit: null }), 'allowances', 'limit', 'limit'],
  'plane-missing': [judged({ to: 'gone' }), 'allowances', 'limit', 'to'],
  'planes-reversed': [judged({ from: 'rx', to: 'tx' }), 'allowances', 'limit', 'to'],
  'planes-differ': [judged({ publishedTo: 'rx-bump' }), 'allowances', 'limit', 'to'],
  'corner-not-judged': [{ ...a(trace), ...corner({ temperature: '65 °C' }) }, 'allowances', 'limit', 'judgedCorner'],
  'judged-lane-missing': [judged({ judgedLane: 2 }), 'allowances', 'limit', 'judgedLane'],
  'moved-with-spread': [a({ ...trace, at: '12.5 GHz' }), 'lines', 'a', 'at'],
  'usual-wrong-frequency': [judged({ at: '20 GHz' }), 'allowances', 'limit', 'at'],
  'coarse-table': [a({ model: 'table', points: '1 GHz 1 dB; 25 GHz 5 dB' }), 'lines', 'a', 'points'],
  'dangling-reference': [a({ evidence: 'gone' }), 'lines', 'a', 'evidence'],
  'class-of-other-assembly': [
    {
      assemblies: { x: { order: 'a0', name: 'X' }, y: { order: 'a1', name: 'Y' } },
      lossClasses: { c: { order: 'a0', name: 'C', assembly: 'y', lossPerLength: '1 dB/in', at: '10 GHz' } },
      ...a({ assembly: 'x', model: 'class', lossClass: 'c', length: '1 in' }),
    },
    'lines',
    'a',
    'lossClass',
  ],
  'overlap-outside-planes': [
    {
      lines: {
        a: line('a1', '4 dB'),
        b: line('z1', '4 dB'),
        o: line('a2', '1 dB', { kind: 'overlap', overlapA: 'a', overlapB: 'b' }),
      },
    },
    'lines',
    'o',
    'overlapA',
  ],
  'overlap-too-large': [
    {
      lines: {
        a: line('a1', '4 dB'),
        b: line('a3', '1 dB'),
        o: line('a2', '2 dB', { kind: 'overlap', overlapA: 'a', overlapB: 'b' }),
      },
    },
    'lines',
    'o',
    'loss',
  ],
  'reserve-and-corner': [
    {
      ...a({ kind: 'reserve', purpose: 'temperature' }),
      ...corner({ temperature: '65 °C', lossPerKelvin: '0.1 %/K' }),
    },
    'lines',
    'a',
    'purpose',
  ],
  'maximum-with-tolerance': [a({ grade: 'maximum', tolerancePlus: '5 %' }), 'lines', 'a', 'tolerancePlus'],
  'maximum-through-corner': [
    { ...a({ ...trace, grade: 'maximum' }), ...corner({ temperature: '65 °C', lossPerKelvin: '0.1 %/K' }) },
    'lines',
    'a',
    'conditionTemperature',
  ],
  'process-with-tolerance': [a({ processIncluded: true, tolerancePlus: '0.1 dB' }), 'lines', 'a', 'processIncluded'],
  'typical-not-maximum': [a({ grade: 'typical' }), 'lines', 'a', 'grade'],
  'group-off-without-note': [a({ group: 'none' }), 'lines', 'a', 'groupNote'],
  'counted-twice': [
    {
      lines: {
        a: line('a1', '1 dB', { kind: 'connector', covers: 'footprint-via-b' }),
        b: line('a2', '1 dB', { kind: 'via' }),
      },
    },
    'lines',
    'a',
    'covers',
  ],
  'nobody-counts': [
    { lines: { a: line('a1', '1 dB', { kind: 'connector', covers: '' }), b: line('a2', '1 dB', trace) } },
    'lines',
    'a',
    'covers',
  ],
  'fixtures-in': [
    { ...a({ evidence: 'e' }), evidence: { e: { order: 'a0', name: 'cable.s4p', fixtures: 'in' } } },
    'lines',
    'a',
    'evidence',
  ],
  'package-between-balls': [a({ kind: 'package', covers: '' }), 'lines', 'a', 'order'],
  'die-outside-planes': [a({ kind: 'die' }), 'lines', 'a', 'order'],
  'no-package-from-bump': [{ ...a(trace), ...planes({ code: 'tx-bump' }, {}) }, 'allowances', 'limit', 'from'],
  'package-above-presumed': [
    { ...judged({ presumedPackage: '3 dB' }), lines: { a: line('Zz', '3.5 dB', { kind: 'package', covers: '' }) } },
    'lines',
    'a',
    'loss',
  ],
  'allowance-frequency-missing': [judged({ at: null }), 'allowances', 'limit', 'at'],
  'allowance-at-other-frequency': [judged({ at: '11.3 GHz' }), 'allowances', 'limit', 'at'],
  'share-exceeded': [
    { ...a({}), shares: { s: { order: 'a0', allowance: 'limit', line: 'a', loss: '3 dB' } } },
    'shares',
    's',
    'loss',
  ],
  'shares-exceed-allowance': [
    { ...a({}), shares: { s: { order: 'a0', allowance: 'limit', line: 'a', loss: '11.5 dB' } } },
    'allowances',
    'limit',
    'requiredMargin',
  ],
  'share-unclear': [{ shares: { s: { order: 'a0', allowance: 'limit', loss: '3 dB' } } }, 'shares', 's', null],
  'other-conditions': [a({ conditionTemperature: '85 °C' }), 'lines', 'a', 'conditionTemperature'],
  'covers-not-said': [a({ kind: 'connector' }), 'lines', 'a', 'covers'],
  'covers-not-of-kind': [a({ ...trace, covers: 'bulk' }), 'lines', 'a', 'covers'],
  'curve-not-judged': [judged({ curve: '1..10 GHz: 1' }), 'allowances', 'limit', 'curve'],
  'floor-not-judged': [judged({ returnLossFloor: '10 dB' }), 'allowances', 'limit', 'returnLossFloor'],
  'lane-beyond-count': [
    { head: { ...head, laneCount: 1 }, ...a({}), laneValues: { 'a/2/loss': '5 dB' } },
    'lines',
    'a',
    null,
  ],
  'lane-value-not-used': [
    { head: { ...head, laneCount: 2 }, ...a({}), laneValues: { 'a/2/stub': '0.3 mm' } },
    'lines',
    'a',
    'stub',
  ],
  'count-not-used': [a({ count: 2 }), 'lines', 'a', 'count'],
  'skew-adds': [
    { lines: { a: line('a1', '1 dB', { ...trace, skew: '8 ps' }), b: line('a2', '1 dB', { ...trace, skew: '8 ps' }) } },
    'allowances',
    'limit',
    null,
  ],
}

describe('the closed list of flags', () => {
  it.each(Object.entries(RAISED))(
    '%s is raised, and hangs where it can be put right',
    (code, [parts, section, id, field]) => {
      const found = evaluate(link(parts), new Map()).flags.filter((flag) => flag.code === code)
      expect(found).toEqual([expect.objectContaining({ section, id, field, severity: FLAGS[code as FlagCode][0] })])
      expect(found[0]?.message).toMatch(/^['A-Z].*\.$/s)
      expect(found[0]?.todo).toMatch(/^[A-Z].*\.$/s)
    },
  )

  it('a link in order raises none', () => {
    expect(evaluate(link({ lines: { a: line('a1', '4 dB', trace) } }), new Map()).flags).toEqual([])
  })

  it('problems come first, then warnings, then notices', () => {
    const { flags } = evaluate(
      link({ lines: { a: line('a1', null, { kind: 'connector', group: 'none' }) } }),
      new Map(),
    )
    expect(flags.map(({ severity }) => severity)).toEqual(['problem', 'warning', 'notice'])
  })

  it('messages name the line by its name', () => {
    const { flags } = evaluate(link(a({ name: 'Backplane via, near', group: 'none' })), new Map())
    expect(flags[0]?.message).toBe(
      "'Backplane via, near' is said to vary on its own without a reason; it stays in the group of its assembly.",
    )
    expect(evaluate(link(a({ name: null, group: 'none' })), new Map()).flags[0]?.message).toMatch(
      /^Line without a name \(a\) is said/,
    )
  })
})

describe('packages and planes (practice.md D3)', () => {
  it('bump to bump wants a package at either end', () => {
    const bumps = planes({ code: 'tx-bump' }, { code: 'rx-bump' })
    const piece = (order: string, kind: 'package' | 'trace') => line(order, '1 dB', { kind })
    const codes = (lines: BudgetFile['lines']) =>
      evaluate(link({ ...bumps, lines }), new Map())
        .flags.filter(({ code }) => code === 'no-package-from-bump')
        .map(({ field }) => field)
    expect(codes({ a: piece('a1', 'trace') })).toEqual(['from', 'to'])
    expect(codes({ a: piece('a1', 'package'), b: piece('a2', 'trace') })).toEqual(['to'])
    expect(codes({ a: piece('a1', 'trace'), b: piece('a2', 'package') })).toEqual(['from'])
    expect(codes({ a: piece('a1', 'package'), b: piece('a2', 'trace'), c: piece('a3', 'package') })).toEqual([])
  })

  it('packages outside the planes are held against what the limit presumes, end by end', () => {
    const lines = {
      p: line('Zz', '2 dB', { kind: 'package' }),
      q: line('Zzz', '1.5 dB', { kind: 'package' }),
      t: line('a1', '1 dB', trace),
      r: line('z1', '2.9 dB', { kind: 'package' }),
    }
    const { flags } = evaluate(link({ ...judged({ presumedPackage: '3 dB' }), lines }), new Map())
    expect(flags.filter(({ code }) => code === 'package-above-presumed').map(({ message }) => message)).toEqual([
      "'Line Zz' and 'Line Zzz': 3.50 dB of package at one end; 'Ball to ball' presumes at most 3.00 dB.",
    ])
  })
})
