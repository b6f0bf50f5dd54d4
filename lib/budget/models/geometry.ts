import { GEOMETRY_BOUNDS } from './geometryBounds'
import { readTrace } from './geometryFields'
import { tracePiece } from './geometryPiece'
import type { Model } from './model'
import { holds } from './validity'

/**
 * A trace computed from its cross-section. Heights, copper, Dk, Df and the foil's Rz come from the stack-up of its assembly
 * where the line names a layer of it and does not say them itself. The method of Dk and Df and the resin content are recorded
 * and shown; no number is made of them, as there is no law that would hold for more than one laminate. Holds up to where
 * the formulas and the model of the laminate do; a ratio outside them gives no number.
 */
export const geometry: Model = (input) => {
  const read = readTrace(input)
  if (read === null) return null
  const { trace, values } = read
  const bounds = GEOMETRY_BOUNDS[trace.structure]
  if (!holds(input, bounds, { ...values, anchor: trace.anchor })) return null
  return { values, build: (changed) => tracePiece(trace, changed) }
}
