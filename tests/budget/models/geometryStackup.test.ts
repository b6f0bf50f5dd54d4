import { describe, expect, it } from 'vitest'
import { Findings } from '../../../lib/budget/findings'
import type { FlagDraft } from '../../../lib/budget/flags'
import { geometry } from '../../../lib/budget/models/geometry'
import { type Computed, DRY_REFERENCE } from '../../../lib/budget/models/piece'
import type { BudgetFile } from '../../../lib/budget/schema'
import { dfAt, dkAt, widebandDebye } from '../../../lib/channel/materials/widebandDebye'
import { link } from '../links'

type LayerFile = NonNullable<BudgetFile['layers']>[string]

const dielectric = { dk: '3.6', df: '0.004', anchor: '10 GHz', method: 'split-post' } as const
/** Top first: a microstrip, a plane, prepreg, a stripline, core, another signal layer, prepreg, a plane, the bottom's microstrip. */
const LAYERS: readonly Omit<LayerFile, 'order'>[] = [
  { name: 'mask', role: 'mask', thickness: '20 µm' },
  { name: 'L1', role: 'signal', thickness: '40 µm', roughnessTop: '1 µm', roughnessBottom: '3 µm' },
  { name: 'PP1', role: 'prepreg', thickness: '100 µm', ...dielectric, dk: '3.4', df: '0.003' },
  { name: 'L2', role: 'plane', thickness: '17 µm' },
  { name: 'PP2', role: 'prepreg', thickness: '120 µm', ...dielectric },
  { name: 'L3', role: 'signal', thickness: '17 µm', roughnessTop: '2 µm', roughnessBottom: '4 µm' },
  { name: 'C3', role: 'core', thickness: '100 µm', ...dielectric, dk: '3.8', df: '0.006' },
  { name: 'L4', role: 'signal', thickness: '17 µm' },
  { name: 'PP4', role: 'prepreg', thickness: '80 µm', ...dielectric, dk: '3.2', df: '0.002' },
  { name: 'L5', role: 'plane', thickness: '17 µm' },
  { name: 'PP5', role: 'prepreg', thickness: '90 µm', ...dielectric },
  { name: 'L6', role: 'signal', thickness: '45 µm' },
]

const base = {
  order: 'a1',
  name: 'Piece',
  assembly: 'board',
  kind: 'trace',
  model: 'geometry',
  length: '4 in',
  width: '120 µm',
  gap: '150 µm',
  roughness: 'smooth',
} as const

function read(fields: object, changed: Readonly<Record<string, Partial<LayerFile>>> = {}) {
  const layers = LAYERS.map((layer, i) => ({
    order: `a${i.toString(36)}`,
    assembly: 'board',
    ...layer,
    ...changed[layer.name ?? ''],
  }))
  const budget = link({
    assemblies: { board: { order: 'a0', name: 'Card' }, other: { order: 'a1', name: 'Other' } },
    layers: Object.fromEntries(layers.map((layer, i) => [`l${i}`, layer])),
    lines: { l: { ...base, ...fields } },
  })
  const line = budget.lines.l
  if (line === undefined) throw new Error('The budget has no line.')
  const drafts: FlagDraft[] = []
  const found = geometry({
    line,
    fields: Findings.ofLine('l', line, drafts),
    lossClass: null,
    classFields: null,
    budget,
    evidence: new Map(),
    surroundings: DRY_REFERENCE,
    hz: 10e9,
    reference: 100,
    symbolRate: 20e9,
    mistake: () => null,
  })
  return { values: (found as Computed | null)?.values ?? null, drafts }
}
const said = ({ drafts }: ReturnType<typeof read>) => drafts.map(({ code, field }) => `${code} ${field}`)

describe('A trace on a layer of its stack-up', () => {
  it('takes heights to the next plane, its copper and its foil', () => {
    const { values, drafts } = read({ structure: 'coupled-stripline', layer: 'L3', roughness: 'cannonball' })
    expect(drafts).toEqual([])
    expect(values).toMatchObject({
      thickness: expect.closeTo(17e-6, 12),
      heightAbove: expect.closeTo(120e-6, 12),
      heightBelow: expect.closeTo(197e-6, 12),
      roughnessTop: expect.closeTo(2e-6, 12),
      roughnessBottom: expect.closeTo(4e-6, 12),
    })
  })

  it('mixes its dielectrics as capacitors: in series to one plane, in parallel to both, Df by energy (worked by hand)', () => {
    const { values } = read({ structure: 'coupled-stripline', layer: 'L3' })
    const below = 180 / (100 / 3.8 + 80 / 3.2)
    const lost = (0.006 * (100 / 3.8) + 0.002 * (80 / 3.2)) / (100 / 3.8 + 80 / 3.2)
    const [cBelow, cAbove] = [below / 180, 3.6 / 120]
    expect(values?.dk).toBeCloseTo((cBelow + cAbove) / (1 / 180 + 1 / 120), 10)
    expect(values?.df).toBeCloseTo((lost * cBelow + 0.004 * cAbove) / (cBelow + cAbove), 12)
  })

  it('as a microstrip has one plane, below on top of the board and above at its bottom; the mask is left out', () => {
    expect(said(read({ structure: 'microstrip', layer: 'L1' }))).toEqual([])
    expect(read({ structure: 'microstrip', layer: 'L1' }).values).toMatchObject({
      thickness: expect.closeTo(40e-6, 12),
      heightBelow: expect.closeTo(100e-6, 12),
      dk: expect.closeTo(3.4, 12),
      df: expect.closeTo(0.003, 12),
    })
    expect(read({ structure: 'coupled-microstrip', layer: 'L6' }).values).toMatchObject({
      thickness: expect.closeTo(45e-6, 12),
      heightBelow: expect.closeTo(90e-6, 12),
    })
  })

  it('brings Dk and Df of other frequencies to one', () => {
    const { values } = read(
      { structure: 'microstrip', layer: 'L1' },
      {
        PP1: { thickness: '50 µm' },
        L2: { role: 'prepreg', thickness: '50 µm', dk: '3.5', df: '0.01', anchor: '1 GHz', method: 'x' },
        PP2: { role: 'plane' },
      },
    )
    const model = widebandDebye(3.5, 0.01, 1e9)
    const dk = dkAt(model, 10e9)
    expect(values?.dk).toBeCloseTo(100 / (50 / 3.4 + 50 / dk), 10)
    expect(values?.df).toBeCloseTo((0.003 / 3.4 + dfAt(model, 10e9, dk) / dk) / (1 / 3.4 + 1 / dk), 12)
  })

  it('may say itself what differs; Dk, Df and their frequency only together', () => {
    const own = { structure: 'stripline', layer: 'L3', heightAbove: '110 µm', dk: '3.7', df: '0.005', anchor: '12 GHz' }
    expect(read(own).values).toMatchObject({
      heightAbove: expect.closeTo(110e-6, 12),
      heightBelow: expect.closeTo(197e-6, 12),
      dk: 3.7,
    })
    expect(said(read({ ...own, df: null }))).toEqual(['field-missing df'])
  })

  it('says what the stack-up lacks', () => {
    const stripline = { structure: 'stripline', layer: 'L3' }
    const missing = ['thickness', 'heightBelow', 'heightAbove', 'dk'].map((field) => `field-missing ${field}`)
    expect(said(read({ ...stripline, layer: 'L9' }))).toEqual(missing)
    expect(said(read({ ...stripline, layer: 'L2' }))).toEqual(missing)
    expect(said(read({ ...stripline, layer: 'L1' }))).toEqual(missing)
    expect(said(read({ ...stripline, assembly: 'other' }))).toEqual(missing)
    expect(said(read(stripline, { L4: { name: 'L3' } }))).toEqual(missing)
    expect(said(read({ structure: 'microstrip', layer: 'L3' }))).toEqual([
      'field-missing thickness',
      'field-missing heightBelow',
      'field-missing dk',
    ])
    expect(said(read(stripline, { PP2: { thickness: null } }))).toEqual([
      'field-missing heightAbove',
      'field-missing dk',
    ])
    expect(said(read(stripline, { C3: { df: null } }))).toEqual(['field-missing dk'])
    expect(said(read(stripline, { C3: { anchor: null }, PP2: { anchor: null }, PP4: { anchor: null } }))).toEqual([
      'field-missing dk',
    ])
    expect(said(read({ ...stripline, roughness: 'hammerstad', layer: 'L4' }))).toEqual([
      'field-missing roughnessTop',
      'field-missing roughnessBottom',
    ])
    expect(said(read(stripline, { C3: { method: null } }))).toEqual(['laminate-unproven layer'])
  })

  it('is not looked up where the line says everything', () => {
    const all = { thickness: '17 µm', heightBelow: '120 µm', dk: '3.7', df: '0.005', anchor: '12 GHz' }
    expect(said(read({ ...all, structure: 'microstrip', layer: 'nowhere' }))).toEqual([])
  })
})
