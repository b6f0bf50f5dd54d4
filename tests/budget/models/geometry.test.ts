import { describe, expect, it } from 'vitest'
import { geometry } from '../../../lib/budget/models/geometry'
import { GEOMETRY_BOUNDS } from '../../../lib/budget/models/geometryBounds'
import type { Values } from '../../../lib/budget/models/piece'
import type { Structure } from '../../../lib/channel/lines/structures'
import { ask, codes, computed, counted, edgesOf, inserted, type LineFile, pieceOf } from './ask'

const common = {
  kind: 'trace',
  model: 'geometry',
  length: '4 in',
  width: '5 mil',
  gap: '6 mil',
  thickness: '0.6 mil',
  heightBelow: '5 mil',
  heightAbove: '7 mil',
  dk: '3.6',
  df: '0.004',
  anchor: '10 GHz',
  method: 'split-post',
  roughness: 'smooth',
} as const satisfies Partial<LineFile>
const STRUCTURES: readonly Structure[] = ['microstrip', 'stripline', 'coupled-microstrip', 'coupled-stripline']
const of = (structure: Structure, rest: Partial<LineFile> = {}) => ask(geometry, { ...common, structure, ...rest })
const db = (structure: Structure, rest: Partial<LineFile> = {}, hz = 10e9) =>
  counted(pieceOf(of(structure, rest)), hz) as number

describe('A trace from its cross-section', () => {
  it('of a board, worked by hand: 5 mil between planes 13 mil apart loses 0.5920 dB/in at 12.89 GHz (incremental inductance rule and dielectric; within 0.5 %)', () => {
    const trace = { heightBelow: '6.2 mil', heightAbove: '6.2 mil', anchor: '12.890625 GHz', length: '1 in' }
    expect(Math.abs(db('stripline', trace, 12.890625e9) / 0.592 - 1)).toBeLessThan(0.005)
  })

  it('names what it rests on in SI, only what is there', () => {
    expect(computed(of('coupled-stripline', { etch: '0.5 mil' })).values).toEqual({
      length: expect.closeTo(0.1016, 12),
      width: expect.closeTo(127e-6, 12),
      gap: expect.closeTo(152.4e-6, 12),
      thickness: expect.closeTo(15.24e-6, 12),
      heightBelow: expect.closeTo(127e-6, 12),
      heightAbove: expect.closeTo(177.8e-6, 12),
      etch: expect.closeTo(12.7e-6, 12),
      dk: 3.6,
      df: 0.004,
    })
    expect(
      Object.keys(
        computed(of('microstrip', { roughness: 'cannonball', roughnessTop: '2 µm', roughnessBottom: '4 µm' })).values,
      ),
    ).toEqual(['length', 'width', 'thickness', 'heightBelow', 'roughnessTop', 'roughnessBottom', 'dk', 'df'])
  })

  it('of length 0 is nothing, in every reference', () => {
    for (const structure of STRUCTURES) {
      const piece = pieceOf(of(structure, { length: '0 in' }))
      expect(counted(piece, 10e9)).toBe(0)
      expect(inserted(piece, 10e9, 85)).toBeCloseTo(0, 12)
    }
  })

  it('counts its attenuation; its two-port is that of the pair in the differential reference', () => {
    for (const structure of STRUCTURES) {
      const piece = pieceOf(of(structure))
      const attenuation = counted(piece, 10e9) as number
      expect(piece).toMatchObject({ reflects: true, uncertainty: 0.15, from: 1e6 })
      expect(inserted(piece, 10e9, 100)).toBeGreaterThan(attenuation)
      // The loss in the reference has its least, the attenuation, near the pair's own impedance.
      const losses = Array.from({ length: 160 }, (_, i) => inserted(piece, 10e9, 60 + i) as number)
      const own = 60 + losses.indexOf(Math.min(...losses))
      expect(Math.min(...losses) - attenuation).toBeLessThan(0.002)
      expect(own).toBeGreaterThan(85)
      expect(own).toBeLessThan(150)
    }
  })

  it('far apart loses as two single lines do', () => {
    expect(db('coupled-stripline', { gap: '200 mil' }) / db('stripline')).toBeCloseTo(1, 9)
    expect(Math.abs(db('coupled-microstrip', { gap: '49 mil' }) / db('microstrip') - 1)).toBeLessThan(0.012)
  })

  it('without roughness and with a height of 0 is the same; every model of roughness adds', () => {
    for (const structure of STRUCTURES) {
      const smooth = db(structure)
      for (const roughness of ['hammerstad', 'cannonball'] as const) {
        const rough = (rz: string) => db(structure, { roughness, roughnessTop: rz, roughnessBottom: rz })
        expect(rough('0 µm')).toBe(smooth)
        expect(rough('3 µm')).toBeGreaterThan(smooth * 1.1)
      }
      const huray = db(structure, { roughness: 'huray', areaRatio: '1', nodules: '0.18 µm 4.88692' })
      // From memory: the cannonball stack of Rz 3 µm is these spheres.
      expect(huray).toBeCloseTo(
        db(structure, { roughness: 'cannonball', roughnessTop: '2 µm', roughnessBottom: '4 µm' }),
        6,
      )
    }
  })

  it('etched loses like the rectangle of its mean width at the same pitch', () => {
    expect(db('coupled-stripline', { etch: '1 mil' })).toBeCloseTo(
      db('coupled-stripline', { width: '4.5 mil', gap: '6.5 mil' }),
      9,
    )
  })

  it('is warmer lossier by the copper, 1.057 at 50 °C (0.00393 from memory), and wetter by the dielectric', () => {
    const at = (surroundings: object, rest: Partial<LineFile> = {}) =>
      counted(pieceOf(ask(geometry, { ...common, structure: 'stripline', ...rest }, { surroundings })), 10e9) as number
    const dry = { df: '0' }
    expect(at({ temperature: 50 }, dry) / at({}, dry)).toBeCloseTo(1.05731, 3)
    expect(at({ dfFactor: 1.5 })).toBeCloseTo(at({}, { df: '0.006' }), 12)
    expect(at({ dfAdded: 0.002 })).toBeCloseTo(at({}, { df: '0.006' }), 12)
    expect(at({ dkAdded: 0.1 })).toBeCloseTo(at({}, { dk: '3.7' }), 12)
    // Worked by hand: 0.0018 on εr 3.6 at 12.890625 GHz is 0.1018 dB/in.
    const piece = (surroundings: object) =>
      pieceOf(
        ask(geometry, { ...common, structure: 'stripline', length: '1 in', anchor: '12.890625 GHz' }, { surroundings }),
      )
    const grown =
      (counted(piece({ dfAdded: 0.0018 }), 12.890625e9) as number) - (counted(piece({}), 12.890625e9) as number)
    expect(Math.abs(grown / 0.1018 - 1)).toBeLessThan(0.006)
  })

  it('takes a coupon’s factor on its attenuation, and then no uncertainty of the formulas', () => {
    const scaled = pieceOf(of('stripline', { scale: '1.2' }))
    expect(counted(scaled, 10e9)).toBeCloseTo(1.2 * db('stripline'), 12)
    expect(scaled.uncertainty).toBe(0)
    expect(inserted(scaled, 10e9, 110)).toBeGreaterThan(inserted(pieceOf(of('stripline')), 10e9, 110) as number)
  })

  it('can be built with other values than those typed', () => {
    const found = of('coupled-stripline')
    expect(counted(pieceOf(found, { width: 100e-6 }), 10e9)).toBeCloseTo(
      db('coupled-stripline', { width: '0.1 mm' }),
      12,
    )
    const vanished: Values[] = [{ width: -1e-6 }, { gap: 0 }, { heightAbove: -1e-6 }, { etch: 300e-6 }]
    for (const gone of vanished) expect(counted(pieceOf(found, gone), 10e9)).toBeNaN()
  })

  it('ends where its formulas do: a pair of microstrips 1 mm above its plane at 25 GHz (from memory)', () => {
    const thick = { width: '1 mm', gap: '1 mm', heightBelow: '1 mm' }
    expect(pieceOf(of('coupled-microstrip', thick)).to).toBeCloseTo(25e9, 0)
    expect(pieceOf(of('coupled-stripline')).to).toBe(1e11)
  })
})

describe('What is not said', () => {
  const said = (rest: Partial<LineFile>) =>
    of('coupled-stripline', rest).drafts.map(({ code, field }) => `${code} ${field}`)

  it('is asked for: every field that a number needs, the anchor and the roughness among them', () => {
    for (const field of [
      'length',
      'width',
      'gap',
      'thickness',
      'heightBelow',
      'heightAbove',
      'dk',
      'df',
      'anchor',
      'roughness',
    ] as const) {
      expect(said({ [field]: null })).toEqual([`field-missing ${field}`])
      expect(of('coupled-stripline', { [field]: null }).found).toBeNull()
    }
    expect(codes(ask(geometry, common))).toEqual(['field-missing'])
    expect(said({ roughness: 'cannonball' })).toEqual(['field-missing roughnessTop', 'field-missing roughnessBottom'])
    expect(said({ roughness: 'huray' })).toEqual(['field-missing areaRatio', 'field-missing nodules'])
    expect(said({ roughness: 'huray', areaRatio: '1', nodules: '0.5 3.2' })).toEqual(['unreadable-value nodules'])
    expect(said({ width: null, df: null })).toEqual(['field-missing width', 'field-missing df'])
  })

  it('does not matter where the structure has no such thing', () => {
    expect(codes(of('microstrip', { gap: null, heightAbove: null }))).toEqual([])
    expect(codes(of('stripline', { gap: null }))).toEqual([])
  })
})

describe('Every bound', () => {
  const own = { etch: '0.5 mil' }
  for (const structure of STRUCTURES) {
    const { values } = computed(of(structure, own))
    const edges = edgesOf(GEOMETRY_BOUNDS[structure], { ...values, anchor: 10e9 })
    it.each(edges)(
      `of a ${structure} holds just inside and is said just outside: $bound.what, $end`,
      ({ bound, inside, outside }) => {
        const unit = bound.field === 'anchor' ? ' Hz' : bound.field === 'dk' ? '' : ' m'
        const messages = (value: number) =>
          of(structure, { ...own, [bound.field]: `${value}${unit}` }).drafts.filter(({ message }) =>
            message.includes(`its ${bound.what} is`),
          )
        expect(messages(inside)).toEqual([])
        expect(messages(outside)).toEqual([expect.objectContaining({ code: 'outside-validity', field: bound.field })])
        expect(of(structure, { ...own, [bound.field]: `${outside}${unit}` }).found).toBeNull()
      },
    )
    it(`of a ${structure} is among those: as many ends as it has bounds`, () => {
      const ends = { microstrip: 8, stripline: 8, 'coupled-microstrip': 12, 'coupled-stripline': 10 }
      expect(edges).toHaveLength(ends[structure])
    })
  }
})
