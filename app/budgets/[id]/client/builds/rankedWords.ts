import type { Sensitivity } from '../../../../../lib/budget/sensitivity'
import { DIMENSIONS } from '../../../../../lib/channel/units'
import { metaOf } from '../../../../../lib/sheet/layout'
import { signedDecibels } from '../../../../words/decibels'

/** What an input's whole tolerance does to the loss: '+0.55 dB'. */
export function toleranceWords({ toleranceDb }: Sensitivity): string {
  return `${signedDecibels(toleranceDb)} dB`
}

/** What one unit of the input does, in the unit that it is typed in; empty for a tolerance in dB, which is itself. */
export function perUnitWords({ input, perUnit }: Sensitivity): string {
  const meta = metaOf('lines', input)
  const dimension = meta?.kind === 'quantity' ? meta.dimensions[0] : undefined
  if (meta?.kind !== 'quantity' || dimension === undefined || dimension === 'loss') return ''
  const units: Readonly<Record<string, number>> = DIMENSIONS[dimension].units
  const db = Number((perUnit * (units[meta.unit] ?? 1)).toPrecision(3))
  return `${db < 0 ? '−' : '+'}${Math.abs(db)} dB for ${meta.unit === '' ? 'each 1' : `each ${meta.unit}`} more`
}
