import { surfaceOf, type Varied } from '../builds/varied'
import type { Computed } from '../models/piece'
import { slopeAt } from './slope'

/** A line with what may vary in it. */
export type SensitiveLine = {
  readonly id: string
  /** −1: an overlap, which subtracts. */
  readonly sign: 1 | -1
  /** Tolerance of its loss to each side, in dB; null: none. */
  readonly tolerance: { readonly minusDb: number; readonly plusDb: number } | null
  /** Its model and what is said to vary in it; null: it is not computed. */
  readonly computed: { readonly model: Computed; readonly varied: readonly Varied[] } | null
}

/** What one input of one line does to the loss of the whole. */
export type Sensitivity = {
  readonly line: string
  /** The line's field. */
  readonly input: string
  /** dB of the whole per SI unit of the input; of a tolerance in dB, per dB. */
  readonly perUnit: number
  /** dB of the whole for the input's whole tolerance, upwards, to first order. */
  readonly toleranceDb: number
}

/**
 * Decibels per tolerance of every input, the largest first; equal ones in the order of the lines. Parameters whose model gives
 * no number beside nominal are left out.
 * @param reference Ω, differential
 */
export function sensitivities(lines: readonly SensitiveLine[], hz: number, reference: number): Sensitivity[] {
  const all = lines.flatMap((line) => [...ofTolerance(line), ...ofParameters(line, hz, reference)])
  return all
    .filter(({ toleranceDb }) => Number.isFinite(toleranceDb))
    .sort((a, b) => Math.abs(b.toleranceDb) - Math.abs(a.toleranceDb))
}

/** The larger side of the tolerance of the loss itself. */
function ofTolerance({ id, sign, tolerance }: SensitiveLine): Sensitivity[] {
  if (tolerance === null) return []
  const { minusDb, plusDb } = tolerance
  const [input, db] = plusDb >= minusDb ? ['tolerancePlus', plusDb] : ['toleranceMinus', minusDb]
  return db > 0 ? [{ line: id, input, perUnit: sign, toleranceDb: sign * db }] : []
}

function ofParameters({ id, sign, computed }: SensitiveLine, hz: number, reference: number): Sensitivity[] {
  if (computed === null) return []
  const { model, varied } = computed
  const surface = surfaceOf(model, varied, hz, reference)
  return varied.map(({ field, tolerance }, k) => {
    // Plus 0: of an overlap that does not hang on it the product is −0, which JSON does not know.
    const toleranceDb = sign * slopeAt(surface, varied, k) + 0
    return { line: id, input: field, perUnit: toleranceDb / tolerance, toleranceDb }
  })
}
