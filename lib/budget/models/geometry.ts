import { GEOMETRY_BOUNDS, type GeometryBound } from './geometryBounds'
import { readTrace } from './geometryFields'
import { tracePiece } from './geometryPiece'
import type { Model, ModelInput } from './model'
import type { Values } from './piece'

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
  const outside = GEOMETRY_BOUNDS[trace.structure].filter((bound) => !isInside(bound, bound.of(values, trace.anchor)))
  for (const bound of outside) say(input, bound, values, trace.anchor)
  return outside.length > 0 ? null : { values, build: (changed) => tracePiece(trace, changed) }
}

/** Rounding of typed numbers, so that a value at the bound is inside. */
const EDGE = 1e-9

function isInside({ from, to }: GeometryBound, ratio: number): boolean {
  return ratio >= (from ?? 0) * (1 - EDGE) && ratio <= (to ?? Number.MAX_VALUE) * (1 + EDGE)
}

function say(
  { fields, line }: ModelInput,
  { name, of, from, to, field }: GeometryBound,
  values: Values,
  anchor: number,
) {
  const range = from === null ? `up to ${to}` : to === null ? `from ${from}` : `from ${from} to ${to}`
  fields.say(
    'outside-validity',
    field,
    `${fields.name}: the ${name} is ${Number(of(values, anchor).toPrecision(3))}; the formulas of a ${line.structure} hold ${range}.`,
    'Check the dimensions and their units, or state the loss with where it comes from.',
  )
}
