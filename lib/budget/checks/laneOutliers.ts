import { median, robustSigma } from '../../channel/statistics'
import { formatQuantity, isQuantity } from '../../channel/units'
import type { FlagDraft } from '../flags'
import type { LineItem } from '../lineItem'
import { LENGTH, LOSS, type Reader, TIME } from '../quantities'
import { fieldWords } from '../record'
import { unitSuspected } from '../unitSuspected'
import type { Check } from './check'
import { lineFlag } from './lineFlag'

/** Fewer lanes make no group. */
const ENOUGH = 5
const SIGMAS = 3
/** Lanes within this share of the middle are alike, however alike the others are. */
const ALIKE = 0.02

const FIELDS = [
  ['length', LENGTH, 'length', ['mm', 'mil', 'in', 'm', 'ft']],
  ['stub', LENGTH, 'length', ['mm', 'mil', 'in']],
  ['skew', TIME, 'time', ['ps', 'fs', 'ns']],
  ['loss', LOSS, 'loss', []],
] as const

/** Lanes whose value lies more than three robust standard deviations from the lanes of the same line. */
export const laneOutliers: Check = function* ({ context: { items, lanes } }) {
  if (lanes.count < ENOUGH) return
  for (const item of items) {
    const differing = lanes.differing.get(item.id)
    if (!differing) continue
    for (const field of FIELDS) yield* ofField(item, differing, lanes.count, field)
  }
}

function* ofField(
  item: LineItem,
  differing: ReadonlyMap<number, LineItem>,
  count: number,
  [field, reader, dimension, units]: (typeof FIELDS)[number],
): Generator<FlagDraft> {
  const own = read(reader, item.line[field])
  const values: number[] = own === null ? [] : new Array<number>(count - differing.size).fill(own)
  for (const { line } of differing.values()) {
    const value = read(reader, line[field])
    if (value !== null) values.push(value)
  }
  if (values.length < ENOUGH) return
  const middle = median(values)
  const allowed = Math.max(SIGMAS * robustSigma(values, middle), ALIKE * Math.abs(middle))
  for (const [lane, { line }] of differing) {
    const value = read(reader, line[field])
    if (value === null || line[field] === item.line[field] || Math.abs(value - middle) <= allowed) continue
    const quantity = reader.read(line[field] ?? '')
    const near = (meant: number) => Math.abs(meant - middle) <= allowed
    const unit = isQuantity(quantity) ? unitSuspected(quantity, units, near) : null
    const usual = formatQuantity(middle, dimension, (isQuantity(quantity) ? quantity.unit : units[0]) as never, 4)
    yield lineFlag(
      item,
      'lane-outlier',
      field,
      `has a ${fieldWords('lines', field)} of ${line[field]} in lane ${lane}; the lanes have ${usual} in the middle${unit === null ? '' : `, and in ${unit} it would be like them`}.`,
      unit === null ? 'Check this lane against the layout.' : `Check whether ${unit} was meant.`,
    )
  }
}

function read(reader: Reader, text: string | null): number | null {
  const result = text === null ? null : reader.read(text)
  return result !== null && isQuantity(result) ? result.value : null
}
