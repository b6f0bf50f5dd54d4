import type { LaminateEntry } from './entry'

/** A class that comes with the program. */
export type LaminateClass = LaminateEntry & { readonly id: string }

const FROM_THE_FABRICATOR =
  'A class, no product: round values from the middle of what is usual, from memory. Stack-up and laminate values come from the fabricator.'

type Range = readonly [from: string, usual: string, to: string]

function laminateClass(id: string, name: string, [dkFrom, dk, dkTo]: Range, [dfFrom, df, dfTo]: Range): LaminateClass {
  return {
    ...{ id, name, dk, df, dkFrom, dkTo, dfFrom, dfTo },
    anchor: '10 GHz',
    method: null,
    resin: null,
    basis: 'estimate',
    tolerance: '25 %',
    confidence: 'from-memory',
    caution: FROM_THE_FABRICATOR,
  }
}

/** Generic classes of laminate, lossiest first. Values and class names in common use; all from memory. */
export const LAMINATE_CLASSES: readonly LaminateClass[] = [
  laminateClass('standard-loss', 'Standard-loss epoxy glass (FR-4)', ['4', '4.2', '4.6'], ['0.015', '0.02', '0.025']),
  laminateClass('mid-loss', 'Mid-loss laminate', ['3.7', '4', '4.2'], ['0.008', '0.012', '0.015']),
  laminateClass('low-loss', 'Low-loss laminate', ['3.5', '3.7', '3.9'], ['0.005', '0.0065', '0.008']),
  laminateClass('very-low-loss', 'Very-low-loss laminate', ['3.2', '3.5', '3.7'], ['0.0025', '0.004', '0.005']),
  laminateClass('ultra-low-loss', 'Ultra-low-loss laminate', ['3', '3.2', '3.4'], ['0.001', '0.0018', '0.0025']),
]
