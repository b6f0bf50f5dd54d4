import { isDeepStrictEqual } from 'node:util'
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import * as Y from 'yjs'
import type { Change } from '../../lib/sheet/change'
import { applyEdit } from '../../lib/sheet/edits'
import { createMirror } from '../../lib/sheet/mirror'
import { valueAt } from '../../lib/sheet/place'
import { createDoc, readBudget } from '../../lib/sheet/seed'
import { canonical, docOf, operations, replay, sampleDoc } from './sample'

describe('the plain copy of a document', () => {
  test('[W5.61] 300 seeds: every entry has the right before, the entries replay to the document, the copy equals it', () => {
    let visible = 0
    let invisible = 0
    fc.assert(
      fc.property(
        fc.array(fc.record({ who: fc.nat({ max: 2 }), edit: fc.array(operations, { minLength: 1, maxLength: 2 }) }), {
          minLength: 5,
          maxLength: 20,
        }),
        (steps) => {
          const authors = [sampleDoc(), sampleDoc(), sampleDoc()]
          const server = sampleDoc()
          const mirror = createMirror(server)
          const state = readBudget(server)
          for (const { who, edit } of steps) {
            const applied = applyEdit(authors[who] as Y.Doc, edit)
            if (!applied.ok || applied.update === null) continue
            Y.applyUpdate(server, applied.update)
            const changes = mirror.take()
            if (changes.length === 0) invisible++
            else visible++
            for (const change of changes) {
              if (change.kind === 'add') expect(change.before).toBeNull()
              else expect(valueAt(state, change) ?? null).toBe(change.before)
              expect(change.after).not.toBe(change.kind === 'add' ? null : change.before)
            }
            replay(state, changes)
          }
          expect(isDeepStrictEqual(state, mirror.json)).toBe(true)
          expect(canonical(mirror.json)).toBe(canonical(readBudget(server)))
        },
      ),
      { numRuns: 300 },
    )
    // How many entries changed nothing that is seen: overtaken, or equal to what stood there.
    console.log(`mirror: ${visible} entries with a visible change, ${invisible} without`)
    expect(visible).toBeGreaterThan(1000)
    expect(invisible).toBeGreaterThan(0)
  }, 60_000)

  test('[W5.62] what did not change keeps its identity', () => {
    const doc = sampleDoc()
    const mirror = createMirror(doc)
    const before = mirror.json
    applyEdit(doc, [{ op: 'set', section: 'lines', id: 'via', field: 'loss', value: '0.5 dB' }])
    expect(mirror.json).not.toBe(before)
    expect(mirror.json.lines.via).not.toBe(before.lines.via)
    expect(mirror.json.lines.trace).toBe(before.lines.trace)
    expect(mirror.json.assemblies).toBe(before.assemblies)
    expect(before.lines.via?.loss).toBeNull()
  })

  test('[W5.63] an added line is told field by field, shown at once, with nothing of how it was made', () => {
    const author = sampleDoc()
    const server = docOf(Y.encodeStateAsUpdate(author))
    const mirror = createMirror(server)
    const edit = applyEdit(author, [
      { op: 'add', section: 'lines', id: 'pad', values: { order: 'a3', name: 'Pad', note: 'die side' } },
    ])
    if (!edit.ok || !edit.update) throw new Error('refused')
    Y.applyUpdate(server, edit.update)
    const place = { section: 'lines', id: 'pad', kind: 'add', before: null } as const
    expect(mirror.take()).toEqual<Change[]>([
      { ...place, field: 'order', after: 'a3' },
      { ...place, field: 'name', after: 'Pad' },
      { ...place, field: 'note', after: 'die side' },
    ])
    expect(mirror.take()).toEqual([])
  })

  test('a copy that was made empty fills with the document', () => {
    const doc = createDoc()
    const mirror = createMirror(doc)
    Y.applyUpdate(doc, Y.encodeStateAsUpdate(sampleDoc()))
    expect(canonical(mirror.json)).toBe(canonical(readBudget(doc)))
  })

  test.each<[string, (doc: Y.Doc) => void]>([
    ['a record taken away', (doc) => doc.getMap('lines').delete('via')],
    ['a record replaced', (doc) => doc.getMap('lines').set('via', new Y.Map([['name', 'x']]))],
    ['a key taken away', (doc) => (doc.getMap('lines').get('via') as Y.Map<unknown>).delete('loss')],
    ['a note replaced', (doc) => (doc.getMap('lines').get('via') as Y.Map<unknown>).set('note', 'plain')],
    ['a record with a field missing', (doc) => doc.getMap('lines').set('new', new Y.Map([['name', 'x']]))],
    ['bytes as a value', (doc) => doc.getMap('head').set('name', new Uint8Array(3))],
    [
      'a list in a root',
      (doc) => (doc.getMap('lines') as unknown as Y.AbstractType<unknown>) && doc.getMap('head').set('name', ['a']),
    ],
  ])('[W5.64] leaving the layout is said: %s', (_name, damage) => {
    const doc = sampleDoc()
    const mirror = createMirror(doc)
    damage(doc)
    expect(() => mirror.take()).toThrow()
  })
})
