import { describe, expect, it } from 'vitest'
import { PACKAGE_BOUNDS, packageLine } from '../../../lib/budget/models/packageLine'
import { cascade, insertionLoss } from '../../../lib/channel/networks'
import { shuntCapacitance } from '../../../lib/channel/pads'
import { ask, codes, computed, counted, edgesOf, inserted, pieceOf } from './ask'

/** Parameters of IEEE 802.3bj and a second section as in 802.3ck, from memory. */
const fields = {
  kind: 'package',
  model: 'package-line',
  packageGamma0: '0',
  packageA1: '1.734e-3',
  packageA2: '1.455e-4',
  packageTau: '6.141e-3',
  length: '30 mm',
  impedance: '78.2 Ω',
  padCapacitance: '180 fF',
} as const
const HZ = 12.890625e9

describe('a package line', () => {
  it('reads the standard’s units: 2.1110 dB counted, 3.6766 dB with a die of 250 fF before it (physics.md W11, from memory)', () => {
    const piece = pieceOf(ask(packageLine, fields, { hz: HZ }))
    expect(counted(piece, HZ)).toBeCloseTo(2.111, 4)
    const at = Float64Array.of(HZ)
    const whole = cascade([shuntCapacitance(250e-15, at, 100), piece.twoPort(at, 100)], 1)
    expect(insertionLoss(whole)[0]).toBeCloseTo(3.6766, 4)
    expect(piece).toMatchObject({ from: 0, reflects: true })
  })

  it('with the ball in front when mirrored: its reflections change sides', () => {
    const at = Float64Array.of(HZ)
    const forward = pieceOf(ask(packageLine, fields)).twoPort(at, 100)
    const mirrored = pieceOf(ask(packageLine, { ...fields, mirrored: true })).twoPort(at, 100)
    for (let k = 0; k < 2; k++) expect(mirrored[k]).toBeCloseTo(forward[6 + k] as number, 12)
    expect(Math.hypot(forward[0] as number, forward[1] as number)).not.toBeCloseTo(
      Math.hypot(forward[6] as number, forward[7] as number),
      2,
    )
  })

  it('counts the second section too, which may be left out but not half said', () => {
    const two = { ...fields, secondLength: '1.8 mm', secondImpedance: '92.5 Ω' } as const
    expect(counted(pieceOf(ask(packageLine, two)), HZ)).toBeCloseTo((2.111 * 31.8) / 30, 3)
    expect(inserted(pieceOf(ask(packageLine, two)), HZ)).not.toBeCloseTo(
      inserted(pieceOf(ask(packageLine, fields)), HZ) as number,
      2,
    )
    expect(codes(ask(packageLine, { ...fields, secondLength: '1.8 mm' }))).toEqual(['field-missing'])
  })

  it('needs every parameter, and none below zero', () => {
    expect(codes(ask(packageLine, { kind: 'package', model: 'package-line' }))).toEqual(Array(7).fill('field-missing'))
    const below = ask(packageLine, { ...fields, packageA2: '-1e-4' })
    expect(below).toMatchObject({ found: null, drafts: [{ code: 'outside-validity', field: 'packageA2' }] })
    expect(codes(ask(packageLine, { ...fields, packageA1: 'about 2e-3' }))).toEqual(['unreadable-value'])
  })

  const two = { ...fields, secondLength: '1.8 mm', secondImpedance: '92.5 Ω' }
  const edges = edgesOf(PACKAGE_BOUNDS, { ...computed(ask(packageLine, two)).values, hz: 10e9, reference: 100 })
  const units = {
    length: [1e3, 'mm'],
    impedance: [1, 'Ω'],
    secondImpedance: [1, 'Ω'],
    packageTau: [1e6, ''],
    padCapacitance: [1e15, 'fF'],
  } as const

  it('has eight ends of its range', () => {
    expect(edges.length).toBe(8)
  })

  it.each(edges)('$bound.what, $end: counts just inside, is flagged just outside', ({ bound, inside, outside }) => {
    const [factor, unit] = units[bound.field as keyof typeof units]
    const typed = (x: number) => ask(packageLine, { ...two, [bound.field]: `${x * factor} ${unit}`.trim() })
    expect(typed(inside).drafts).toEqual([])
    expect(typed(outside)).toMatchObject({ found: null, drafts: [{ code: 'outside-validity', field: bound.field }] })
  })
})
