import 'fake-indexeddb/auto'
import { describe, expect, test } from 'vitest'
import * as Y from 'yjs'
import { applyEdit } from '../../lib/sheet/edits'
import { newId } from '../../lib/sheet/ids'
import {
  type BrowserStorage,
  createMemory,
  fitDeed,
  Outbox,
  type OutboxRecord,
  openIndexedDb,
} from '../../lib/sheet/outbox'
import { readBudget } from '../../lib/sheet/seed'
import { openDocument } from '../../lib/sheet/session/sheetDocument'
import { canonicalDoc, sampleDoc, sampleSeed } from './sample'
import { setLoss } from './tabs'

function record(editId: string): OutboxRecord {
  const deed = { kind: 'edit' as const, operations: [setLoss('1 dB')], bases: [null] }
  return { editId, epoch: 1, generation: 1, clientId: 7, update: new Uint8Array([1, 2]), deed, time: 5 }
}

let names = 0
const stores: [string, () => Promise<{ first: BrowserStorage; second: BrowserStorage }>][] = [
  [
    'memory',
    async () => {
      const memory = createMemory()
      return { first: memory.open(), second: memory.open() }
    },
  ],
  [
    'IndexedDB',
    async () => {
      const budget = `kept-${names++}`
      return { first: await openIndexedDb('ann', budget), second: await openIndexedDb('ann', budget) }
    },
  ],
]

describe.each(stores)('what a browser keeps, in %s', (_name, open) => {
  test('a batch is stored whole; edits come back in the order in which they were made', async () => {
    const { first, second } = await open()
    expect(await first.write({ add: [record('b'), record('a')], meta: { epoch: 1, seq: 4 } })).toBe(true)
    expect(await second.write({ add: [record('c')] })).toBe(true)
    const stored = await second.read()
    expect(stored.records.map((each) => each.editId)).toEqual(['b', 'a', 'c'])
    expect(stored.records[0]).toEqual(record('b'))
    expect(stored.meta).toMatchObject({ epoch: 1, seq: 4, generation: 1 })
    first.close()
    second.close()
  })

  test('[W2.69] nothing is stored where a condition fails: another generation, a record gone', async () => {
    const { first, second } = await open()
    await first.write({ add: [record('a')] })
    expect(await first.write({ ifGeneration: 2, add: [record('b')], updates: [new Uint8Array([1])] })).toBe(false)
    expect(await first.write({ ifRecord: 'x', add: [record('b')], meta: { seq: 9 } })).toBe(false)
    expect(await first.write({ ifRecord: 'a', ifGeneration: 1, remove: ['a'], add: [record('b')] })).toBe(true)
    const stored = await first.read()
    expect(stored.records.map((each) => each.editId)).toEqual(['b'])
    expect(stored.meta.seq).toBe(0)
    expect((await first.updates()).updates).toEqual([])
    first.close()
    second.close()
  })

  test('compacting replaces what was read, not what came meanwhile', async () => {
    const { first, second } = await open()
    await first.write({ updates: [new Uint8Array([1]), new Uint8Array([2])] })
    const { through } = await first.updates()
    await second.write({ updates: [new Uint8Array([3])] })
    await first.compact(through, new Uint8Array([12]))
    expect((await first.updates()).updates).toEqual([new Uint8Array([12]), new Uint8Array([3])])
    await first.write({ dropUpdates: true, updates: [new Uint8Array([4])] })
    expect((await second.updates()).updates).toEqual([new Uint8Array([4])])
    first.close()
    second.close()
  })

  test('[W2.66] one tab sees what another has written; its own batches hold at once and never seem undone', async () => {
    const { first, second } = await open()
    const seen: string[][] = []
    let wake: (() => void) | null = null
    const left: Outbox = new Outbox(first, () => {
      seen.push(left.records.map((each) => each.editId))
      wake?.()
    })
    const right = new Outbox(second, () => {})
    const both = new Promise<void>((resolve) => {
      wake = () => {
        if (left.records.length === 6) resolve()
      }
    })
    for (const editId of ['a', 'b', 'c']) {
      left.commit({ add: [record(`left-${editId}`)] })
      right.commit({ add: [record(`right-${editId}`)] })
    }
    await both
    await Promise.all([left.settled(), right.settled()])
    for (const [index, ids] of seen.entries()) {
      // What this tab had added before stays in every later state.
      for (const id of seen.slice(0, index).flat()) expect(ids).toContain(id)
    }
    await Promise.all([left.close(), right.close()])
  })

  test('a long cache is put together into one update when it is opened', async () => {
    const { first, second } = await open()
    const doc = sampleDoc()
    const updates = [sampleSeed]
    for (let index = 0; index < 210; index++) {
      const edit = applyEdit(doc, [setLoss(`${index / 10} dB`)])
      if (edit.ok && edit.update) updates.push(edit.update)
    }
    await first.write({ updates })
    const opened = await openDocument(first, () => [])
    expect(canonicalDoc(opened.doc)).toBe(canonicalDoc(doc))
    const kept = (await second.updates()).updates
    expect(kept.length).toBe(1)
    expect(Y.encodeStateVectorFromUpdate(kept[0] ?? new Uint8Array())).toEqual(Y.encodeStateVector(doc))
    first.close()
    second.close()
  })
})

test('a browser that can keep nothing is said, and the edit stays', async () => {
  const storage = createMemory().open()
  const outbox: Outbox = new Outbox({ ...storage, write: () => Promise.reject(new Error('quota')) }, () => {})
  outbox.commit({ add: [record('a')] })
  await outbox.settled()
  expect(outbox.fault).toContain('quota')
  expect(outbox.records.length).toBe(1)
})

describe('doing an edit again on another document', () => {
  const budget = () => readBudget(sampleDoc())
  const deed = (operations: OutboxRecord['deed']['operations'], bases: OutboxRecord['deed']['bases']) => ({
    kind: 'edit' as const,
    operations,
    bases,
  })

  test('[W10.66] several writes of one field, and writes into a line added by the same edit, fit together', () => {
    const add = { op: 'add', section: 'lines', id: 'pad', values: { order: 'a3' } } as const
    const operations = [setLoss('1 dB'), setLoss('2 dB'), add, setLoss('3 dB', 'pad')]
    const fit = fitDeed(budget(), deed(operations, [null, '1 dB', null, null]), true)
    expect(fit).toEqual({ fits: operations, conflicts: [] })
  })

  test('[W10.67] what already stands so is done, whatever it was made on', () => {
    const length = { op: 'set', section: 'lines', id: 'trace', field: 'length', value: '6 in' } as const
    const add = { op: 'add', section: 'lines', id: 'via', values: { order: 'a3' } } as const
    const lane = { op: 'lane', line: 'trace', lane: 2, field: 'length', value: '6.4 in' } as const
    expect(fitDeed(budget(), deed([length, add, lane], ['5 in', null, null]), false)).toEqual({
      fits: [],
      conflicts: [],
    })
  })

  test('[W10.68] typing in a note that others changed goes in beside theirs, but not after a new epoch', () => {
    const note = { op: 'note', section: 'lines', id: 'via', field: 'note', text: 'Drilled!', base: 'Drilled' } as const
    expect(fitDeed(budget(), deed([note], ['Drilled']), true).fits).toEqual([note])
    expect(fitDeed(budget(), deed([note], ['Drilled']), false).conflicts.length).toBe(1)
  })
})

test('new ids match what the schema asks of an id, and differ', () => {
  const ids = new Set(Array.from({ length: 1000 }, newId))
  expect(ids.size).toBe(1000)
  for (const id of ids) expect(id).toMatch(/^[a-z0-9][a-z0-9-]{0,39}$/)
})
