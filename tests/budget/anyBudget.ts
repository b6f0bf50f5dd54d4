import fc from 'fast-check'
import type { EvidenceData } from '../../lib/budget/evaluation'
import {
  type Budget,
  type BudgetFile,
  budgetSchema,
  type FieldMeta,
  fieldMeta,
  head,
  LANE_FIELDS,
  type Scalar,
  SECTIONS,
  sortedSet,
} from '../../lib/budget/schema'
import { DIMENSIONS } from '../../lib/channel/units'
import { attenuator, constantly, fileOf, steps } from './sections'

const IDS = ['a', 'b', 'c', 'd', 'e', 'constructor'] as const
const GHZ = ['9.9 GHz', '10 GHz', '10.7 GHz', '12.5 GHz', '20 GHz', '5 GHz']

/** Values that a field of this kind takes, with what goes together (10 GHz, references that exist) more often than not. */
function fieldValue(
  field: string,
  meta: FieldMeta,
  schema: { safeParse(value: unknown): { success: boolean } },
): fc.Arbitrary<Scalar> {
  if (field === 'points')
    return fc.constantFrom('1 GHz 0.2 dB; 20 GHz 3 dB', '5 GHz 0.3 dB/in; 12 GHz 0.9 dB/in', 'x', '')
  switch (meta.kind) {
    case 'quantity': {
      const units = meta.dimensions.flatMap((dimension) => Object.keys(DIMENSIONS[dimension].units))
      if (meta.dimensions.includes('frequency')) return fc.constantFrom(...GHZ)
      return fc
        .tuple(fc.constantFrom('0', '0.1', '0.5', '1', '2,5', '7', '25', '90', '100'), fc.constantFrom(...units))
        .map(([number, unit]) => `${number} ${unit}`.trim())
        .filter((text) => schema.safeParse(text).success)
    }
    case 'choice':
      return fc.constantFrom(...meta.choices)
    case 'set':
      return fc.subarray([...meta.choices], { maxLength: 3 }).map((codes) => sortedSet(codes, meta.choices))
    case 'flag':
      return fc.boolean()
    case 'integer':
      return fc.integer({ min: meta.min, max: Math.min(meta.max, meta.min + 6) })
    case 'reference':
      return fc.constantFrom(...IDS)
    default:
      return fc.constantFrom('Name', 'none', 'lot', '')
  }
}

/** What makes numbers come out: the usual value of a field, taken three times out of four. */
const USUAL: Readonly<Record<string, Readonly<Record<string, readonly Scalar[]>>>> = {
  head: { bitRate: ['20 Gb/s'], code: ['NRZ'], rateType: ['line'], reference: ['100 Ω'], laneCount: [4] },
  lines: {
    model: ['stated', 'class', 'per-length', 'table', 'pad'],
    kind: ['trace', 'via', 'cable', 'connector', 'overlap'],
    loss: ['0.5 dB', '1,25 dB', '7 dB'],
    at: ['10 GHz'],
    length: ['2 in', '0 m'],
    lossClass: ['a', 'b'],
    lossPerLength: ['0.8 dB/in'],
    capacitance: ['90 fF'],
    tolerancePlus: ['5 %', '0.1 dB'],
    overlapA: ['a'],
    overlapB: ['b'],
  },
  lossClasses: { lossPerLength: ['0.9 dB/in'], at: ['10 GHz'] },
  allowances: { limit: ['5 dB', '25 dB'], at: ['10 GHz'], from: ['a'], to: ['b'] },
  planes: { code: ['tx-ball', 'rx-ball'] },
  shares: { allowance: ['a'], loss: ['1 dB'], line: ['a'] },
  corners: { temperature: ['65 °C'], lossPerKelvin: ['0.1 %/K'] },
}

/** The same for what is computed from physics and files, swept, drawn at random and put through corners. */
const CHANNEL: Readonly<Record<string, Readonly<Record<string, readonly Scalar[]>>>> = {
  head: { bitRate: ['20 Gb/s'], code: ['NRZ'], rateType: ['line'], reference: ['100 Ω'], laneCount: [4] },
  lines: {
    model: ['per-length', 'table', 'pad', 'geometry', 'via', 'package-line', 'ac-capacitor', 'cable', 'network'],
    kind: ['trace', 'via', 'cable', 'connector', 'trace', 'via', 'overlap', 'reserve'],
    loss: ['0.5 dB', '1,25 dB', '7 dB'],
    at: ['10 GHz'],
    length: ['2 in', '0 m'],
    lossClass: ['a', 'b'],
    lossPerLength: ['0.8 dB/in'],
    capacitance: ['90 fF', '100 nF'],
    resistance: ['0 Ω', '0.1 Ω'],
    inductance: ['0 pH', '200 pH'],
    padCapacitance: ['0 fF', '60 fF'],
    rootTerm: ['0.2 dB/in', '0.2 dB/in', null],
    linearTerm: ['0.03 dB/in', '0.03 dB/in', null],
    validFrom: ['0.05 GHz', '0.1 GHz'],
    validTo: ['20 GHz', '40 GHz'],
    impedance: ['85 Ω', '100 Ω', null],
    delay: ['170 ps/in', null],
    structure: ['stripline', 'coupled-microstrip'],
    width: ['5 mil'],
    gap: ['6 mil'],
    thickness: ['0.6 mil'],
    heightBelow: ['5 mil'],
    heightAbove: ['5 mil'],
    dk: ['3.6'],
    df: ['0.006', '0'],
    anchor: ['10 GHz'],
    roughness: ['smooth', 'cannonball'],
    roughnessTop: ['2 µm', '0 µm'],
    roughnessBottom: ['2 µm'],
    boardThickness: ['2 mm'],
    usedDepth: ['1.5 mm'],
    stub: ['0.2 mm', '0 mm', null],
    barrel: ['0.25 mm'],
    pad: ['0.5 mm'],
    antipad: ['0.8 mm'],
    pitch: ['1 mm'],
    packageGamma0: ['0', '5e-4'],
    packageA1: ['8.9e-4'],
    packageA2: ['2e-4'],
    packageTau: ['6.141e-3'],
    taken: ['discrete', 'long-uniform', 'per-length'],
    evidence: ['a', 'b', 'c', 'd'],
    lengthDifference: ['1 in', '0 m', null],
    shortEvidence: ['b', 'c', null],
    fixture: ['b', null, null, null],
    portMap: ['1>2', '2>1', null],
    varies: ['length 10 %', 'width 10 %; dk 3 %', null, null, null],
    skew: ['3 ps', null],
    tolerancePlus: ['5 %', '0.1 dB'],
    overlapA: ['a'],
    overlapB: ['b'],
  },
  lossClasses: { lossPerLength: ['0.9 dB/in'], at: ['10 GHz'] },
  allowances: {
    limit: ['5 dB', '25 dB'],
    at: ['10 GHz', null],
    from: ['a'],
    to: ['b'],
    curve: ['0.05..20 GHz: 1 + f', '0.05..30 GHz: 9', null],
    usedAt: ['8 GHz', null, null],
    returnLossFloor: ['8 dB', null],
    judgedCorner: ['a', 'b', null],
  },
  evidence: {
    sha256: ['a', 'b', 'c', 'd'].map((digit) => digit.repeat(64)),
    modes: ['mixed-as-two-ports', 'single-ended'],
    reference: ['85 Ω', null],
  },
  planes: { code: ['tx-ball', 'rx-ball'] },
  shares: { allowance: ['a'], loss: ['1 dB'], line: ['a'] },
  corners: {
    temperature: ['65 °C', '0 °C'],
    lossPerKelvin: ['0.1 %/K', null],
    dielectricPerKelvin: ['0.2 %/K', null],
    humidity: ['dry', 'wet'],
    lossWet: ['4 %', null],
    wetDf: ['0.002', null],
    fabrication: ['nominal', 'high-loss', 'low-loss', null],
  },
}

/** A record with its usual values, and a few of any value. */
function recordOf(
  usualValues: typeof USUAL,
  section: string,
  shape: Readonly<Record<string, object>>,
): fc.Arbitrary<Record<string, Scalar>> {
  const usual = Object.entries(usualValues[section] ?? {}).map(
    ([field, values]) => [field, fc.constantFrom(...values)] as const,
  )
  const any = Object.entries(shape).flatMap(([field, schema]) => {
    const meta = fieldMeta.get(schema as never)
    if (!meta || meta.kind === 'order') return []
    return [fieldValue(field, meta, schema as never).map((value) => ({ [field]: value }))]
  })
  const order = fc.constantFrom('a0', 'a1', 'a2', 'a3', 'a4', 'a5', 'b0').map((key) => ({ order: key }))
  return fc
    .tuple(
      fc.record(Object.fromEntries(usual)),
      fc.array(fc.oneof(...any), { maxLength: 5 }),
      'order' in shape ? order : fc.constant({}),
    )
    .map(([first, others, last]) => Object.assign({}, first, ...others, last))
}

/** Any budget that the schema accepts, with dangling references, ties of order and ids that every object has. */
const budgetsOf = (usual: typeof USUAL): fc.Arbitrary<Budget> =>
  fc
    .record({
      head: recordOf(usual, 'head', head.shape),
      ...Object.fromEntries(
        Object.entries(SECTIONS).map(([section, schema]) => [
          section,
          fc.dictionary(fc.constantFrom(...IDS), recordOf(usual, section, schema.shape), {
            minKeys: section === 'lines' || section === 'allowances' ? 1 : 0,
            maxKeys: 5,
          }),
        ]),
      ),
      laneValues: fc.array(
        fc.tuple(
          fc.constantFrom(...IDS),
          fc.integer({ min: 1, max: 6 }),
          fc.constantFrom(...LANE_FIELDS),
          fc.constantFrom('1 in', '2 ps', '0.5 dB', 'a', null),
        ),
        { maxLength: 6 },
      ),
    })
    .map(({ laneValues, ...rest }) => {
      const file = rest as unknown as BudgetFile
      const ends = { a: { order: 'Zz', code: 'tx-ball' }, b: { order: 'c0', code: 'rx-ball' } } as const
      const whole = { ...file, head: { ...file.head, schemaVersion: 1 as const }, planes: { ...file.planes, ...ends } }
      const accepted = laneValues
        .map(([line, lane, field, value]) => [`${line}/${lane}/${field}`, value] as const)
        .filter(
          ([key, value]) =>
            budgetSchema.safeParse({ head: { schemaVersion: 1 }, laneValues: { [key]: value } }).success,
        )
      return budgetSchema.parse({ ...whole, laneValues: Object.fromEntries(accepted) })
    })

export const anyBudget = budgetsOf(USUAL)
export const anyChannel = budgetsOf(CHANNEL)

const HZ = steps(0.05e9, 500)

/** Files that the budgets name: a usual one, one that lets nothing through, one that amplifies and reflects more than all, an ideal through. */
export const ANY_EVIDENCE: EvidenceData = new Map([
  ['a'.repeat(64), fileOf([{ ohm: 88, delay: 120e-12, db: (hz) => 0.3 * Math.sqrt(hz / 1e9) }], HZ)],
  ['b'.repeat(64), constantly(HZ, () => [1, 0, 0, 0, 0, 0, 1, 0])],
  ['c'.repeat(64), constantly(HZ, () => [0, 1.5, 3, 0, 3, 0, 1.5, 0])],
  ['d'.repeat(64), constantly(HZ, () => attenuator(0))],
])
