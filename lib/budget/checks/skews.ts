import { skewLoss } from '../../channel/lines'
import type { LineItem } from '../lineItem'
import { TIME, typedValue } from '../quantities'
import { nameOf } from '../record'
import type { Check } from './check'

/** Less than this is not worth a word. */
const MATTERS_DB = 0.1

/** Skew adds up along the pair before it becomes a loss: the loss of the whole may be more than the sum of the parts. */
export const skews: Check = function* ({ judged }) {
  for (const { span, evaluation, lane } of judged) {
    if (span.from === null || evaluation.atHz === null) continue
    const skewed = lane.lines.map(({ item }) => skewOf(item)).filter((skew) => skew > 0)
    if (skewed.length < 2) continue
    const hz = evaluation.atHz
    const parts = skewed.map((skew) => skewLoss(skew, hz))
    if (parts.includes(null)) continue
    const apart = parts.reduce<number>((sum, loss) => sum + (loss ?? 0), 0)
    const together = skewLoss(
      skewed.reduce((sum, skew) => sum + skew, 0),
      hz,
    )
    if (together !== null && together - apart < MATTERS_DB) continue
    const how =
      together === null ? 'would leave no differential signal' : `would cost ${(together - apart).toFixed(2)} dB more`
    yield {
      code: 'skew-adds',
      section: 'allowances',
      id: evaluation.id,
      field: null,
      message: `${nameOf('allowances', evaluation.id, evaluation)}: the skew of ${skewed.length} lines, if all in the same direction, ${how} than line by line.`,
      todo: 'Compare the directions; type the sum on one line where they add up.',
    }
  }
}

function skewOf({ line }: LineItem): number {
  return typedValue(TIME, line.skew) ?? 0
}
