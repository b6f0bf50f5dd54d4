import { describe, expect, it } from 'vitest'
import { evaluate } from '../../lib/budget/evaluate'
import { FLAGS, type FlagCode } from '../../lib/budget/flags'
import type { BudgetFile } from '../../lib/budget/schema'
import { PAIR } from './crossSections'
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

/** Flags that need the contents of a file or a whole drawing, and the test that raises them. */
const ELSEWHERE = {
  'delay-longer-than-length': 'mistakes/d2',
  'loss-at-low-end': 'mistakes/d2',
  'rises-after-removal': 'mistakes/d2',
  'gain-after-removal': 'mistakes/d2',
  'renormalised-differs': 'mistakes/d5',
  'port-pairs-doubtful': 'mistakes/d5',
  'evidence-not-read': 'network',
  'nothing-passes': 'network',
  'not-reciprocal': 'network',
  'not-causal': 'network',
  'stub-resonance-near': 'models/via',
  'evidence-unreadable': 'network',
  'port-map-missing': 'network',
  'port-map-unreadable': 'network',
  'fixtures-not-removed': 'networkLong',
  'not-fitted': 'networkLong',
  'modes-missing': 'network',
  'port-map-guessed': 'network',
  'port-map-doubtful': 'network',
  'not-passive': 'network',
  'coarse-file': 'network',
  'fit-differs': 'networkLong',
  'fixtures-differ': 'networkLong',
  'cascade-differs': 'cascade',
} as const satisfies Partial<Record<FlagCode, string>>

const file = (rest: object) => ({
  evidence: { e: { order: 'a0', name: 'part', ports: 2, fixtures: 'none' as const, ...rest } },
})
const via = { kind: 'via', boardThickness: '3 mm', usedDepth: '1 mm', stub: '1 mm' } as const
const perLength = { ...trace, model: 'per-length', length: '3 in' } as const
const board = { assemblies: { b: { order: 'a0', name: 'Board' } } }
const lossClass = (order: string, layer: string, rest: object = {}) => ({
  order,
  assembly: 'b',
  layer,
  lossPerLength: '1 dB/in',
  at: '10 GHz',
  ...rest,
})
const ofClass = { ...trace, assembly: 'b', model: 'class', lossClass: 'm', length: '2 in' } as const

/** For every other flag that exists, a budget that raises it, and where it hangs: section, id, field. */
const RAISED: Readonly<
  Record<
    Exclude<FlagCode, keyof typeof ELSEWHERE>,
    readonly [Partial<BudgetFile>, string, string | null, string | null]
  >
> = {
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
  'evidence-missing': [a({ model: 'network', taken: 'discrete' }), 'lines', 'a', 'evidence'],
  'varies-not-used': [a({ varies: 'width 10 %' }), 'lines', 'a', 'varies'],
  'limit-not-moved': [judged({ usedAt: '5 GHz' }), 'allowances', 'limit', 'usedAt'],
  'limit-moved': [judged({ usedAt: '5 GHz', curve: '0.05..10 GHz: 1 + 3.4 sqrt(f)' }), 'allowances', 'limit', 'usedAt'],
  'corner-does-not-move': [
    { ...a({ kind: 'via' }), ...corner({ temperature: '65 °C' }) },
    'lines',
    'a',
    'conditionTemperature',
  ],
  'varies-beyond-model': [a({ ...PAIR, varies: 'gap 6 mil' }), 'lines', 'a', 'varies'],
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
  'below-copper-floor': [
    a({ ...perLength, width: '5 mil', lossPerLength: '0.1 dB/in' }),
    'lines',
    'a',
    'lossPerLength',
  ],
  'per-length-unusual': [a({ ...perLength, lossPerLength: '2000 dB/m' }), 'lines', 'a', 'lossPerLength'],
  'unit-suspected': [a({ ...perLength, lossPerLength: '0.9 dB/m' }), 'lines', 'a', 'lossPerLength'],
  'anchor-far': [a({ ...PAIR, anchor: '1 GHz' }), 'lines', 'a', 'anchor'],
  'smooth-copper': [a({ ...PAIR, roughness: 'smooth' }), 'lines', 'a', 'roughness'],
  'laminate-unproven': [a({ ...PAIR, method: null }), 'lines', 'a', 'method'],
  'model-below-coupon': [
    {
      ...board,
      lossClasses: {
        m: lossClass('a0', 'L3', { width: '5 mil', lossPerLength: '0.8 dB/in', basis: 'simulated' }),
        c: lossClass('a1', 'L3', { width: '5 mil', basis: 'measured' }),
      },
      ...a({ ...ofClass, basis: null }),
    },
    'lines',
    'a',
    'lossClass',
  ],
  'class-of-other-layer': [
    { ...board, lossClasses: { m: lossClass('a0', 'L3') }, ...a({ ...ofClass, layer: 'L5' }) },
    'lines',
    'a',
    'lossClass',
  ],
  'layer-not-in-assembly': [
    {
      ...board,
      layers: { l: { order: 'a0', assembly: 'b', name: 'L3' } },
      ...a({ ...trace, assembly: 'b', layer: 'L5' }),
    },
    'lines',
    'a',
    'layer',
  ],
  'stub-depth-mismatch': [a(via), 'lines', 'a', 'stub'],
  'lane-outlier': [
    { head: { ...head, laneCount: 8 }, ...a({}), laneValues: { 'a/3/loss': '6 dB' } },
    'lines',
    'a',
    'loss',
  ],
  'impedance-differs': [a({ ...trace, impedance: '85 Ω' }), 'lines', 'a', 'impedance'],
  'reference-differs': [
    { ...a({ evidence: 'e' }), ...file({ modes: 'mixed-as-two-ports', reference: '85 Ω' }) },
    'lines',
    'a',
    'evidence',
  ],
  'two-port-not-answered': [{ ...a({ evidence: 'e' }), ...file({}) }, 'lines', 'a', 'evidence'],
  'single-ended-taken-as-differential': [
    { ...a({ evidence: 'e' }), ...file({ modes: 'single-ended' }) },
    'lines',
    'a',
    'evidence',
  ],
  'fixtures-not-said': [
    { ...a({ evidence: 'e' }), ...file({ modes: 'mixed-as-two-ports', fixtures: null }) },
    'lines',
    'a',
    'evidence',
  ],
  'fixtures-removed-twice': [
    { ...a({ evidence: 'e', fixture: 'e' }), ...file({ modes: 'mixed-as-two-ports', fixtures: 'removed' }) },
    'lines',
    'a',
    'fixture',
  ],
  'fixtures-removed-within-planes': [
    {
      ...a({ evidence: 'e' }),
      ...file({ modes: 'mixed-as-two-ports', fixtures: 'removed' }),
      ...planes({ code: 'tp1' }, { code: 'board-edge' }),
    },
    'lines',
    'a',
    'evidence',
  ],
  'no-die-from-die': [
    { ...a({ kind: 'package', covers: '' }), ...planes({ code: 'tx-die' }, {}) },
    'allowances',
    'limit',
    'from',
  ],
  'inside-on-guesses': [a({ basis: 'estimate' }, '9 dB'), 'allowances', 'limit', null],
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
