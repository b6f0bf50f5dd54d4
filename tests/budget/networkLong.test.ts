import { describe, expect, it } from 'vitest'
import { count } from './countByFile'
import { attenuator, constantly, fileOf, lossOf, type Section, steps } from './sections'

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
