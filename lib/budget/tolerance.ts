import { extremeOf, type Meaning, sigmaOf } from '../channel/statistics'
import { isQuantity } from '../channel/units'
import { TOLERANCE } from './quantities'
import type { Line, LossClass } from './schema'

/** How far a line's loss may lie away, in dB to each side. */
export type Spread = {
  /** A single part at its worst. */
  readonly lowExtreme: number
  readonly highExtreme: number
  /** Three standard deviations. */
  readonly lowThreeSigma: number
  readonly highThreeSigma: number
}

export const NO_SPREAD: Spread = { lowExtreme: 0, highExtreme: 0, lowThreeSigma: 0, highThreeSigma: 0 }

/** The tolerance that applies to a line: its own where it states either side, else its loss class's. */
export type Tolerance = {
  readonly minus: string | null
  readonly plus: string | null
  readonly meaning: Meaning
  readonly from: 'lines' | 'lossClasses'
}

export function toleranceOf(line: Line, lossClass: LossClass | null): Tolerance | null {
  if (line.toleranceMinus !== null || line.tolerancePlus !== null) {
    const meaning = line.toleranceMeaning ?? 'limit'
    return {
      minus: line.toleranceMinus,
      plus: line.tolerancePlus,
      meaning: meaning === 'limit' && line.toleranceAnywhere ? 'anywhere' : meaning,
      from: 'lines',
    }
  }
  if (lossClass === null || (lossClass.toleranceMinus === null && lossClass.tolerancePlus === null)) return null
  const meaning = lossClass.toleranceMeaning ?? 'limit'
  return {
    minus: lossClass.toleranceMinus,
    plus: lossClass.tolerancePlus,
    meaning: meaning === 'limit' && line.toleranceAnywhere ? 'anywhere' : meaning,
    from: 'lossClasses',
  }
}

/** A tolerance in decibels, and what its ± means. */
export type ToleranceDb = { readonly minusDb: number; readonly plusDb: number; readonly meaning: Meaning }

/**
 * @param nominal dB that a tolerance in % is of; below zero of a file that amplifies, whose tolerance is no less one
 * @param uncertainty share of the loss that the model may be off, read as a limit; counts where nobody states a tolerance
 * @returns the tolerance in dB, or the field whose text cannot be read
 */
export function toleranceDb(
  tolerance: Tolerance | null,
  nominal: number,
  uncertainty: number,
): ToleranceDb | 'toleranceMinus' | 'tolerancePlus' {
  const size = Math.abs(nominal)
  if (tolerance === null) return { minusDb: uncertainty * size, plusDb: uncertainty * size, meaning: 'limit' }
  const minusDb = decibels(tolerance.minus ?? tolerance.plus, size)
  const plusDb = decibels(tolerance.plus ?? tolerance.minus, size)
  if (minusDb === null) return 'toleranceMinus'
  if (plusDb === null) return 'tolerancePlus'
  return { minusDb, plusDb, meaning: tolerance.meaning }
}

/** @param extra dB to each side that moving in frequency added; both laws are possible, so it adds linearly */
export function spreadOf({ minusDb, plusDb, meaning }: ToleranceDb, extra: number): Spread {
  return {
    lowExtreme: extremeOf(minusDb, meaning) + extra,
    highExtreme: extremeOf(plusDb, meaning) + extra,
    lowThreeSigma: 3 * sigmaOf(minusDb, meaning) + extra,
    highThreeSigma: 3 * sigmaOf(plusDb, meaning) + extra,
  }
}

/** Two spreads of one line that have nothing to do with each other: extremes add, sigmas by the root of the sum of squares. */
export function both(a: Spread, b: Spread): Spread {
  return {
    lowExtreme: a.lowExtreme + b.lowExtreme,
    highExtreme: a.highExtreme + b.highExtreme,
    lowThreeSigma: Math.hypot(a.lowThreeSigma, b.lowThreeSigma),
    highThreeSigma: Math.hypot(a.highThreeSigma, b.highThreeSigma),
  }
}

function decibels(text: string | null, nominal: number): number | null {
  if (text === null) return 0
  const result = TOLERANCE.read(text)
  if (!isQuantity(result)) return null
  return result.dimension === 'ratio' ? result.value * nominal : result.value
}
