import type { Network } from '../networks/network'
import { graded, type Metric, percentLeft, SIZE_THRESHOLDS } from './grade'

/** A mean difference below this is rounding in the file. */
const LIMIT = 1e-6

export type Reciprocity = Metric & {
  /** The largest |Sij − Sji|, where, and between which ports, counted from 1. */
  readonly largest: { readonly value: number; readonly hz: number; readonly ports: readonly [number, number] }
}

/**
 * Is the way back like the way there, as in everything made of plain conductors and laminates? IEEE Std 370-2020, initial
 * quality check: each frequency takes off (mean of |Sij − Sji| over all pairs − 1e-6)/0.1 where that is above zero. It needs
 * equal meaning of the waves at all ports: power waves, as our networks hold. What it cannot see: an error that is the same
 * in both directions.
 * @returns null for a one-port
 */
export function reciprocity({ ports, hz, s }: Network): Reciprocity | null {
  if (ports < 2) return null
  const pairs = ports * (ports - 1)
  let excess = 0
  let largest = { value: 0, hz: hz[0] as number, ports: [2, 1] as const as readonly [number, number] }
  for (let f = 0; f < hz.length; f++) {
    const base = 2 * ports * ports * f
    let sum = 0
    for (let i = 1; i < ports; i++) {
      for (let j = 0; j < i; j++) {
        const at = base + 2 * (i * ports + j)
        const bt = base + 2 * (j * ports + i)
        const differs = Math.hypot((s[at] as number) - (s[bt] as number), (s[at + 1] as number) - (s[bt + 1] as number))
        sum += 2 * differs
        if (differs > largest.value) largest = { value: differs, hz: hz[f] as number, ports: [i + 1, j + 1] }
      }
    }
    const mean = sum / pairs
    if (mean > LIMIT) excess += mean - LIMIT
  }
  return { ...graded(percentLeft(hz.length, excess), SIZE_THRESHOLDS), largest }
}
