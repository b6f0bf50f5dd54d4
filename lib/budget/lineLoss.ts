import { skewLoss } from '../channel/lines'
import { formatScaled } from '../channel/units'
import { type Conditions, cornerFactor } from './corner'
import type { LossAt } from './evaluation'
import { Findings } from './findings'
import type { FlagDraft } from './flags'
import type { LineItem } from './lineItem'
import { modelOf } from './models'
import { TIME } from './quantities'
import { type Spread, spreadOf, toleranceOf } from './tolerance'

/** Where and in what a line's loss is asked for. */
export type Asked = {
  readonly hz: number
  /** Ω, differential. */
  readonly reference: number | null
  /** Null: the reference corner. */
  readonly corner: Conditions | null
  readonly mistake: (hz: number) => string | null
}

export type LineLoss = {
  /** dB, positive; null: unknown. */
  readonly nominal: number | null
  readonly by: LossAt['by']
  readonly spread: Spread
  /** Why the corner cannot be judged for this line, as half a sentence; the number is then that of the reference corner. */
  readonly cornerUnknown: string | null
  readonly drafts: readonly FlagDraft[]
}

const NO_SPREAD: Spread = { lowExtreme: 0, highExtreme: 0, lowThreeSigma: 0, highThreeSigma: 0 }

/** The loss of one line at one frequency: model, corner, skew inside the pair, tolerance. Pure. */
export function lineLoss(item: LineItem, asked: Asked): LineLoss {
  const drafts: FlagDraft[] = []
  const fields = Findings.ofLine(item.id, item.line, drafts)
  const classId = item.line.lossClass ?? ''
  const found = modelOf(item.line)({
    line: item.line,
    fields,
    lossClass: item.lossClass,
    classFields: item.lossClass && Findings.ofClass(fields, classId, item.lossClass),
    hz: asked.hz,
    reference: asked.reference,
    mistake: asked.mistake,
  })
  const skew = skewOf(fields, asked.hz)
  if (found === null || skew === null) {
    return { nominal: null, by: null, spread: NO_SPREAD, cornerUnknown: null, drafts }
  }
  const factor = asked.corner === null ? 1 : cornerFactor(item.line, item.lossClass, asked.corner)
  const grown = typeof factor === 'string' ? found.db : found.db * factor
  const tolerance = toleranceOf(item.line, item.lossClass)
  const spread = spreadOf(tolerance, grown, found.spreadDb)
  if (typeof spread === 'string') {
    sayUnreadable(fields, item, spread)
    return { nominal: null, by: null, spread: NO_SPREAD, cornerUnknown: null, drafts }
  }
  const cornerUnknown = typeof factor === 'string' ? factor : null
  return { nominal: grown + skew, by: found.by, spread, cornerUnknown, drafts }
}

function skewOf(fields: Findings<'lines'>, hz: number): number | null {
  const skew = fields.may('skew', TIME)
  if (skew === null) return 0
  if (skew === 'unreadable') return null
  const loss = skewLoss(skew, hz)
  if (loss !== null) return loss
  return fields.say(
    'skew-too-large',
    'skew',
    `${fields.name}: a skew of ${formatScaled(skew, 'time')} is half a period or more at ${formatScaled(hz, 'frequency')}; the differential signal vanishes.`,
    'Correct the skew; it is the difference of delay inside the pair.',
  )
}

function sayUnreadable(fields: Findings<'lines'>, item: LineItem, field: 'toleranceMinus' | 'tolerancePlus'): void {
  fields.say(
    'unreadable-value',
    field,
    `${fields.name}: the tolerance '${item.line[field] ?? item.lossClass?.[field] ?? ''}' cannot be read.`,
    'Type it in dB or in %, such as 0.2 dB or 6 %.',
  )
}
