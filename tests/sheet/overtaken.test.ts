import { describe, expect, test } from 'vitest'
import * as Y from 'yjs'
import type { Operation } from '../../lib/sheet/change'
import { applyEdit } from '../../lib/sheet/edits'
import { judgeWrites } from '../../lib/sheet/overtaken'
import { readBudget } from '../../lib/sheet/seed'
import { docOf, sampleDoc } from './sample'

const loss = (value: string): Operation => ({ op: 'set', section: 'lines', id: 'via', field: 'loss', value })
const viaLoss = { section: 'lines', id: 'via', field: 'loss' } as const

function author(state: Uint8Array, clientID: number) {
  const doc = docOf(state)
  doc.clientID = clientID
  return (...operations: Operation[]) => {
    const edit = applyEdit(doc, operations)
    if (!edit.ok || !edit.update) throw new Error('refused')
    return edit.update
  }
}

function receive(server: Y.Doc, update: Uint8Array) {
  const before = Y.decodeStateVector(Y.encodeStateVector(server))
  Y.applyUpdate(server, update)
  return judgeWrites(update, server, before)
}

describe('a write that arrives after another one of the same field', () => {
  const seed = Y.encodeStateAsUpdate(sampleDoc())

  test('[W5.65] does not show if the other wins: overtaken, with what was written and what is kept', () => {
    const server = docOf(seed)
    const low = author(seed, 10)(loss('1 dB'))
    const high = author(seed, 20)(loss('2 dB'))
    expect(receive(server, high)).toEqual({ overtaken: [], unseen: [] })
    expect(receive(server, low)).toEqual({ overtaken: [{ ...viaLoss, written: '1 dB', kept: '2 dB' }], unseen: [] })
    expect(readBudget(server).lines.via?.loss).toBe('2 dB')
  })

  test('[W5.66] shows if it wins: its author had not seen what it replaced', () => {
    const server = docOf(seed)
    const low = author(seed, 10)(loss('1 dB'))
    const high = author(seed, 20)(loss('2 dB'))
    receive(server, low)
    expect(receive(server, high)).toEqual({ overtaken: [], unseen: [viaLoss] })
  })

  test('after it was seen is neither', () => {
    const server = docOf(seed)
    receive(server, author(seed, 20)(loss('1 dB')))
    const later = author(Y.encodeStateAsUpdate(server), 10)(loss('2 dB'))
    expect(receive(server, later)).toEqual({ overtaken: [], unseen: [] })
  })

  test('twice in one update: the last one counts', () => {
    const server = docOf(seed)
    const low = author(seed, 10)(loss('1 dB'), loss('3 dB'))
    receive(server, author(seed, 20)(loss('2 dB')))
    expect(receive(server, low).overtaken).toEqual([{ ...viaLoss, written: '3 dB', kept: '2 dB' }])
  })

  test('what the document had before is not judged again', () => {
    const server = docOf(seed)
    const low = author(seed, 10)(loss('1 dB'))
    receive(server, author(seed, 20)(loss('2 dB')))
    receive(server, low)
    expect(receive(server, low)).toEqual({ overtaken: [], unseen: [] })
  })

  test('head and lane values have their places; adding and typing are never overtaken', () => {
    const server = docOf(seed)
    const edit = (value: number, length: string, id: string): Operation[] => [
      { op: 'set', section: 'head', id: null, field: 'laneCount', value },
      { op: 'lane', line: 'trace', lane: 2, field: 'length', value: length },
      { op: 'add', section: 'lines', id, values: { order: 'a3' } },
      { op: 'note', section: 'lines', id: 'via', field: 'note', text: `${id} drilled` },
    ]
    receive(server, author(seed, 20)(...edit(8, '8 in', 'x')))
    expect(receive(server, author(seed, 10)(...edit(6, '7 in', 'y')))).toEqual({
      overtaken: [
        { section: 'head', id: null, field: 'laneCount', written: 6, kept: 8 },
        { section: 'laneValues', id: 'trace', field: '2/length', written: '7 in', kept: '8 in' },
      ],
      unseen: [],
    })
  })
})
