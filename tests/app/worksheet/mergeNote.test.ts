import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { mergeNote } from '../../../app/budgets/[id]/client/typed/mergeNote'

// Common practice, no source: a three-way merge of one stretch each.
describe('a note that two people type in', () => {
  it('keeps both where they typed in different places', () => {
    expect(mergeNote('one two three', 'ONE two three', 'one two three four')).toBe('ONE two three four')
    expect(mergeNote('one two three', 'one two three four', 'zero one two three')).toBe('zero one two three four')
  })
  it('says so where both changed the same words', () => {
    expect(mergeNote('one two three', 'one 2 three', 'one II three')).toBeNull()
  })
  it('takes the only change there is', () => {
    fc.assert(
      fc.property(fc.string(), fc.string(), (base, changed) => {
        expect(mergeNote(base, changed, base)).toBe(changed)
        expect(mergeNote(base, base, changed)).toBe(changed)
      }),
    )
  })
  it('two insertions at different places are both there, whoever merges', () => {
    fc.assert(
      fc.property(fc.string({ minLength: 2 }), fc.nat(), fc.nat(), (base, a, b) => {
        const [first, second] = [a % (base.length + 1), b % (base.length + 1)].sort((x, y) => x - y) as [number, number]
        fc.pre(first < second)
        const mine = `${base.slice(0, first)}\u{1}${base.slice(first)}`
        const theirs = `${base.slice(0, second)}\u{2}${base.slice(second)}`
        fc.pre(!base.includes('\u{1}') && !base.includes('\u{2}'))
        const both = `${base.slice(0, first)}\u{1}${base.slice(first, second)}\u{2}${base.slice(second)}`
        expect(mergeNote(base, mine, theirs)).toBe(both)
        expect(mergeNote(base, theirs, mine)).toBe(both)
      }),
    )
  })
})
