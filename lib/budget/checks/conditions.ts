import { cornerFactor, holdsIn } from '../corner'
import type { FlagDraft } from '../flags'
import type { LineItem } from '../lineItem'
import type { Check } from './check'
import { lineFlag } from './lineFlag'

/** Numbers that hold in other conditions than they are counted in. */
export const conditions: Check = function* ({ context, judged }) {
  for (const item of context.items) yield* otherThanReference(item, context.referenceTemperature)
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

function* otherThanReference(item: LineItem, reference: number | null): Generator<FlagDraft> {
  const { temperature, humidity } = holdsIn(item.line, item.lossClass)
  const warm = temperature !== null && reference !== null && temperature !== reference
  if (!warm && humidity !== 'wet') return
  const holds = [warm ? `at ${temperature} °C` : '', humidity === 'wet' ? 'wet' : ''].filter(Boolean).join(' and ')
  const corner = reference === null ? 'dry' : `${reference} °C, dry`
  yield lineFlag(
    item,
    'other-conditions',
    'conditionTemperature',
    `holds ${holds}; in the reference corner (${corner}) it counts as it is.`,
    'Give the number in the conditions of the reference corner.',
  )
}
