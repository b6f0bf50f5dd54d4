import type { Check } from './check'
import { lineFlag } from './lineFlag'

/** Lines that a judged corner leaves as they are, or moves in part only, although their numbers do not hold there: each said once. */
export const corners: Check = function* ({ judged }) {
  const said = new Set<string>()
  for (const { moved, conditions } of judged) {
    const corner = conditions.corner?.name ?? ''
    for (const item of moved?.unmoved ?? []) {
      if (said.has(item.id)) continue
      said.add(item.id)
      yield lineFlag(
        item,
        'corner-does-not-move',
        'conditionTemperature',
        `is not moved by the corner ${corner}: nothing says how its number changes there.`,
        'Say the conditions that the number holds in, or give the number for the corner.',
      )
    }
    for (const item of moved?.copperOnly ?? []) {
      if (said.has(item.id)) continue
      said.add(item.id)
      yield lineFlag(
        item,
        'corner-does-not-move',
        'conditionTemperature',
        `is moved by the corner ${corner} in its copper only: nothing says how the loss tangent of its dielectric grows there.`,
        'Type the growth of the loss tangent per kelvin at the corner; 0 %/K says that it does not grow.',
      )
    }
  }
}
