import { type LimitCurve, parseCurve } from '../../channel/limits'
import { holdsAt } from '../../channel/lines'
import { formatScaled } from '../../channel/units'
import type { FlagCode } from '../flags'
import { FREQUENCY, LOSS, typedValue } from '../quantities'
import type { Allowance } from '../schema'
import { movedLimit } from './movedLimit'

/** What an allowance allows, and where. */
export type Limit = {
  /** dB; null: not given, or not to be had at the frequency asked for. */
  readonly db: number | null
  /** Hz: the frequency that it is used at; null: neither the allowance nor the link says one. */
  readonly atHz: number | null
  readonly curve: LimitCurve | null
  /** Why it cannot be used, as half a sentence. */
  readonly blocked: string | null
  /** What a person should know of it, as the rest of a sentence that begins with the allowance's name. */
  readonly remarks: readonly {
    readonly code: FlagCode
    readonly field: string
    readonly message: string
    readonly todo: string
  }[]
}

/** Reads the limit, its curve, and the frequency that it is used at; a limit is moved along its own curve and never otherwise. */
export function limitOf(allowance: Allowance, nyquist: number | null): Limit {
  const remarks: Limit['remarks'][number][] = []
  const curve = curveOf(allowance, remarks)
  const own = typedValue(FREQUENCY, allowance.at) ?? nyquist
  const used = typedValue(FREQUENCY, allowance.usedAt)
  const db = typedValue(LOSS, allowance.limit)
  if (used === null || own === null || db === null || holdsAt(own, used)) {
    return { db, atHz: used ?? own, curve, blocked: null, remarks }
  }
  const [from, to] = [formatScaled(own, 'frequency'), formatScaled(used, 'frequency')]
  const moved = movedLimit(db, own, curve, used)
  if ('reason' in moved) {
    remarks.push({
      code: 'limit-not-moved',
      field: 'usedAt',
      message: `is stated at ${from} and asked for at ${to}: ${moved.reason}.`,
      todo: 'Use the limit at its own frequency, or type its published curve.',
    })
    return { db, atHz: used, curve, blocked: `its limit cannot be had at ${to}: ${moved.reason}`, remarks }
  }
  remarks.push({
    code: 'limit-moved',
    field: 'usedAt',
    message: `was moved from ${db.toFixed(2)} dB at ${from} along its own curve to ${moved.limitDb.toFixed(2)} dB at ${to}.`,
    todo: 'Look the limit up at this rate in your own copy of the standard.',
  })
  return { db: moved.limitDb, atHz: used, curve, blocked: null, remarks }
}

function curveOf(allowance: Allowance, remarks: Limit['remarks'][number][]): LimitCurve | null {
  if ((allowance.curve?.trim() ?? '') === '') return null
  const parsed = parseCurve(allowance.curve ?? '')
  if (!('reason' in parsed)) return parsed
  remarks.push({
    code: 'unreadable-value',
    field: 'curve',
    message: `has a limit curve that cannot be read.`,
    todo: parsed.reason,
  })
  return null
}
