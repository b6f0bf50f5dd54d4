import { median } from '../../channel/statistics'
import { formatQuantity, isQuantity } from '../../channel/units'
import type { FlagDraft } from '../flags'
import type { LineItem } from '../lineItem'
import { LENGTH } from '../quantities'
import { unitSuspected } from '../unitSuspected'
import type { Check } from './check'
import { lineFlag } from './lineFlag'

/** So many of a kind make a link's usual length. */
const ENOUGH = 3
/** A length this many times longer or shorter than the others is asked about, if another unit brings it near them. */
const AWAY = 12
const NEAR = 2

const UNITS = ['mm', 'mil', 'in', 'm', 'ft'] as const

/** Lengths of traces and cables that another unit would bring near those of the link: mil as mm (×39.4), mm as in (×25.4), and so on. */
export const lengths: Check = function* ({ context: { items }, lines }) {
  for (const kind of ['trace', 'cable'] as const) {
    const found: { readonly item: LineItem; readonly metres: number }[] = []
    let [shortest, longest] = [Number.POSITIVE_INFINITY, 0]
    for (const item of items) {
      const metres = item.line.kind === kind ? (lines.get(item.id)?.lengthM ?? 0) : 0
      if (metres === 0) continue
      found.push({ item, metres })
      shortest = Math.min(shortest, metres)
      longest = Math.max(longest, metres)
    }
    if (found.length < ENOUGH || longest < AWAY * shortest) continue
    const usual = median(found.map(({ metres }) => metres))
    for (const { item, metres } of found) {
      if (metres < usual * AWAY && metres > usual / AWAY) continue
      yield* suspected(item, usual)
    }
  }
}

function* suspected(item: LineItem, usual: number): Generator<FlagDraft> {
  const { length } = item.line
  const quantity = length === null ? null : LENGTH.read(length)
  if (quantity === null || !isQuantity(quantity)) return
  const unit = unitSuspected(quantity, UNITS, (metres) => metres < usual * NEAR && metres > usual / NEAR)
  if (unit === null) return
  yield lineFlag(
    item,
    'unit-suspected',
    'length',
    `is ${length} long; the lines of its kind are ${formatQuantity(usual, 'length', 'in', 3)} in the middle, and in ${unit} it would be like them.`,
    `Check whether ${unit} was meant.`,
  )
}
