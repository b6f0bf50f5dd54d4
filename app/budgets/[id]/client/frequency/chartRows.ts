import type { ChannelEvaluation } from '../../../../../lib/budget/evaluation'
import { drawnPoints, nearest } from './drawn'

/** One drawn point of the traces; decibels are those of the evaluation. */
export type ChartRow = {
  readonly hz: number
  readonly ghz: number
  readonly loss: number | null
  readonly fitted: number | null
  readonly limit: number | null
  readonly back: number | null
  /** The ground: from the limit down to the foot of the drawing. */
  readonly ground: readonly [number, number] | null
  /** Power density of the data, hanging from the top of the drawing. */
  readonly cloud: readonly [number, number] | null
}

/** What the drawing spans. */
export type Frame = {
  readonly toGhz: number
  /** dB at the foot. */
  readonly footDb: number
  /** Hz that the fit ends at. */
  readonly fittedTo: number
}

/** Points of the drawing; its figures are of the whole trace. */
const MOST_DRAWN = 400
/** The cloud of power takes so much of the height. */
const CLOUD = 0.22
/** A notch may reach past the foot: by so much more than what else there is. */
const FOOT = 1.6

/** Which points of the traces are drawn: with the allowance's frequency, Nyquist and the worst ones among them. */
export function drawnOf(channel: ChannelEvaluation, marks: readonly (number | null | undefined)[]): number[] {
  const { hz, lossDb, returnLossDb } = channel.trace
  const kept = marks.flatMap((mark) => (mark == null ? [] : [nearest(hz, mark)]))
  return drawnPoints(hz.length, returnLossDb ? [lossDb, returnLossDb] : [lossDb], kept, MOST_DRAWN)
}

/** @param symbolRate Bd; the fit ends there */
export function frameOf(limitAt: number | null, channel: ChannelEvaluation, symbolRate: number | null): Frame {
  const { lossDb, limitDb } = channel.trace
  const losses = lossDb.flatMap((db) => db ?? [])
  const limits = [...(limitDb ?? []).flatMap((db) => db ?? []), limitAt ?? 0]
  const fittedTo = Math.min(channel.toHz, symbolRate ?? channel.toHz)
  const ordinary = [fittedAt(channel.fit, fittedTo) ?? 0, ...limits].reduce((high, db) => Math.max(high, db), 1)
  const most = losses.reduce((high, db) => Math.max(high, db), 0)
  const footDb = Math.max(1.15 * ordinary, Math.min(1.05 * most, FOOT * ordinary))
  return { toGhz: channel.toHz / 1e9, footDb, fittedTo }
}

/** @param density of the power at the drawn points; null: not known */
export function chartRows(
  channel: ChannelEvaluation,
  drawn: readonly number[],
  { footDb, fittedTo }: Frame,
  density: readonly number[] | null,
): readonly ChartRow[] {
  const { hz, lossDb, returnLossDb, limitDb } = channel.trace
  return drawn.map((at, row) => {
    const limit = limitDb?.[at] ?? null
    const power = density?.[row]
    return {
      hz: hz[at] ?? 0,
      ghz: (hz[at] ?? 0) / 1e9,
      loss: lossDb[at] ?? null,
      fitted: (hz[at] ?? 0) > fittedTo ? null : fittedAt(channel.fit, hz[at] ?? 0),
      limit,
      back: returnLossDb?.[at] ?? null,
      ground: limit === null ? null : [Math.min(limit, footDb), footDb],
      cloud: power === undefined ? null : [0, power * CLOUD * footDb],
    }
  })
}

/** The fitted loss at a frequency, from its coefficients. @param fit a0 + a1·√f + a2·f + a4·f², f in GHz */
function fittedAt(fit: readonly number[] | null, hz: number): number | null {
  if (fit === null) return null
  const [a0 = 0, a1 = 0, a2 = 0, a4 = 0] = fit
  const f = hz / 1e9
  return a0 + a1 * Math.sqrt(f) + (a2 + a4 * f) * f
}
