import { describe, expect, test } from 'vitest'
import * as Y from 'yjs'
import type { Operation } from '../../lib/sheet/change'
import { applyEdit } from '../../lib/sheet/edits'
import { readBudget } from '../../lib/sheet/seed'
import { createUndo } from '../../lib/sheet/undo'
import { canonicalDoc, docOf, sampleDoc } from './sample'

const set = (field: string, value: string | boolean | null, id = 'via'): Operation => ({
  op: 'set',
  section: 'lines',
  id,
  field,
  value,
})
const note = (text: string): Operation => ({ op: 'note', section: 'lines', id: 'via', field: 'note', text })

/** A person with a document, undo, and everything they did as updates for the others. */
function person(state: Uint8Array, clientID: number) {
  const doc = docOf(state)
  doc.clientID = clientID
  const undo = createUndo(doc)
  const sent: Uint8Array[] = []
  return {
    doc,
    undo,
    sent,
    via: () => readBudget(doc).lines.via,
    edit(...operations: Operation[]) {
      const edit = applyEdit(doc, operations)
      if (!edit.ok || !edit.update) throw new Error('refused')
      undo.remember(edit)
      sent.push(edit.update)
    },
    step(kind: 'undo' | 'redo') {
      const undone = undo[kind]()
      if (undone) sent.push(undone.update)
      return undone
    },
  }
}
type Person = ReturnType<typeof person>

function pair(leftId = 10, rightId = 20) {
  const seed = Y.encodeStateAsUpdate(sampleDoc())
  return { left: person(seed, leftId), right: person(seed, rightId) }
}

function exchange(...people: Person[]) {
  const updates = people.flatMap((each) => each.sent)
  for (const { doc } of people) for (const update of updates) Y.applyUpdate(doc, update)
  expect(new Set(people.map(({ doc }) => canonicalDoc(doc))).size).toBe(1)
}

describe('undo', () => {
  test('[W1.70] one committed edit is one step, back and forth', () => {
    const { left } = pair()
    const before = canonicalDoc(left.doc)
    left.edit(set('loss', '1 dB'), set('stub', '0.2 mm'), note('Back-drilled twice'))
    left.edit(set('loss', '2 dB'))
    left.step('undo')
    expect(left.via()).toMatchObject({ loss: '1 dB', stub: '0.2 mm', note: 'Back-drilled twice' })
    left.step('undo')
    expect(canonicalDoc(left.doc)).toBe(before)
    expect(left.undo.canUndo).toBe(false)
    left.step('redo')
    left.step('redo')
    expect(left.via()).toMatchObject({ loss: '2 dB', stub: '0.2 mm', note: 'Back-drilled twice' })
    expect(left.undo.canRedo).toBe(false)
    left.step('undo')
    left.edit(set('name', 'Other'))
    expect(left.undo.canRedo).toBe(false)
  })

  test('[W1.71] its update is an ordinary edit: others who apply it have the same document; it says what was done', () => {
    const { left, right } = pair()
    left.edit(set('loss', '1 dB'), note('Back-drilled twice'), {
      op: 'lane',
      line: 'trace',
      lane: 4,
      field: 'skew',
      value: '1 ps',
    })
    expect(left.step('undo')).toMatchObject({
      operations: [
        { op: 'lane', line: 'trace', lane: 4, field: 'skew', value: null },
        { ...set('loss', null) },
        { ...note('Back-drilled'), base: 'Back-drilled twice' },
      ],
      bases: ['1 ps', '1 dB', 'Back-drilled twice'],
    })
    exchange(left, right)
    expect(right.via()?.loss).toBeNull()
    expect(readBudget(right.doc).laneValues['trace/4/skew']).toBeNull()
  })

  test('[W1.72] an added line that somebody else wrote into: undo hides it, nothing is lost, redo shows it again', () => {
    const { left, right } = pair()
    left.edit({ op: 'add', section: 'lines', id: 'pad', values: { order: 'a3', name: 'Pad' } })
    exchange(left, right)
    right.edit(set('loss', '7 dB', 'pad'))
    exchange(left, right)
    left.step('undo')
    exchange(left, right)
    expect(readBudget(right.doc).lines.pad).toMatchObject({ removed: true, loss: '7 dB', name: 'Pad' })
    left.step('redo')
    exchange(left, right)
    expect(readBudget(right.doc).lines.pad).toMatchObject({ removed: false, loss: '7 dB', name: 'Pad' })
  })

  test('[W1.72] a removed line that somebody else wrote into: undo brings it back with what they wrote', () => {
    const { left, right } = pair()
    left.edit(set('removed', true))
    right.edit(set('loss', '33 dB'))
    exchange(left, right)
    left.step('undo')
    exchange(left, right)
    expect(right.via()).toMatchObject({ removed: false, loss: '33 dB' })
  })

  test('[W1.73] what somebody else wrote since stays; the step is used up and no older one is undone in its place', () => {
    const { left, right } = pair()
    left.edit(set('name', 'Renamed'))
    left.edit(set('loss', '5 dB'))
    exchange(left, right)
    right.edit(set('loss', '7 dB'))
    exchange(left, right)
    expect(left.step('undo')).toBeNull()
    expect(left.via()).toMatchObject({ loss: '7 dB', name: 'Renamed' })
    expect(left.undo.canRedo).toBe(false)
    left.step('undo')
    expect(left.via()?.name).toBe('Via')
  })

  test('[W1.74] a write that overtook another one: undo leaves the field in the record, with what stood before', () => {
    const { left, right } = pair(20, 10)
    left.edit(set('loss', '5 dB'))
    right.edit(set('loss', '7 dB'))
    exchange(left, right)
    expect(left.via()?.loss).toBe('5 dB')
    left.step('undo')
    exchange(left, right)
    expect(Object.keys(right.via() ?? {})).toContain('loss')
    expect(right.via()?.loss).toBeNull()
  })

  test('[W1.75] typing in a note is taken back character by character, what others typed around it stays', () => {
    const { left, right } = pair()
    left.edit(note('Back-drilled from the top'))
    exchange(left, right)
    right.edit(note('To be Back-drilled from the top'))
    right.edit(note('To be Back-drilled from the very top'))
    right.edit(note('To be Back-drilled from the very top, twice'))
    exchange(left, right)
    left.step('undo')
    exchange(left, right)
    expect(right.via()?.note).toBe('To be Back-drilledvery , twice')
    left.step('redo')
    exchange(left, right)
    expect(right.via()?.note).toBe('To be Back-drilled from the very top, twice')
  })

  test('typing that somebody has deleted since is used up without touching older typing', () => {
    const { left, right } = pair()
    left.edit(note('Back-drilled A'))
    left.edit(note('Back-drilled A B'))
    exchange(left, right)
    right.edit(note('Back-drilled A'))
    exchange(left, right)
    expect(left.step('undo')).toBeNull()
    expect(left.via()?.note).toBe('Back-drilled A')
    left.step('undo')
    expect(left.via()?.note).toBe('Back-drilled')
  })
})
