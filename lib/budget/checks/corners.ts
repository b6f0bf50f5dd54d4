import type { Check } from './check'
import { lineFlag } from './lineFlag'

/** Lines that a judged corner leaves as they are although their numbers do not hold there: each said once. */
export const corners: Check = function* ({ judged }) {
  const said = new Set<string>()
  for (const { moved, conditions } of judged) {
    for (const item of moved?.unmoved ?? []) {
      if (said.has(item.id)) continue
      said.add(item.id)
      yield lineFlag(
        item,
        'corner-does-not-move',
        'conditionTemperature',
        `is not moved by the corner ${conditions.corner?.name ?? ''}: nothing says how its number changes there.`,
        'Say the conditions that the number holds in, or give the number for the corner.',
      )
    }
  }
}
