import { holdsIn } from '../corner'
import { cornerFactor } from '../cornerFactor'
import type { Check } from './check'
import { lineFlag } from './lineFlag'

/** Maxima that do not say their temperature and were put through a corner. */
export const conditions: Check = function* ({ judged }) {
  for (const { conditions: asked, span } of judged) {
    const { corner } = asked
    if (corner === null) continue
    for (const item of span.items) {
      const holds = holdsIn(item.line, item.lossClass)
      const factor = cornerFactor(item.line, item.lossClass, corner)
      if (holds.grade !== 'maximum' || holds.temperature !== null || typeof factor === 'string' || factor <= 1) continue
      yield lineFlag(
        item,
        'maximum-through-corner',
        'conditionTemperature',
        `is a guaranteed maximum that does not say its temperature, and was put through the corner ${corner.name}.`,
        'Type the temperature that the maximum holds at; a maximum over temperature already contains the corner.',
      )
    }
  }
}
