import { describe, expect, it } from 'vitest'
import { evaluate } from '../../lib/budget/evaluate'
import type { EvidenceNetwork, LineEvaluation } from '../../lib/budget/evaluation'
import type { BudgetFile } from '../../lib/budget/schema'
import { network } from '../../lib/channel/networks/network'
import { link } from './links'
import {
  attenuator,
  constantly,
  evidenceOf,
  fileLine,
  fileOf,
  GRID,
  lossOf,
  type Section,
  scattering,
  steps,
} from './sections'

type Files = Readonly<Record<string, EvidenceNetwork | null>>
type LineFile = NonNullable<BudgetFile['lines']>[string]
type Record_ = NonNullable<BudgetFile['evidence']>[string]

type Asked = {
  readonly line?: Partial<LineFile>
  readonly record?: Partial<Record_>
  readonly modes?: Record_['modes']
  readonly head?: Partial<BudgetFile['head']>
}

/** One line that counts by the file 'a', at 10 GHz in 100 Ω. */
function count(files: Files, { line = {}, record = {}, modes = 'mixed-as-two-ports', head = {} }: Asked = {}) {
  const { evidence, read } = evidenceOf(files, modes)
  const records = evidence.a ? { ...evidence, a: { ...evidence.a, ...record } } : evidence
  const lines = { l: fileLine('a1', 'a', line) }
  const budget = link({ head: { ...link({}).head, ...head }, evidence: records, lines })
  const evaluation = evaluate(budget, read)
  const found = evaluation.lines.l as LineEvaluation
  return {
    db: found.loss.nominalDb,
    by: found.loss.by,
    beside: Object.fromEntries(found.loss.beside.map(({ what, db }) => [what, db])),
    flags: evaluation.flags.filter(({ id }) => id === 'l').map(({ code, field }) => `${code} ${field}`),
    allowance: evaluation.allowances[0],
  }
}

const SECTION: Section = { ohm: 78, delay: 110e-12, db: (hz) => 0.3 * Math.sqrt(hz / 1e9) }

describe('a network taken as a discrete (ABCD matrices, computed once more in the test)', () => {
  it('counts −20 log10|Sdd21| in the reference of the link; beside it what it is in its own', () => {
    const found = count({ a: fileOf([SECTION], GRID, 85) })
    expect(found.db).toBeCloseTo(lossOf([SECTION], 10e9, 100), 10)
    expect(found.beside.native).toBeCloseTo(lossOf([SECTION], 10e9, 85), 10)
    expect(found.by).toBe('measured')
    const [[re, im]] = scattering([SECTION], 10e9, 100)
    expect(found.beside.dissipated).toBeCloseTo((found.db ?? 0) + 10 * Math.log10(1 - re * re - im * im), 10)
    expect(found.flags).toEqual([])
  })

  it('says so where the two differ by more than 0.2 dB', () => {
    const odd: Section = { ohm: 60, delay: 25e-12 }
    expect(lossOf([odd], 10e9, 100) - lossOf([odd], 10e9, 60)).toBeGreaterThan(0.2)
    expect(count({ a: fileOf([odd], GRID, 60) }).flags).toContain('renormalised-differs evidence')
  })

  it('at a typed reference reads a pair saved as two ports in it, whatever the file says', () => {
    const found = count({ a: fileOf([SECTION], GRID, 50) }, { record: { reference: '92 Ω' } })
    // The same numbers of S, read in 92 Ω.
    const same = count({ a: { network: network(2, GRID, networkOf(fileOf([SECTION], GRID, 50)).s, 92) } })
    expect(found.db).toBeCloseTo(same.db ?? Number.NaN, 12)
    expect(found.db).not.toBeCloseTo(lossOf([SECTION], 10e9, 100), 3)
  })

  it('single-ended of two ports: two such lines without coupling, twice the impedance at twice the reference', () => {
    const found = count({ a: fileOf([SECTION], GRID, 50) }, { modes: 'single-ended' })
    expect(found.db).toBeCloseTo(lossOf([{ ...SECTION, ohm: 2 * SECTION.ohm }], 10e9, 100), 10)
    expect(found.flags).toContain('single-ended-taken-as-differential evidence')
  })

  it('nothing is taken beyond the file but 2 % at its end, and what it says there is the end itself', () => {
    const upTo = (hz: number) => Float64Array.from({ length: 100 }, (_, k) => (hz * (k + 1)) / 100)
    const edge = count({ a: fileOf([SECTION], upTo(9.9e9), 85) })
    expect(edge.db).toBeCloseTo(lossOf([SECTION], 9.9e9, 100), 10)
    expect(edge.beside.native).toBeCloseTo(lossOf([SECTION], 9.9e9, 85), 10)
    const beyond = count({ a: fileOf([SECTION], upTo(9.7e9)) })
    expect(beyond.db).toBeNull()
    expect(beyond.flags).toEqual(['outside-validity evidence'])
    expect(beyond.allowance).toMatchObject({ verdict: 'undecided', lossDb: null })
    const above = count({ a: fileOf([SECTION], Float64Array.of(11e9, 12e9)) })
    expect([above.db, above.flags]).toEqual([null, ['outside-validity evidence']])
  })

  it('reversed in time, or lossy one way only, says so (IEEE 370 metrics)', () => {
    const read = fileOf([SECTION], GRID, 85)
    if (!read || !('network' in read)) throw new Error('no network')
    const reversed = { ...read.network, s: read.network.s.map((part, at) => (at % 2 === 1 ? -part : part)) }
    expect(count({ a: read }).flags).toEqual([])
    expect(count({ a: { network: reversed } }).flags).toContain('not-causal evidence')
    const oneWay = {
      ...read.network,
      s: read.network.s.map((part, at) => (at % 8 === 2 || at % 8 === 3 ? part / 2 : part)),
    }
    expect(count({ a: { network: oneWay } }).flags).toContain('not-reciprocal evidence')
  })

  it('that lets nothing through has no number', () => {
    const closed = network(2, GRID, new Float64Array(8 * GRID.length), 100)
    expect(count({ a: { network: closed } })).toMatchObject({
      db: null,
      flags: expect.arrayContaining(['nothing-passes model']),
    })
  })

  it('counts nothing without its file, and says what is wrong with it', () => {
    const none = evidenceOf({}).read
    expect(none.size).toBe(0)
    expect(count({}, { line: { evidence: null } })).toMatchObject({ db: null, flags: ['evidence-missing evidence'] })
    expect(count({}).flags).toContain('evidence-missing evidence')
    expect(count({ a: fileOf([SECTION], GRID) }, { record: { removed: true } }).flags).toContain(
      'evidence-missing evidence',
    )
    expect(count({ a: null })).toMatchObject({ db: null, flags: ['evidence-not-read evidence'] })
    const broken = count({ a: { problem: 'Line 3: no number.' } })
    expect(broken).toMatchObject({ db: null, flags: ['evidence-unreadable evidence'] })
    expect(count({ a: fileOf([SECTION], GRID) }, { modes: null })).toMatchObject({ db: null })
    expect(count({ a: fileOf([SECTION], GRID) }, { modes: null }).flags).toContain('modes-missing evidence')
    expect(count({ a: fileOf([SECTION], GRID) }, { line: { taken: null } })).toMatchObject({
      db: null,
      flags: ['field-missing taken'],
    })
  })

  it('flags what gives out more than it takes in, and points too far apart', () => {
    const gain = count({ a: constantly(GRID, () => attenuator(-1)) })
    expect(gain.flags).toContain('not-passive evidence')
    expect(gain.db).toBeCloseTo(-1, 10)
    // A tolerance in % of it is no less one.
    const varied = count({ a: constantly(GRID, () => attenuator(-1)) }, { line: { tolerancePlus: '5 %' } })
    expect(varied.allowance?.worstDb).toBeCloseTo(-0.95, 10)
    const wide = steps(1e9, 20)
    const turning: Section = { ohm: 100, delay: 480e-12, db: (hz) => 0.3 * Math.sqrt(hz / 1e9) }
    expect(count({ a: fileOf([turning], wide) }).flags).toContain('coarse-file evidence')
    expect(count({ a: fileOf([turning], GRID) }).flags).toEqual([])
  })
})

function networkOf(file: EvidenceNetwork) {
  if (!('network' in file)) throw new Error('no network')
  return file.network
}

/** Four ports of two lines without coupling, single-ended 50 Ω; pairs (1,3)→(2,4), or (1,2)→(3,4). */
function fourPorts(section: Section, order: readonly [number, number, number, number]): EvidenceNetwork {
  const s = new Float64Array(32 * GRID.length)
  const [p1, q1, p2, q2] = order
  GRID.forEach((hz, k) => {
    const [s11, s12, s21, s22] = scattering([section], hz, 50)
    const put = (row: number, column: number, [re, im]: readonly [number, number]) => {
      s[32 * k + 2 * (4 * row + column)] = re
      s[32 * k + 2 * (4 * row + column) + 1] = im
    }
    for (const [a, b] of [
      [p1, p2],
      [q1, q2],
    ] as const) {
      put(a, a, s11)
      put(a, b, s12)
      put(b, a, s21)
      put(b, b, s22)
    }
  })
  return { network: network(4, GRID, s, 50) }
}

describe('a network of four ports', () => {
  const single: Section = { ohm: 43, delay: 110e-12, db: (hz) => 0.2 * Math.sqrt(hz / 1e9) }
  const pair = lossOf([{ ...single, ohm: 86 }], 10e9, 100)

  it.each([
    ['1,3>2,4', [0, 2, 1, 3]],
    ['1,2>3,4', [0, 1, 2, 3]],
  ] as const)('%s: found at low frequency, with a notice; typed, without one', (typed, order) => {
    const guessed = count({ a: fourPorts(single, order) }, { modes: 'single-ended' })
    expect(guessed.db).toBeCloseTo(pair, 10)
    expect(guessed.flags).toEqual(['port-map-guessed portMap'])
    const said = count({ a: fourPorts(single, order) }, { modes: 'single-ended', line: { portMap: typed } })
    expect(said.db).toBeCloseTo(pair, 10)
    expect(said.flags).toEqual([])
    // Either polarity: the pair as a whole turned round.
    const [plus, minus] = typed === '1,3>2,4' ? ['3,1', '4,2'] : ['2,1', '4,3']
    const turned = count(
      { a: fourPorts(single, order) },
      { modes: 'single-ended', line: { portMap: `${plus}>${minus}` } },
    )
    expect(turned.db).toBeCloseTo(pair, 10)
  })

  it('a wrong map lets nothing through, or is doubted; an unreadable one is refused', () => {
    const wrong = count({ a: fourPorts(single, [0, 2, 1, 3]) }, { modes: 'single-ended', line: { portMap: '1,2>3,4' } })
    expect(wrong.db).not.toBe(pair)
    expect(wrong.flags.join()).toMatch(/nothing-passes|port-pairs-doubtful/)
    const unreadable = count(
      { a: fourPorts(single, [0, 2, 1, 3]) },
      { modes: 'single-ended', line: { portMap: '1,9>2,4' } },
    )
    expect([unreadable.db, unreadable.flags]).toEqual([null, ['port-map-unreadable portMap']])
  })

  it('without a plain through its ports are a doubtful guess, and three ports none', () => {
    const mixed = GRID.length * 32
    const s = new Float64Array(mixed)
    for (let k = 0; k < GRID.length; k++)
      for (let row = 0; row < 4; row++)
        for (let column = 0; column < 4; column++) s[32 * k + 2 * (4 * row + column)] = row === column ? 0 : 0.3
    expect(count({ a: { network: network(4, GRID, s, 50) } }, { modes: 'single-ended' }).flags).toContain(
      'port-map-doubtful portMap',
    )
    const three = network(3, GRID, new Float64Array(18 * GRID.length), 50)
    expect(count({ a: { network: three } }, { modes: 'single-ended' })).toMatchObject({
      db: null,
      flags: ['port-map-missing portMap'],
    })
  })
})

describe('a network taken as a long uniform line', () => {
  /** 0.05 to 25.75 GHz; 25.78125 Gb/s NRZ, Nyquist 12.890625 GHz. */
  const hz = Float64Array.from({ length: 515 }, (_, k) => 0.05e9 * (k + 1))
  const smooth = (f: number) => 0.2 + 1.1 * Math.sqrt(f) + 0.35 * f + 0.006 * f * f
  const rippled = (f: number) => smooth(f) + 0.3 * Math.cos(Math.PI * f)
  const head = { bitRate: '25.78125 Gb/s' }
  const line = { taken: 'long-uniform' as const }
  const nyquist = 12.890625

  it('counts its fitted loss: what was put in, where nothing ripples', () => {
    const found = count({ a: constantly(hz, (at) => attenuator(smooth(at / 1e9))) }, { head, line })
    expect(found.db).toBeCloseTo(smooth(nyquist), 5)
    expect(found.beside.point).toBeCloseTo(smooth(nyquist), 4)
    expect(found.flags).toEqual([])
  })

  it('9.67376 dB of a rippled one (plain Python), with the point value beside it and flagged at 0.30 dB apart', () => {
    const found = count({ a: constantly(hz, (at) => attenuator(rippled(at / 1e9))) }, { head, line })
    expect(found.db).toBeCloseTo(9.67376, 4)
    const [below, above] = [12.85, 12.9].map((f) => 10 ** (-rippled(f) / 20)) as [number, number]
    const between = -20 * Math.log10(below + ((above - below) * (nyquist - 12.85)) / 0.05)
    expect(found.beside.point).toBeCloseTo(between, 6)
    expect(found.beside.mismatch).toBeCloseTo(between - 9.67376, 4)
    expect(found.flags).toContain('fit-differs taken')
  })

  it('0.2 dB apart is not said, a little more is', () => {
    const flags = (size: number) => {
      const db = (f: number) => smooth(f) + size * Math.cos(Math.PI * f)
      const found = count({ a: constantly(hz, (at) => attenuator(db(at / 1e9))) }, { head, line })
      return [Math.abs((found.db ?? 0) - (found.beside.point ?? 0)), found.flags.includes('fit-differs taken')] as const
    }
    const [apart] = flags(0.2)
    const scale = 0.2 / apart
    const under = flags(0.2 * scale * 0.98)
    const over = flags(0.2 * scale * 1.03)
    expect(under[0]).toBeLessThan(0.2)
    expect(over[0]).toBeGreaterThan(0.2)
    expect([under[1], over[1]]).toEqual([false, true])
  })

  it('is fitted from the file renormalised to the link', () => {
    const long: Section = { ohm: 100, delay: 2e-9, db: (at) => smooth(at / 1e9) }
    const found = count({ a: fileOf([long], hz, 50) }, { head, line })
    expect(found.db).toBeCloseTo(smooth(nyquist), 4)
  })

  it('cannot be fitted with too few points: a problem', () => {
    const few = Float64Array.of(1e9, 5e9, 10e9, 13e9, 20e9)
    const found = count({ a: constantly(few, () => attenuator(1)) }, { head, line })
    expect([found.db, found.flags]).toEqual([null, ['not-fitted taken']])
  })
})

describe('a network taken per length, from two lengths with the same ends', () => {
  const hz = steps(10e6, 2000)
  const perMetre = (at: number) => 6 * Math.sqrt(at / 1e9) + 1.1 * (at / 1e9)
  const of = (metres: number): Section => ({ ohm: 93, delay: 5.8e-9 * metres, db: (at) => perMetre(at) * metres })
  const launch: Section = { ohm: 70, delay: 25e-12, db: (at) => 0.05 * Math.sqrt(at / 1e9) }
  const files = {
    a: fileOf([launch, of(0.3), launch], hz, 100),
    b: fileOf([launch, of(0.1), launch], hz, 100),
  }
  const line = {
    taken: 'per-length' as const,
    kind: 'trace' as const,
    length: '150 mm',
    shortEvidence: 'b',
    lengthDifference: '200 mm',
  }

  it('counts the attenuation of the line itself times its own length', () => {
    const found = count(files, { line })
    expect(found.db).toBeCloseTo(perMetre(10e9) * 0.15, 4)
    expect(found.by).toBe('measured')
    expect(found.flags).toEqual([])
  })

  it('needs both files, the difference and its length, and says which lacks', () => {
    expect(count(files, { line: { ...line, shortEvidence: null } }).flags).toEqual(['evidence-missing shortEvidence'])
    expect(count(files, { line: { ...line, lengthDifference: null } }).flags).toEqual([
      'field-missing lengthDifference',
    ])
    expect(count(files, { line: { ...line, length: null } }).flags).toEqual(['field-missing length'])
    expect(count({ ...files, b: null }, { line }).flags).toEqual(['evidence-not-read shortEvidence'])
  })

  it('the two exchanged, or with different points, give no number', () => {
    const exchanged = count({ a: files.b, b: files.a }, { line })
    expect([exchanged.db, exchanged.flags]).toEqual([null, ['not-fitted shortEvidence']])
    const other = count({ ...files, b: fileOf([launch, of(0.1), launch], steps(11e6, 1800)) }, { line })
    expect(other.db).toBeNull()
  })

  it('each of the two that gives out more than it takes in is flagged', () => {
    const active = constantly(hz, () => attenuator(-1))
    expect(count({ ...files, b: active }, { line }).flags).toContain('not-passive shortEvidence')
  })
})

describe('fixtures removed by a thru of both', () => {
  const hz = steps(10e6, 2000)
  const fixture: Section = { ohm: 96, delay: 180e-12, db: (at) => 0.12 * Math.sqrt(at / 1e9) }
  const part: Section = { ohm: 88, delay: 140e-12, db: (at) => 0.4 * Math.sqrt(at / 1e9) }
  const files = { a: fileOf([fixture, part, fixture], hz), b: fileOf([fixture, fixture], hz) }

  it('leave the part: within 0.03 dB of its own matrices', () => {
    const found = count(files, { line: { fixture: 'b' } })
    expect(Math.abs((found.db ?? 0) - lossOf([part], 10e9))).toBeLessThan(0.03)
    expect(Math.abs((count(files).db ?? 0) - lossOf([part], 10e9))).toBeGreaterThan(0.5)
  })

  it('are not removed without the thru, with another grid, or twice: flags', () => {
    expect(count({ ...files, b: null }, { line: { fixture: 'b' } })).toMatchObject({
      db: null,
      flags: ['evidence-not-read fixture'],
    })
    const other = count({ ...files, b: fileOf([fixture, fixture], steps(20e6, 1000)) }, { line: { fixture: 'b' } })
    expect([other.db, other.flags]).toEqual([null, ['fixtures-not-removed fixture']])
    expect(count(files, { line: { fixture: 'b' }, record: { fixtures: 'removed' } }).flags.join()).toMatch(
      /fixtures-removed-twice/,
    )
  })

  it('of another impedance than their thru are said to be', () => {
    const thru = fileOf(
      [
        { ...fixture, ohm: 108 },
        { ...fixture, ohm: 108 },
      ],
      hz,
    )
    expect(count({ ...files, b: thru }, { line: { fixture: 'b' } }).flags).toContain('fixtures-differ fixture')
  })
})
