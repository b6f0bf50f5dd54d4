import type { FlagDraft } from '../flags'
import type { LineItem } from '../lineItem'
import type { Check } from './check'
import { lineFlag } from './lineFlag'

/** Lines that a judged corner leaves as they are, or moves in part only, although their numbers do not hold there: each said once. */
export const corners: Check = function* ({ judged }) {
  const said = new Set<string>()
  for (const { moved, conditions } of judged) {
    if (moved === null) continue
    const corner = conditions.corner?.name ?? ''
    const drafts = [
      ...moved.unmoved.map((item) => unmoved(item, corner)),
      ...moved.copperOnly.map((item) => copperOnly(item, corner)),
    ]
    for (const draft of drafts) {
      if (said.has(draft.id ?? '')) continue
      said.add(draft.id ?? '')
      yield draft
    }
  }
}

function unmoved(item: LineItem, corner: string): FlagDraft {
  return lineFlag(
    item,
    'corner-does-not-move',
    'conditionTemperature',
    `is not moved by the corner ${corner}: nothing says how its number changes there.`,
    'Say the conditions that the number holds in, or give the number for the corner.',
  )
}

function copperOnly(item: LineItem, corner: string): FlagDraft {
  return lineFlag(
    item,
    'corner-does-not-move',
    'conditionTemperature',
    `is moved by the corner ${corner} in its copper only: nothing says how the loss tangent of its dielectric grows there.`,
    'Type the growth of the loss tangent per kelvin at the corner; 0 %/K says that it does not grow.',
  )
}
