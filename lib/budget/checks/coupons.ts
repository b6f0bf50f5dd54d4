import { moveUniformLoss } from '../../channel/lines'
import { formatQuantity } from '../../channel/units'
import { basisOf, type LineItem } from '../lineItem'
import { FREQUENCY, LENGTH, LOSS_PER_LENGTH, typedValue } from '../quantities'
import { nameOf } from '../record'
import type { Budget, LossClass } from '../schema'
import type { Check } from './check'
import { lineFlag } from './lineFlag'

/** A model that loses less than this share of what its coupon shows is too kind. */
const TOO_KIND = 0.9
/** Widths within this share are the same trace. */
const SAME_WIDTH = 0.02

/** Computed and simulated traces against measured loss classes of the same assembly, layer and width. */
export const coupons: Check = function* ({ context: { budget, items, signalling }, lines }) {
  const { nyquist } = signalling.evaluation
  const measured = nyquist === null ? [] : measuredClasses(budget, nyquist)
  if (measured.length === 0) return
  for (const item of items) {
    const own = lines.get(item.id)
    if (!isModel(item) || !own?.lengthM || own.loss.nominalDb === null) continue
    const perLength = own.loss.nominalDb / own.lengthM
    const coupon = measured.find(({ record }) => sameTrace(item, record))
    if (coupon === undefined || perLength >= TOO_KIND * coupon.perLength) continue
    const [model, shown] = [perLength, coupon.perLength].map((db) => formatQuantity(db, 'lossPerLength', 'dB/in', 3))
    yield lineFlag(
      item,
      'model-below-coupon',
      item.line.model === 'geometry' ? 'model' : 'lossClass',
      `comes to ${model}; the measured loss class ${nameOf('lossClasses', coupon.id, coupon.record)} of its layer and width has ${shown}.`,
      "Use the measured class, or scale the model by 'measured / model'.",
    )
  }
}

type Coupon = { readonly id: string; readonly record: LossClass; readonly perLength: number }

function measuredClasses(budget: Budget, hz: number): Coupon[] {
  const found: Coupon[] = []
  for (const id in budget.lossClasses) {
    const record = budget.lossClasses[id]
    if (!record || record.removed || record.basis !== 'measured' || record.layer === null) continue
    const stated = typedValue(LOSS_PER_LENGTH, record.lossPerLength)
    const at = typedValue(FREQUENCY, record.at)
    const moved = stated === null || at === null ? null : moveUniformLoss(stated, at, hz)
    if (moved !== null) found.push({ id, record, perLength: moved.db })
  }
  return found
}

/** A trace computed from its cross-section, or of a loss class that nobody measured. */
function isModel(item: LineItem): boolean {
  if (item.line.kind !== 'trace') return false
  return item.line.model === 'geometry' || (item.line.model === 'class' && basisOf(item) !== 'measured')
}

function sameTrace({ line, lossClass }: LineItem, coupon: LossClass): boolean {
  const layer = line.layer ?? lossClass?.layer ?? null
  if (line.assembly === null || line.assembly !== coupon.assembly || layer === null || coupon.layer === null)
    return false
  if (layer.trim().toLowerCase() !== coupon.layer.trim().toLowerCase()) return false
  const width = typedValue(LENGTH, line.width ?? lossClass?.width ?? null)
  const measured = typedValue(LENGTH, coupon.width)
  return width !== null && measured !== null && Math.abs(width / measured - 1) <= SAME_WIDTH
}
