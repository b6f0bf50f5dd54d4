import fc from 'fast-check'
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

/** A record with its usual values, and a few of any value. */
function recordOf(section: string, shape: Readonly<Record<string, object>>): fc.Arbitrary<Record<string, Scalar>> {
  const usual = Object.entries(USUAL[section] ?? {}).map(
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
export const anyBudget: fc.Arbitrary<Budget> = fc
  .record({
    head: recordOf('head', head.shape),
    ...Object.fromEntries(
      Object.entries(SECTIONS).map(([section, schema]) => [
        section,
        fc.dictionary(fc.constantFrom(...IDS), recordOf(section, schema.shape), {
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
        ([key, value]) => budgetSchema.safeParse({ head: { schemaVersion: 1 }, laneValues: { [key]: value } }).success,
      )
    return budgetSchema.parse({ ...whole, laneValues: Object.fromEntries(accepted) })
  })
