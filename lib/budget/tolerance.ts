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

/**
 * @param nominal dB that a tolerance in % is of
 * @param extra dB to each side that moving in frequency added; both laws are possible, so it adds linearly
 * @returns the spread, or the field whose text cannot be read
 */
export function spreadOf(
  tolerance: Tolerance | null,
  nominal: number,
  extra: number,
): Spread | 'toleranceMinus' | 'tolerancePlus' {
  if (tolerance === null) {
    return { lowExtreme: extra, highExtreme: extra, lowThreeSigma: extra, highThreeSigma: extra }
  }
  const minus = decibels(tolerance.minus ?? tolerance.plus, nominal)
  const plus = decibels(tolerance.plus ?? tolerance.minus, nominal)
  if (minus === null) return 'toleranceMinus'
  if (plus === null) return 'tolerancePlus'
  return {
    lowExtreme: extremeOf(minus, tolerance.meaning) + extra,
    highExtreme: extremeOf(plus, tolerance.meaning) + extra,
    lowThreeSigma: 3 * sigmaOf(minus, tolerance.meaning) + extra,
    highThreeSigma: 3 * sigmaOf(plus, tolerance.meaning) + extra,
  }
}

function decibels(text: string | null, nominal: number): number | null {
  if (text === null) return 0
  const result = TOLERANCE.read(text)
  if (!isQuantity(result)) return null
  return result.dimension === 'ratio' ? result.value * nominal : result.value
}
