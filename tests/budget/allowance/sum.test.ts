import { describe, expect, it } from 'vitest'
import { type Counted, countedLine, judgedHigh, judgedLow, sumOf } from '../../../lib/budget/allowance/sum'
import { lineItems } from '../../../lib/budget/lineItem'
import { noLoss } from '../../../lib/budget/lineLoss'
import { NO_SPREAD } from '../../../lib/budget/tolerance'
import { line, link } from '../links'

const SPREAD = { lowExtreme: 0.1, highExtreme: 0.2, lowThreeSigma: 0.3, highThreeSigma: 0.4 }

/** A line of its own group, or of the one named, as it is counted. */
function counted(id: string, sign: Counted['sign'], nominal: number | null, spread = SPREAD, group = id): Counted {
  const [item] = lineItems(link({ lines: { [id]: line('a1', null, { group }) } }), new Map())
  if (!item) throw new Error('no line')
  return { item, sign, loss: { ...noLoss([]), nominal, spread } }
}
const near = (value: number) => expect.closeTo(value, 12)

describe('the sum of the lines between two planes (by hand)', () => {
  it('of nothing is nothing', () => {
    expect(sumOf([])).toEqual({
      nominal: 0,
      worst: 0,
      least: 0,
      rssUp: 0,
      rssDown: 0,
      undecided: [],
      overlapUndecided: false,
    })
  })

  it('has every line at its worst and at its least, and three standard deviations to each side', () => {
    const other = { lowExtreme: 0.5, highExtreme: 0.6, lowThreeSigma: 0.4, highThreeSigma: 0.3 }
    expect(sumOf([counted('a', 1, 4), counted('b', 1, 2, other)])).toEqual({
      nominal: near(6),
      worst: near(6.8),
      least: near(5.4),
      rssUp: near(0.5),
      rssDown: near(0.5),
      undecided: [],
      overlapUndecided: false,
    })
  })

  it('subtracts an overlap: its least makes the worst sum, its high side the least one', () => {
    const alone = sumOf([counted('a', 1, 4), counted('o', -1, 1)])
    expect(alone).toMatchObject({ nominal: near(3), worst: near(3.3), least: near(2.7) })
    expect(alone).toMatchObject({ rssUp: near(0.5), rssDown: near(0.5) })
    expect(sumOf([counted('o', -1, 1)])).toMatchObject({ rssUp: near(0.3), rssDown: near(0.4) })
  })

  it('adds linearly inside a group', () => {
    const together = sumOf([counted('a', 1, 4, SPREAD, 'lot'), counted('b', 1, 2, SPREAD, 'lot')])
    expect(together).toMatchObject({ rssUp: near(0.8), rssDown: near(0.6) })
  })

  it('names what has no number, tells an overlap apart, and leaves out what does not count', () => {
    const some = sumOf([counted('a', 1, null), counted('b', 0, null), counted('c', 1, 2), counted('d', 0, 9)])
    expect(some).toMatchObject({ nominal: 2, worst: 2.2, undecided: ['a'], overlapUndecided: false })
    const overlap = sumOf([counted('o', -1, null), counted('a', 1, null)])
    expect(overlap).toMatchObject({ nominal: 0, undecided: ['o', 'a'], overlapUndecided: true })
    expect(sumOf([counted('o', -1, 1), counted('a', 1, null)]).overlapUndecided).toBe(false)
  })

  it('is judged at the statistic asked for, high for a limit and low for a least loss', () => {
    const sum = { nominal: 6, worst: 7, least: 4, rssUp: 0.3, rssDown: 0.2, undecided: [], overlapUndecided: false }
    const statistics = ['nominal', 'rss', 'worst'] as const
    expect(statistics.map((statistic) => judgedHigh(sum, statistic))).toEqual([6, 6.3, 7])
    expect(statistics.map((statistic) => judgedLow(sum, statistic))).toEqual([6, 5.8, 4])
  })
})

describe('what one line adds to it (by hand)', () => {
  it('is its loss and the two sides of it', () => {
    expect(countedLine(counted('a', 1, 4))).toEqual({ id: 'a', countedDb: 4, lowDb: near(3.9), highDb: near(4.2) })
  })

  it('is negative for an overlap, whose sides change places', () => {
    expect(countedLine(counted('o', -1, 4))).toEqual({ id: 'o', countedDb: -4, lowDb: near(-4.2), highDb: near(-3.9) })
    const nothing = countedLine(counted('o', -1, 0, NO_SPREAD))
    expect([nothing.countedDb, nothing.lowDb, nothing.highDb].map((db) => Object.is(db, 0))).toEqual([true, true, true])
  })

  it('is 0 where it does not count, number or not, and unknown without a number', () => {
    expect(countedLine(counted('a', 0, null))).toEqual({ id: 'a', countedDb: 0, lowDb: 0, highDb: 0 })
    expect(countedLine(counted('a', 0, 4))).toEqual({ id: 'a', countedDb: 0, lowDb: 0, highDb: 0 })
    expect(countedLine(counted('a', 1, null))).toEqual({ id: 'a', countedDb: null, lowDb: null, highDb: null })
  })
})
