import { holdsIn } from '../corner'
import type { LineCheck } from './check'
import { lineFlag } from './lineFlag'

/** A number that holds in other conditions than those of the reference corner, where it is counted. */
export const otherConditions: LineCheck = function* (item, { referenceTemperature: reference }) {
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
