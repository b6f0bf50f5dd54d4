/** What a uniform line does over frequency, per metre; of a coupled pair its odd mode, with the impedance of the pair. */
export type Propagation = {
  readonly hz: Float64Array
  /** Np/m: the whole attenuation, and the parts of it that the conductors and the dielectric cause. */
  readonly alpha: Float64Array
  readonly conductor: Float64Array
  readonly dielectric: Float64Array
  /** rad/m. */
  readonly beta: Float64Array
  /** Ω, characteristic impedance, differential where the line is a pair. */
  readonly zRe: Float64Array
  readonly zIm: Float64Array
}
