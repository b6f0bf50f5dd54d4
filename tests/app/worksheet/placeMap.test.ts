import { describe, expect, it } from 'vitest'
import { createDrafts } from '../../../app/budgets/[id]/client/state/drafts'
import { createPlaceMap } from '../../../app/budgets/[id]/client/state/placeMap'
import { createRoving } from '../../../app/budgets/[id]/client/state/roving'

describe('what is known of places', () => {
  it('is told only where it differs', () => {
    const map = createPlaceMap<string>()
    const heard: string[] = []
    for (const place of ['a', 'b', 'c']) map.subscribe(place, () => heard.push(place))
    map.replace(
      new Map([
        ['a', 'Maren'],
        ['b', 'Tolga'],
      ]),
    )
    expect(heard.splice(0)).toEqual(['a', 'b'])
    map.replace(
      new Map([
        ['a', 'Maren'],
        ['c', 'Tolga'],
      ]),
    )
    expect(heard).toEqual(['b', 'c'])
    expect([map.get('a'), map.get('b'), map.get('c')]).toEqual(['Maren', undefined, 'Tolga'])
  })
  it('is not told to who has left', () => {
    const map = createPlaceMap<string>()
    let heard = 0
    map.subscribe('a', () => heard++)()
    map.replace(new Map([['a', 'Maren']]))
    expect(heard).toBe(0)
  })
})

describe('drafts', () => {
  const draft = { text: '0.7', base: '0.6 dB', reason: null }
  it('are kept by place, and known by record', () => {
    const drafts = createDrafts()
    let heard = 0
    drafts.subscribe('lines/one/loss', () => heard++)
    drafts.set('lines/one/loss', draft)
    drafts.set('lines/two/loss', draft)
    expect(heard).toBe(1)
    expect(drafts.get('lines/one/loss')).toEqual(draft)
    expect(drafts.within('lines/one')).toBe(true)
    expect(drafts.within('lines/on')).toBe(false)
    drafts.set('lines/one/loss', null)
    expect(drafts.within('lines/one')).toBe(false)
  })
})

describe('the cell that the Tab key reaches', () => {
  it('is told when it changes, and only then', () => {
    const roving = createRoving()
    let heard = 0
    const leave = roving.subscribe(() => heard++)
    roving.set('lines/one/loss')
    roving.set('lines/one/loss')
    expect(heard).toBe(1)
    leave()
    roving.set(null)
    expect(heard).toBe(1)
    expect(roving.get()).toBeNull()
  })
})
