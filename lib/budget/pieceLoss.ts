import { formatScaled } from '../channel/units'
import type { LossAt } from './evaluation'
import type { Findings } from './findings'
import type { Beside, Piece } from './models/piece'
import type { Line } from './schema'

/** A stated number holds within ±2 % of its frequency, and so does the end of a range. */
const EDGE = 0.02

export type PieceLoss = {
  readonly db: number
  readonly by: NonNullable<LossAt['by']>
  readonly beside: readonly Beside[]
}

/**
 * What a computed piece counts at one frequency: a uniform line its attenuation, a discrete its insertion loss in the
 * reference; and the other ways to look at it.
 * @param reference Ω, differential
 * @returns null after writing down why there is no number
 */
export function pieceLoss(
  piece: Piece,
  fields: Findings<'lines'>,
  line: Line,
  hz: number,
  reference: number | null,
): PieceLoss | null {
  if (hz < piece.from * (1 - EDGE) || hz > piece.to * (1 + EDGE)) return outside(piece, fields, line, hz)
  const within = Math.min(Math.max(hz, piece.from), piece.to)
  const at = Float64Array.of(within)
  const counted = piece.attenuation === null ? null : (piece.attenuation(at)[0] ?? null)
  const by =
    line.model === 'network' ? 'measured' : line.model === 'table' || line.model === 'class' ? 'table' : 'computed'
  if (reference === null)
    return counted === null ? noReference(fields) : finite(fields, { db: counted, by, beside: [] })
  const s = piece.twoPort(at, reference)
  // Subtracted from 0: a loss of nothing must not become −0, which JSON does not know.
  const insertion = 0 - 20 * Math.log10(Math.hypot(s[4] as number, s[5] as number))
  if (counted !== null) {
    const beside = piece.reflects ? [{ what: 'mismatch' as const, db: insertion - counted }] : []
    return finite(fields, { db: counted, by, beside: [...beside, ...(piece.beside?.(within) ?? [])] })
  }
  const passed = 1 - (s[0] as number) ** 2 - (s[1] as number) ** 2
  const dissipated = passed > 0 ? [{ what: 'dissipated' as const, db: insertion + 10 * Math.log10(passed) }] : []
  return finite(fields, { db: insertion, by, beside: [...dissipated, ...(piece.beside?.(within) ?? [])] })
}

function finite(fields: Findings<'lines'>, loss: PieceLoss): PieceLoss | null {
  if (Number.isFinite(loss.db)) return loss
  return fields.say(
    'nothing-passes',
    'model',
    `${fields.name}: with these values nothing passes, or the model gives no number.`,
    'Check the values against the drawing of the part.',
  )
}

function outside(piece: Piece, fields: Findings<'lines'>, line: Line, hz: number): null {
  const [from, to, asked] = [piece.from, piece.to, hz].map((at) => formatScaled(at, 'frequency'))
  const measured = line.model === 'network'
  return fields.say(
    'outside-validity',
    measured ? 'evidence' : 'model',
    `${fields.name}: ${measured ? 'its file reaches' : 'its model holds'} from ${from} to ${to}; ${asked} lies outside, and nothing is extrapolated.`,
    measured ? `Attach a file that reaches ${asked}.` : `State the loss at ${asked}, with where it comes from.`,
  )
}

function noReference(fields: Findings<'lines'>): null {
  return fields.say(
    'field-missing',
    'model',
    `${fields.name}: the loss of a discrete depends on the differential reference impedance, which the link does not say.`,
    "Type the link's reference impedance, such as 100 Ω.",
  )
}
