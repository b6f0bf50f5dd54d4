import { formatQuantity } from '../../channel/units'
import type { FlagDraft } from '../flags'
import type { LineItem } from '../lineItem'
import { LENGTH, typedValue } from '../quantities'
import type { Check } from './check'
import { lineFlag } from './lineFlag'

/** m, and share of the thickness: what rounding and plating may leave over. */
const LEEWAY = 0.05e-3
const LEEWAY_SHARE = 0.03

/** Used depth and stub of a via against the thickness of its board, in every lane that has a stub of its own. */
export const stubs: Check = function* ({ context: { items, lanes } }) {
  for (const item of items) {
    const { boardThickness, usedDepth } = item.line
    if (item.line.kind !== 'via' || boardThickness === null || usedDepth === null) continue
    const ofLanes = lanes.differing.get(item.id)?.values() ?? []
    for (const one of new Map([item, ...ofLanes].map((each) => [each.line.stub, each])).values()) yield* mismatch(one)
  }
}

function* mismatch(item: LineItem): Generator<FlagDraft> {
  const { line, lane } = item
  const [board, used, stub] = [line.boardThickness, line.usedDepth, line.stub].map((text) => typedValue(LENGTH, text))
  if (board == null || used == null || stub == null) return
  const leeway = Math.max(LEEWAY, LEEWAY_SHARE * board)
  const over = used + stub - board
  // A drill with its tolerance says that the rest was drilled away.
  if (over <= leeway && (over >= -leeway || line.drillTolerance !== null)) return
  const drilled =
    over < 0 ? 'if the rest is drilled away, type the tolerance of the drill' : 'a stub ends at the far side'
  yield lineFlag(
    item,
    'stub-depth-mismatch',
    'stub',
    `uses ${mm(used)} of its barrel and leaves a stub of ${mm(stub)}${lane === null ? '' : ` in lane ${lane}`}, in a board of ${mm(board)}.`,
    `Check from which side the stub is measured; ${drilled}.`,
  )
}

function mm(metres: number): string {
  return formatQuantity(metres, 'length', 'mm', 4)
}
