import { type Dimension, isQuantity, parseQuantity } from '../units'

/** A loss or a loss per length at a frequency, in Hz and the SI unit of the dimension. */
export type Point = { readonly hz: number; readonly value: number }
export type Points = { readonly points: readonly Point[] } | { readonly reason: string }

const FREQUENCY_FIRST = /^(.*?hz)\s*[:=]?\s*(.*)$/i

/**
 * Reads points as typed: '1 GHz 0.4 dB; 5 GHz 1.1 dB', one from the next by a semicolon or a new line, in any order.
 * @param dimension what stands beside the frequency: 'loss' or 'lossPerLength'
 * @returns the points by rising frequency, or a sentence that says which point is wrong and what to do
 */
export function parsePoints(text: string, dimension: Extract<Dimension, 'loss' | 'lossPerLength'>): Points {
  const pieces = text.split(/[;\n\r]+/).filter((piece) => piece.trim() !== '')
  const points: Point[] = []
  for (const [index, piece] of pieces.entries()) {
    const point = parsePoint(piece.trim(), dimension)
    if (typeof point === 'string') return { reason: `Point ${index + 1} ('${piece.trim()}'): ${point}` }
    const twin = points.find((other) => other.hz === point.hz)
    if (twin)
      return { reason: `Point ${index + 1} ('${piece.trim()}'): this frequency is there twice; keep one of the two.` }
    points.push(point)
  }
  if (points.length === 0) return { reason: `Type at least one point, such as '${example(dimension)}'.` }
  return { points: points.sort((a, b) => a.hz - b.hz) }
}

function parsePoint(piece: string, dimension: 'loss' | 'lossPerLength'): Point | string {
  const halves = FREQUENCY_FIRST.exec(piece)
  if (!halves) return `type a frequency with its unit, then a value, such as '${example(dimension)}'.`
  const frequency = parseQuantity(halves[1] ?? '', 'frequency')
  if (!isQuantity(frequency)) return frequency.reason
  if (frequency.value <= 0) return 'the frequency must be above zero.'
  const value = parseQuantity(halves[2] ?? '', dimension)
  if (!isQuantity(value)) return value.reason
  if (value.value < 0) return 'a loss is typed as a positive number of decibels; leave the minus sign out.'
  return { hz: frequency.value, value: value.value }
}

function example(dimension: 'loss' | 'lossPerLength'): string {
  return dimension === 'loss' ? '1 GHz 0.4 dB; 5 GHz 1.1 dB' : '1 GHz 0.2 dB/in; 5 GHz 0.6 dB/in'
}
