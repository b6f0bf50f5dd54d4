import { COPPER_STATED_AT } from '../../channel/materials/copper'
import type { Network } from '../../channel/networks/network'

/** Another way to look at a line's loss, shown beside what it counts. */
export type Beside = {
  /**
   * 'mismatch': insertion loss in the reference less the attenuation; 'dissipated': what of a discrete's loss is turned into
   * heat; 'native': insertion loss in the file's own reference; 'point': the loss at the frequency where the fitted one counts.
   */
  readonly what: 'mismatch' | 'dissipated' | 'native' | 'point'
  readonly db: number
}

/** A contributor computed from its physics: read once, asked at any frequency. */
export type Piece = {
  /** Hz, the range that the model or its data hold in. */
  readonly from: number
  readonly to: number
  /** False where the piece is known by its attenuation only and enters the cascade matched, without delay. */
  readonly reflects: boolean
  /**
   * The two-port over rising frequencies.
   * @param reference Ω, differential
   * @returns S11, S12, S21, S22, real and imaginary part side by side, 8 numbers a frequency
   */
  readonly twoPort: (hz: Float64Array, reference: number) => Float64Array
  /** What a uniform line counts: Re(γ)·length in dB, in its own impedance. Null: a discrete counts −20 log10|S21|. */
  readonly attenuation: ((hz: Float64Array) => Float64Array) | null
  /** How far the model itself may be off, as a share of the loss to each side, read as a limit; 0 where it is not said. */
  readonly uncertainty: number
  /** More ways to look at the loss at one frequency, Hz. */
  readonly beside?: (hz: number) => readonly Beside[]
  /** Only of evidence: the differential two-port as it was measured, in its own reference. */
  readonly measured?: Network
}

/** SI values of the line's fields that the number rests on and that may vary from build to build, by field. */
export type Values = Readonly<Record<string, number>>

export type Computed = {
  readonly values: Values
  /** The piece with these values instead of the typed ones; total: values beyond the model's range still give numbers or NaN. */
  readonly build: (values: Values) => Piece
  /** SI limits to both sides of values that the line's own fields give a tolerance for, beside what it says in `varies`. */
  readonly varies?: Values
}

/** Conditions that a model recomputes its physics in. */
export type Surroundings = {
  /** °C of the conductors. */
  readonly temperature: number
  /** The loss tangent is multiplied by the factor, then the moisture's part is added. */
  readonly dfFactor: number
  readonly dfAdded: number
  readonly dkAdded: number
}

export const DRY_REFERENCE: Surroundings = { temperature: COPPER_STATED_AT, dfFactor: 1, dfAdded: 0, dkAdded: 0 }
