export type Grade = 'good' | 'acceptable' | 'inconclusive' | 'poor'

/** A metric of the initial quality check, 100 % at best. */
export type Metric = { readonly percent: number; readonly grade: Grade }

/** Percent up to which a metric is poor, inconclusive and acceptable (IEEE Std 370-2020, initial quality check). */
type Thresholds = readonly [poor: number, inconclusive: number, acceptable: number]
export const SIZE_THRESHOLDS: Thresholds = [80, 99, 99.9]
export const ROTATION_THRESHOLDS: Thresholds = [20, 50, 80]

export function graded(percent: number, [poor, inconclusive, acceptable]: Thresholds): Metric {
  if (percent <= poor) return { percent, grade: 'poor' }
  if (percent <= inconclusive) return { percent, grade: 'inconclusive' }
  return { percent, grade: percent <= acceptable ? 'acceptable' : 'good' }
}

/** Percent of an ideal file that is left when each frequency takes off what it exceeds its limit by, in tenths. */
export function percentLeft(frequencies: number, excess: number): number {
  return (Math.max(frequencies - excess / 0.1, 0) / frequencies) * 100
}
