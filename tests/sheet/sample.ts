import canonicalize from 'canonicalize'
import fc from 'fast-check'
import * as Y from 'yjs'
import { type Budget, budgetSchema, type Scalar } from '../../lib/budget/schema'
import type { Change, Operation } from '../../lib/sheet/change'
import { emptyRecord } from '../../lib/sheet/layout'
import { createDoc, readBudget, seedUpdate } from '../../lib/sheet/seed'

/** A small budget: an assembly, three lines, two planes, one allowance, one lane value. */
export function sampleBudget(): Budget {
  return budgetSchema.parse({
    head: { schemaVersion: 1, name: 'Backplane lane', bitRate: '112 Gb/s', code: 'PAM4', laneCount: 4 },
    assemblies: { board: { order: 'a0', name: 'Main board', kind: 'board', note: 'Fabricator to confirm.' } },
    lines: {
      package: { order: 'a1', name: 'Package', kind: 'package', model: 'stated', loss: '2.1 dB', at: '28 GHz' },
      trace: { order: 'a2', name: 'Trace', kind: 'trace', assembly: 'board', model: 'per-length', length: '6 in' },
      via: { order: 'a4', name: 'Via', kind: 'via', note: 'Back-drilled' },
    },
    planes: { start: { order: 'a0', code: 'tx-bump' }, end: { order: 'a5', code: 'rx-bump' } },
    allowances: {
      whole: { order: 'a0', name: 'Bump to bump', limit: '36 dB', at: '28 GHz', from: 'start', to: 'end' },
    },
    laneValues: { 'trace/2/length': '6.4 in' },
  })
}

export function docOf(update: Uint8Array): Y.Doc {
  const doc = createDoc()
  Y.applyUpdate(doc, update)
  return doc
}

export const sampleSeed = seedUpdate(sampleBudget())
export const sampleDoc = () => docOf(sampleSeed)

/** RFC 8785 text: what two documents must have in common. */
export function canonical(value: unknown): string {
  const text = canonicalize(value)
  if (text === undefined) throw new Error('nothing to compare')
  return text
}

export const canonicalDoc = (doc: Y.Doc) => canonical(readBudget(doc))

/** Does to a plain budget, in place, what the trail says, so that it can be compared with the document. */
export function replay(budget: Budget, changes: readonly Change[]): void {
  const json = budget as unknown as Record<string, Record<string, Record<string, Scalar>>> & {
    head: Record<string, Scalar>
    laneValues: Record<string, Scalar>
  }
  for (const change of changes) {
    if (change.section === 'head') json.head[change.field] = change.after
    else if (change.section === 'laneValues') json.laneValues[`${change.id}/${change.field}`] = change.after
    else {
      const records = json[change.section] ?? {}
      const record = records[change.id] ?? (change.kind === 'add' ? emptyRecord(change.section) : undefined)
      if (!record) throw new Error(`${change.kind} of a record that is not there: ${change.id}`)
      record[change.field] = change.after
      records[change.id] = record
    }
  }
}

const LINE_IDS = ['package', 'trace', 'via', 'package', 'trace', 'via', 'package', 'trace', 'via', 'not-there']
const TEXTS = ['', 'a', 'Back-drilled', 'seen 🙂 twice', 'Příliš žluťoučký', '🙂🙃']

/** A seeded stream of operations that mostly fit the sample; some are refused. */
const LANE_WRITES: readonly [string, string | null][] = [
  ['length', '1 in'],
  ['length', null],
  ['stub', '0.3 mm'],
  ['skew', '5 ps'],
  ['loss', '2 dB'],
  ['loss', '5 ps'],
]
const WRITES: readonly [string, Scalar][] = [
  ['loss', '1 dB'],
  ['loss', '2.5 dB'],
  ['loss', null],
  ['length', '3 in'],
  ['length', '4 in'],
  ['name', 'Named'],
  ['order', 'a1'],
  ['order', 'a3'],
  ['removed', true],
  ['removed', false],
]
const HEAD_WRITES: readonly [string, Scalar][] = [
  ['name', 'Renamed'],
  ['bitRate', '56 Gb/s'],
  ['laneCount', 8],
  ['laneCount', 2],
]

/** A seeded stream of operations that mostly fit the sample; some name a line that is not there, or a value that does not fit. */
export const operations: fc.Arbitrary<Operation> = fc.oneof(
  {
    weight: 6,
    arbitrary: fc
      .tuple(fc.constantFrom(...LINE_IDS), fc.constantFrom(...WRITES))
      .map(([id, [field, value]]): Operation => ({ op: 'set', section: 'lines', id, field, value })),
  },
  {
    weight: 2,
    arbitrary: fc
      .constantFrom(...HEAD_WRITES)
      .map(([field, value]): Operation => ({ op: 'set', section: 'head', id: null, field, value })),
  },
  {
    weight: 2,
    arbitrary: fc.record({
      op: fc.constant('add' as const),
      section: fc.constant('lines' as const),
      id: fc.uuid().map((id) => `l-${id}`),
      values: fc.record({
        order: fc.constantFrom('a3', 'a6'),
        name: fc.constantFrom('Cable', 'Pad'),
        note: fc.constant('n'),
      }),
    }),
  },
  {
    weight: 3,
    arbitrary: fc.record({
      op: fc.constant('note' as const),
      section: fc.constant('lines' as const),
      id: fc.constantFrom(...LINE_IDS),
      field: fc.constant('note' as const),
      text: fc.constantFrom(...TEXTS),
    }),
  },
  {
    weight: 3,
    arbitrary: fc
      .tuple(fc.constantFrom(...LINE_IDS), fc.integer({ min: 1, max: 4 }), fc.constantFrom(...LANE_WRITES))
      .map(([line, lane, [field, value]]): Operation => ({ op: 'lane', line, lane, field, value })),
  },
)
