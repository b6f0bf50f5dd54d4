import { groupedRootSumSquare } from '../../channel/statistics'
import type { CountedLine } from '../evaluation'
import { groupOf, type LineItem } from '../lineItem'
import type { LineLoss } from '../lineLoss'
import type { Statistic } from '../schema'

/** A line between the planes in one lane, and whether it adds, subtracts or does not count there. */
export type Counted = {
  readonly item: LineItem
  readonly sign: 1 | -1 | 0
  readonly loss: LineLoss
}

/** Sum of the lines that have a number. */
export type Sum = {
  readonly nominal: number
  /** Every line at its worst; at its least. */
  readonly worst: number
  readonly least: number
  /** Three standard deviations of the grouped sum, upwards and downwards. */
  readonly rssUp: number
  readonly rssDown: number
  readonly undecided: readonly string[]
  readonly overlapUndecided: boolean
}

export function sumOf(lines: readonly Counted[]): Sum {
  let nominal = 0
  let worst = 0
  let least = 0
  const up: { group: string; value: number }[] = []
  const down: { group: string; value: number }[] = []
  const undecided: string[] = []
  let overlapUndecided = false
  for (const { item, sign, loss } of lines) {
    if (sign === 0) continue
    if (loss.nominal === null) {
      undecided.push(item.id)
      overlapUndecided ||= sign < 0
      continue
    }
    const { lowExtreme, highExtreme, lowThreeSigma, highThreeSigma } = loss.spread
    const group = groupOf(item)
    nominal += sign * loss.nominal
    worst += sign > 0 ? loss.nominal + highExtreme : lowExtreme - loss.nominal
    least += sign > 0 ? loss.nominal - lowExtreme : -loss.nominal - highExtreme
    up.push({ group, value: sign > 0 ? highThreeSigma : lowThreeSigma })
    down.push({ group, value: sign > 0 ? lowThreeSigma : highThreeSigma })
  }
  const [rssUp, rssDown] = [groupedRootSumSquare(up), groupedRootSumSquare(down)]
  return { nominal, worst, least, rssUp, rssDown, undecided, overlapUndecided }
}

/** The sum in the judged statistic: what a limit, or a least loss, is held against. */
export function judgedHigh(sum: Sum, statistic: Statistic): number {
  return statistic === 'nominal' ? sum.nominal : statistic === 'rss' ? sum.nominal + sum.rssUp : sum.worst
}

export function judgedLow(sum: Sum, statistic: Statistic): number {
  return statistic === 'nominal' ? sum.nominal : statistic === 'rss' ? sum.nominal - sum.rssDown : sum.least
}

/** What a line adds to the sum: signed, null where it has no number. */
export function countedLine({ item, sign, loss }: Counted): CountedLine {
  const { nominal, spread } = loss
  if (sign === 0) return { id: item.id, countedDb: 0, lowDb: 0, highDb: 0 }
  if (nominal === null) return { id: item.id, countedDb: null, lowDb: null, highDb: null }
  const [down, up] = sign > 0 ? [spread.lowExtreme, spread.highExtreme] : [spread.highExtreme, spread.lowExtreme]
  // Subtracted from 0, not multiplied by −1: a loss of nothing must not become −0, which JSON does not know.
  const counted = sign > 0 ? nominal : 0 - nominal
  return { id: item.id, countedDb: counted, lowDb: counted - down, highDb: counted + up }
}
