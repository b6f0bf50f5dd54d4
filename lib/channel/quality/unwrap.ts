/** Steps this near to half a turn (rad) no longer say which way the phase went. */
const UNSURE = 0.75 * Math.PI

/**
 * Takes whole turns out of a phase, in place, so that no step is longer than half a turn.
 * @param phase rad
 * @returns false where a step comes so near to half a turn that its direction is not sure
 */
export function unwrap(phase: Float64Array): boolean {
  let sure = true
  for (let i = 1; i < phase.length; i++) {
    const before = phase[i - 1] as number
    const step = (phase[i] as number) - before
    const nearest = step - 2 * Math.PI * Math.round(step / (2 * Math.PI))
    if (Math.abs(nearest) > UNSURE) sure = false
    phase[i] = before + nearest
  }
  return sure
}
