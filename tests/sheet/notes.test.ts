import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import * as Y from 'yjs'
import { applyEdit, mergeTyped, spliceBetween } from '../../lib/sheet/edits'
import { readBudget } from '../../lib/sheet/seed'
import { docOf, sampleDoc } from './sample'

const words = fc.string({ unit: fc.constantFrom('a', 'b', ' ', '🙂', '🙃', 'ž'), maxLength: 12 })
const isWellFormed = (text: string) =>
  !/[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/.test(text)

describe('one splice between two texts', () => {
  test('turns one into the other and splits no surrogate pair (seeds of fast-check)', () => {
    fc.assert(
      fc.property(words, words, (from, to) => {
        const { at, remove, insert } = spliceBetween(from, to)
        expect(from.slice(0, at) + insert + from.slice(at + remove)).toBe(to)
        for (const piece of [from.slice(0, at), from.slice(at, at + remove), from.slice(at + remove), insert]) {
          expect(isWellFormed(piece)).toBe(true)
        }
      }),
      { numRuns: 500 },
    )
  })

  test('is no longer than what differs', () => {
    expect(spliceBetween('back-drilled via', 'back-drilled, plugged via')).toEqual({
      at: 12,
      remove: 0,
      insert: ', plugged',
    })
    expect(spliceBetween('x🙂y', 'x🙃y')).toEqual({ at: 1, remove: 2, insert: '🙃' })
  })
})

describe('typing while others type', () => {
  test('keeps both, before, after and at the same stretch', () => {
    expect(mergeTyped('one two three', 'ONE two three', 'one two THREE')).toBe('ONE two THREE')
    expect(mergeTyped('one two three', 'one two THREE', 'ONE AND two three')).toBe('ONE AND two THREE')
    expect(mergeTyped('one two three', 'one 2 three', 'one zwei three')).toBe('one zwei2 three')
    expect(mergeTyped('same', 'same', 'other')).toBe('other')
  })

  test('stays well formed (seeds of fast-check)', () => {
    fc.assert(
      fc.property(words, words, words, (base, mine, theirs) => {
        const merged = mergeTyped(base, mine, theirs)
        expect(isWellFormed(merged)).toBe(true)
        if (theirs === base) expect(merged).toBe(mine)
        if (mine === base) expect(merged).toBe(theirs)
      }),
      { numRuns: 500 },
    )
  })

  test('[W1.67] two people offline: the note holds what both typed, in both documents', () => {
    const left = sampleDoc()
    const right = docOf(Y.encodeStateAsUpdate(left))
    const first = applyEdit(left, [
      { op: 'note', section: 'lines', id: 'via', field: 'note', text: 'Back-drilled, plugged' },
    ])
    const second = applyEdit(right, [
      { op: 'note', section: 'lines', id: 'via', field: 'note', text: 'To be back-drilled' },
    ])
    if (!first.ok || !second.ok || !first.update || !second.update) throw new Error('refused')
    Y.applyUpdate(left, second.update)
    Y.applyUpdate(right, first.update)
    expect(readBudget(left).lines.via?.note).toBe('To be back-drilled, plugged')
    expect(readBudget(right).lines.via?.note).toBe('To be back-drilled, plugged')
  })

  test('[W1.67] what came in while the cell was open stays', () => {
    const doc = sampleDoc()
    applyEdit(doc, [{ op: 'note', section: 'lines', id: 'via', field: 'note', text: 'Both: Back-drilled' }])
    const edit = applyEdit(doc, [
      { op: 'note', section: 'lines', id: 'via', field: 'note', text: 'Back-drilled deep', base: 'Back-drilled' },
    ])
    expect(readBudget(doc).lines.via?.note).toBe('Both: Back-drilled deep')
    expect(edit.ok && edit.operations).toEqual([
      {
        op: 'note',
        section: 'lines',
        id: 'via',
        field: 'note',
        text: 'Both: Back-drilled deep',
        base: 'Both: Back-drilled',
      },
    ])
  })
})
