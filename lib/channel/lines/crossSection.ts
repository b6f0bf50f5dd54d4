/**
 * What of a cross-section its losses are computed from: one conductor with its return, of a coupled pair in the odd mode.
 * None of it depends on the frequency but the dispersion.
 */
export type CrossSection = {
  /** Ω, with air in place of the dielectric. */
  readonly airImpedance: number
  /** Share of the dielectric in the permittivity that the wave feels, (εe − 1)/(εr − 1) without dispersion: 1 in a stripline. */
  readonly fill: number
  /** 1/m: the series resistance of thick metal is the surface resistance times this, the return path included. */
  readonly crowding: number
  /** m² of one conductor: its resistance at 0 Hz is 1/(σ·area), that of the planes is left out. */
  readonly area: number
  /** 1 for a line, 2 for a pair, whose differential impedance is twice that of its odd mode. */
  readonly conductors: 1 | 2
  readonly dispersion: Dispersion | null
}

/** How the effective permittivity and the impedance of an open line move with frequency. */
export type Dispersion = {
  /** Relative effective permittivity from the static one, the dielectric's and Hz. */
  readonly permittivity: (effective: number, dielectric: number, hz: number) => number
  /** Impedance over the static one from the static and the dispersed effective permittivity. */
  readonly impedance: (effective: number, dispersed: number) => number
}

/** m. A trapezoid stands for a rectangle of its mean width. */
export type Dimensions = {
  readonly width: number
  /** Between the two conductors of a pair; of no meaning for a line. */
  readonly gap: number
  readonly thickness: number
  /** Dielectric to the plane below, and to the plane above, which a microstrip does not have. */
  readonly below: number
  readonly above: number
}
