import { skewLoss } from '../channel/lines'
import { formatScaled } from '../channel/units'
import { type Conditions, holdsIn } from './corner'
import { cornerFactor } from './cornerFactor'
import type { EvidenceData, LossAt } from './evaluation'
import { Findings } from './findings'
import type { FlagDraft } from './flags'
import type { LineItem } from './lineItem'
import { modelOf } from './models'
import type { Computed, Piece } from './models/piece'
import { pieceLoss } from './pieceLoss'
import { TIME } from './quantities'
import type { Budget } from './schema'
import { surroundingsOf } from './surroundings'
import { NO_SPREAD, type Spread } from './tolerance'
import { NOT_RANDOM, type Random, variationOf } from './variation'

/** Where and in what a line's loss is asked for. */
export type Asked = {
  readonly budget: Budget
  readonly evidence: EvidenceData
  readonly hz: number
  /** Ω, differential. */
  readonly reference: number | null
  /** °C of the reference corner. */
  readonly referenceTemperature: number | null
  /** Bd. */
  readonly symbolRate: number | null
  /** Null: the reference corner. */
  readonly corner: Conditions | null
  readonly mistake: (hz: number) => string | null
}

export type LineLoss = {
  /** dB, positive; null: unknown. */
  readonly nominal: number | null
  readonly by: LossAt['by']
  readonly beside: LossAt['beside']
  readonly spread: Spread
  /** The same for random builds. */
  readonly random: Random
  /** What the line's model computes, in the corner; null: a number at a frequency, or none. */
  readonly computed: Computed | null
  readonly piece: Piece | null
  /** By what a corner that the model does not recompute multiplies the loss. */
  readonly factor: number
  /** Why the corner cannot be judged for this line, as half a sentence; the number is then that of the reference corner. */
  readonly cornerUnknown: string | null
  readonly drafts: readonly FlagDraft[]
}

export function noLoss(drafts: readonly FlagDraft[]): LineLoss {
  return {
    nominal: null,
    by: null,
    beside: [],
    spread: NO_SPREAD,
    random: NOT_RANDOM,
    computed: null,
    piece: null,
    factor: 1,
    cornerUnknown: null,
    drafts,
  }
}

/** The loss of one line at one frequency: model, corner, skew inside the pair, tolerance. Pure. */
export function lineLoss(item: LineItem, asked: Asked): LineLoss {
  const drafts: FlagDraft[] = []
  const fields = Findings.ofLine(item.id, item.line, drafts)
  const found = foundIn(item, asked, fields, asked.corner)
  const skew = skewOf(fields, asked.hz)
  if (found === null || skew === null) return noLoss(drafts)
  const factor = asked.corner === null ? 1 : cornerFactor(item.line, item.lossClass, asked.corner)
  const known = typeof factor === 'string' ? 1 : factor
  const least = asked.corner === null ? Number.NEGATIVE_INFINITY : leastIn(item, asked)
  const grown = Math.max(least, found.db * known)
  const varied = variationOf(item, fields, found, grown, asked.hz, asked.reference)
  if (varied === null) return noLoss(drafts)
  const { spread, random } = varied
  // A number that contains the spread of fabrication is at no extreme of it.
  const extreme = item.line.processIncluded ? 'nominal' : (asked.corner?.fabrication ?? 'nominal')
  const shift = extreme === 'high-loss' ? spread.highExtreme : extreme === 'low-loss' ? -spread.lowExtreme : 0
  const moved = Math.max(least, grown + shift)
  return {
    nominal: moved + skew,
    by: found.by,
    beside: found.beside,
    spread: extreme === 'nominal' ? spread : NO_SPREAD,
    random: extreme === 'nominal' ? random : NOT_RANDOM,
    computed: found.computed,
    piece: found.piece,
    factor: found.db === 0 ? known : moved / found.db,
    cornerUnknown: typeof factor === 'string' ? factor : null,
    drafts,
  }
}

type Found = Pick<LineLoss, 'beside' | 'computed' | 'piece'> & {
  readonly db: number
  readonly by: NonNullable<LossAt['by']>
  readonly spreadDb: number
}

function foundIn(item: LineItem, asked: Asked, fields: Findings<'lines'>, corner: Conditions | null): Found | null {
  const { line, lossClass } = item
  const { budget, evidence, hz, reference, symbolRate, mistake } = asked
  const found = modelOf(line)({
    line,
    fields,
    lossClass,
    classFields: lossClass && Findings.ofClass(fields, line.lossClass ?? '', lossClass),
    budget,
    evidence,
    surroundings: surroundingsOf(line, lossClass, corner, asked.referenceTemperature),
    hz,
    reference,
    symbolRate,
    mistake,
  })
  if (found === null) return null
  if (!('build' in found)) return { ...found, beside: [], computed: null, piece: null }
  const piece = found.build(found.values)
  const loss = pieceLoss(piece, fields, line, hz, reference)
  return loss && { ...loss, spreadDb: 0, computed: found, piece }
}

/** A guaranteed maximum is never lowered by a corner: what it says where it holds. */
function leastIn(item: LineItem, asked: Asked): number {
  if (holdsIn(item.line, item.lossClass).grade !== 'maximum') return Number.NEGATIVE_INFINITY
  const own = foundIn(item, asked, Findings.ofLine(item.id, item.line, []), null)
  return own?.db ?? Number.NEGATIVE_INFINITY
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
