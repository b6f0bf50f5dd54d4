/** Where the relaxations of a laminate begin and end, Hz; the usual choice, as the values between hardly depend on it. */
const FIRST = 1e4
const LAST = 1e12

/**
 * Hz between which the model is used: two decades above its first and one below its last relaxation, where the loss tangent
 * is almost constant as that of laminates is. Near either end it falls off, which is the model's doing and not the laminate's.
 */
export const DEBYE_FROM = 100 * FIRST
export const DEBYE_TO = LAST / 10

/** A laminate whose permittivity falls with frequency just as fast as its loss tangent demands. */
export type WidebandDebye = {
  /** Relative permittivity far above the last relaxation. */
  readonly infinite: number
  /** What the permittivity falls by per neper of frequency between the relaxations. */
  readonly slope: number
  /** Hz, first and last relaxation. */
  readonly first: number
  readonly last: number
}

/**
 * The causal laminate through one measured point: ε(f) = ε∞ + slope · ln[(f2 + jf)/(f1 + jf)] (Djordjević, Biljić,
 * Likar-Smiljanić, Sarkar, IEEE Trans. EMC 43(4), 2001, 662–667; Svensson and Dermer, IEEE Trans. Adv. Packag. 24(2), 2001).
 * @param dk relative permittivity at the anchor
 * @param df loss tangent at the anchor
 * @param anchor Hz, between the relaxations
 */
export function widebandDebye(dk: number, df: number, anchor: number, first = FIRST, last = LAST): WidebandDebye {
  const fall = Math.atan(anchor / first) - Math.atan(anchor / last)
  const slope = (df * dk) / fall
  const infinite = dk - slope * logarithm(first, last, anchor)
  return { infinite, slope, first, last }
}

function logarithm(first: number, last: number, hz: number): number {
  return 0.5 * Math.log((last * last + hz * hz) / (first * first + hz * hz))
}

/** Relative permittivity, real part, at Hz. */
export function dkAt({ infinite, slope, first, last }: WidebandDebye, hz: number): number {
  return infinite + slope * logarithm(first, last, hz)
}

/** Loss tangent at Hz, where the permittivity is already known. */
export function dfAt({ slope, first, last }: WidebandDebye, hz: number, dk: number): number {
  return (slope * (Math.atan(hz / first) - Math.atan(hz / last))) / dk
}
