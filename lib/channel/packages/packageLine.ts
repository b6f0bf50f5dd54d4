import { lineTwoPort } from '../lines/lineTwoPort'
import type { Propagation } from '../lines/propagation'
import { cascade } from '../networks/cascade'
import { shuntCapacitance } from '../pads'

/** Parameters of IEEE 802.3 Annex 93A in SI: γ0 in 1/m, a1 in √s/m, a2 and τ in s/m. */
export type PackageParameters = {
  readonly gamma0: number
  readonly a1: number
  readonly a2: number
  readonly tau: number
}

const GHZ = 1e9

/**
 * γ(f) = γ0 + a1(1 + j)√f + (a2(1 − j(2/π)·ln f) + j2πτ)·f, with f in GHz and the parameters in the standard's units; γ0 at 0 Hz. The
 * form of IEEE 802.3 Annex 93A, from memory: hold it against the standard. γ0 is of neither conductor nor dielectric.
 * @param impedance Ω, differential: the standard's Zc
 */
export function packagePropagation(parameters: PackageParameters, impedance: number, hz: Float64Array): Propagation {
  const { gamma0, a1, a2, tau } = parameters
  const alpha = new Float64Array(hz.length)
  const conductor = new Float64Array(hz.length)
  const dielectric = new Float64Array(hz.length)
  const beta = new Float64Array(hz.length)
  for (let i = 0; i < hz.length; i++) {
    const f = hz[i] as number
    const root = a1 * Math.sqrt(f)
    const linear = a2 * f
    conductor[i] = root
    dielectric[i] = linear
    alpha[i] = gamma0 + root + linear
    beta[i] = f === 0 ? 0 : root - (2 / Math.PI) * Math.log(f / GHZ) * linear + 2 * Math.PI * tau * f
  }
  const zRe = new Float64Array(hz.length).fill(impedance)
  return { hz, alpha, conductor, dielectric, beta, zRe, zIm: new Float64Array(hz.length) }
}

/** m and Ω, differential. */
export type PackageSection = { readonly length: number; readonly impedance: number }

export type PackageLine = {
  readonly parameters: PackageParameters
  /** From the die to the ball. */
  readonly sections: readonly PackageSection[]
  /** F, each conductor to ground, at the ball. */
  readonly ballCapacitance: number
  /** The ball comes first, as at the receiver. */
  readonly mirrored: boolean
}

/**
 * The package's sections and the capacitance at its ball. The die's own capacitance lies outside.
 * @param reference Ω, differential: the standard's 2·R0 is 100 Ω
 * @returns S11, S12, S21, S22, real and imaginary part side by side, 8 numbers a frequency
 */
export function packageTwoPort(line: PackageLine, hz: Float64Array, reference: number): Float64Array {
  const { parameters, sections, ballCapacitance, mirrored } = line
  const chain = sections.map(({ length, impedance }) =>
    lineTwoPort(packagePropagation(parameters, impedance, hz), length, reference),
  )
  chain.push(shuntCapacitance(ballCapacitance, hz, reference))
  return cascade(mirrored ? chain.reverse() : chain, hz.length)
}

const DB_PER_NEPER = 20 / Math.LN10

/** Re(γ) times the length of all sections, dB. */
export function packageAttenuation({ parameters, sections }: PackageLine, hz: Float64Array): Float64Array {
  const length = sections.reduce((sum, section) => sum + section.length, 0)
  const { gamma0, a1, a2 } = parameters
  return hz.map((f) => DB_PER_NEPER * length * (gamma0 + a1 * Math.sqrt(f) + a2 * f))
}
