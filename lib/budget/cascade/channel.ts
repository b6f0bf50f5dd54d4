import { fittedLoss } from '../../channel/fitting'
import type { LimitCurve } from '../../channel/limits'
import { cascade, insertionLoss, returnLoss } from '../../channel/networks'
import type { Counted } from '../allowance/sum'
import type { Context } from '../context'
import type { Conditions } from '../corner'
import type { ChannelEvaluation } from '../evaluation'
import { judgeCurve, limitsOver } from './curve'
import { bandOf, gridOf } from './grid'
import { isReserve, joins, type Member } from './members'
import { finite, valueAt, worstReturn } from './overGrid'
import { samplesOf } from './samples'

/** Frequencies of a sweep. */
export const SWEEP_POINTS = 2000

/** What of an allowance is looked at over frequency. */
export type Swept = {
  /** Between the planes, in the judged lane. */
  readonly lines: readonly Counted[]
  readonly corner: Conditions | null
  readonly atHz: number
  readonly curve: LimitCurve | null
}

/**
 * The cascade of the lines that have data over the band, by the star product, beside the sum. One without reflection data
 * enters as matched attenuation; a reserve that is held back at every frequency counts against a curve and is no two-port.
 * @returns null where no line takes part, or the link has neither a reference impedance nor a symbol rate
 */
export function channelOf(context: Context, swept: Swept): ChannelEvaluation | null {
  const { reference } = context.losses
  const { symbolRate, nyquist } = context.signalling.evaluation
  if (reference === null || symbolRate === null || nyquist === null) return null
  const counting = swept.lines.filter(({ sign }) => sign !== 0)
  const members: Member[] = []
  const outside: Counted[] = []
  for (const line of counting) {
    const member = joins(line, swept.atHz)
    if (member === null) outside.push(line)
    else members.push(member)
  }
  const pieces = members.map(({ piece }) => piece)
  const band = bandOf(pieces, symbolRate, swept.curve?.to ?? 0)
  if (members.length === 0 || band === null) return null
  const hz = gridOf(band, SWEEP_POINTS)
  const joined = cascade(
    members.map(({ line: { item, loss }, piece }) =>
      samplesOf(item, loss, piece, context.losses.nameOf(item, swept.corner), hz, reference),
    ),
    hz.length,
  )
  const lossDb = insertionLoss(joined)
  const lacking = outside.filter(({ item }) => !isReserve(item))
  const matched = members.filter(({ piece }) => !piece.reflects)
  const reflects = lacking.length === 0 && matched.length === 0
  const fit = fittedLoss(hz, lossDb, { form: 'weighted', to: symbolRate })
  const fitted = 'reason' in fit ? null : fit
  const returnDb = reflects ? lesser(returnLoss(joined, 1), returnLoss(joined, 2)) : null
  const held = decibels(outside.filter(({ item }) => isReserve(item)))
  return {
    fromHz: band.from,
    toHz: band.to,
    coveredDb: decibels(members.map(({ line }) => line)),
    reflectingDb: decibels(members.filter(({ piece }) => piece.reflects).map(({ line }) => line)),
    withoutBand: ids(lacking),
    withoutReflection: ids(matched.map(({ line }) => line)),
    lossDb: valueAt(hz, lossDb, swept.atHz),
    fittedDb: finite(fitted?.at(swept.atHz) ?? Number.NaN),
    fit: fitted?.coefficients.map((one) => one + 0) ?? null,
    deviation: fitted && reflects ? { rmsDb: fitted.rmsDb, maxDb: fitted.maxDb, rippleDb: fitted.rippleDb } : null,
    returnLoss: returnDb && worstReturn(hz, returnDb, nyquist),
    curve: swept.curve && judgeCurve(swept.curve, hz, lossDb, held, lacking.length === 0),
    trace: {
      hz: Array.from(hz),
      lossDb: Array.from(lossDb, finite),
      returnLossDb: returnDb && Array.from(returnDb, finite),
      limitDb: swept.curve && limitsOver(swept.curve, hz),
    },
  }
}

const ids = (lines: readonly Counted[]) => lines.map(({ item }) => item.id)
const decibels = (lines: readonly Counted[]) =>
  lines.reduce((sum, { sign, loss }) => sum + sign * (loss.nominal ?? 0), 0)

function lesser(a: Float64Array, b: Float64Array): Float64Array {
  return a.map((db, k) => Math.min(db, b[k] as number))
}
