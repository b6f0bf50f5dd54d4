import { describe, expect, it } from 'vitest'
import { network } from '../../lib/channel/networks/network'
import { count, fourPorts, networkOf, SECTION } from './countByFile'
import { attenuator, constantly, evidenceOf, fileOf, GRID, lossOf, type Section, scattering, steps } from './sections'

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
