import type { Basis } from '../../lib/budget/schema'

/** Thickness and wholeness are proof; 'hollow' is drawn as two rails. Lengths in px. */
export type StrokeShape = {
  readonly width: number
  readonly hollow: boolean
  readonly dash: readonly [number, number] | null
  readonly round: boolean
}

const SHAPES: Readonly<Record<Basis | 'unsaid', StrokeShape>> = {
  measured: { width: 6, hollow: false, dash: null, round: false },
  datasheet: { width: 6, hollow: true, dash: null, round: false },
  simulated: { width: 2.5, hollow: false, dash: null, round: false },
  estimate: { width: 5, hollow: false, dash: [7, 3.5], round: false },
  target: { width: 4, hollow: false, dash: [0.01, 7], round: true },
  unsaid: { width: 1.25, hollow: false, dash: [2, 3], round: false },
}

/** @param length of the whole stroke in px: below about 10 px dashes shorten. */
export function strokeShape(basis: Basis | null | 'unsaid', length: number): StrokeShape {
  const shape = SHAPES[basis ?? 'unsaid']
  if (length >= 24 || !shape.dash) return shape
  const shrink = Math.max(length / 24, 0.35)
  const dash: [number, number] = [Math.max(shape.dash[0] * shrink, 0.01), shape.dash[1] * shrink]
  return { ...shape, dash, width: shape.round ? Math.min(shape.width, Math.max(dash[1] - 0.8, 1.5)) : shape.width }
}
