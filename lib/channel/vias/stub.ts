import { SPEED_OF_LIGHT } from '../materials/constants'
import { TWO_PORT } from '../networks/network'

/**
 * Where an open stub is a quarter wave long and shorts the signal: c/(4·L·√εr). It does so again at odd multiples.
 * @param length m
 * @param dk effective permittivity; fringing at the open end is in it or in the length, not in both
 * @returns Hz; Infinity of no stub
 */
export function stubResonance(length: number, dk: number): number {
  return SPEED_OF_LIGHT / (4 * length * Math.sqrt(dk))
}

export type Stub = {
  /** m. */
  readonly length: number
  /** Ω, differential: twice the odd mode's. */
  readonly impedance: number
  readonly dk: number
  readonly df: number
}

/**
 * An open stub across the pair, Y = tanh(γL)/Z: S21 = 2Z·cosh γL/(2Z·cosh γL + R·sinh γL) and S11 = −R·sinh γL/(the same). Without loss
 * it is 10 log10(1 + (R·tan θ/(2Z))²) dB. γ and Z of a line of constant permittivity as in barrelLine. Finite at resonance and beyond;
 * what a stub does there is for the caller to judge.
 * @param reference Ω, differential
 * @returns S11, S12, S21, S22, real and imaginary part side by side, 8 numbers a frequency
 */
export function stubTwoPort({ length, impedance, dk, df }: Stub, hz: Float64Array, reference: number): Float64Array {
  const p = Math.sqrt((Math.hypot(1, df) + 1) / 2)
  const q = df / (2 * p)
  const size = p * p + q * q
  const twiceRe = (2 * impedance * p) / size
  const twiceIm = (2 * impedance * q) / size
  const s = new Float64Array(TWO_PORT * hz.length)
  for (let i = 0; i < hz.length; i++) {
    const electrical = (2 * Math.PI * (hz[i] as number) * Math.sqrt(dk) * length) / SPEED_OF_LIGHT
    const a = electrical * q
    const b = electrical * p
    const chRe = Math.cosh(a) * Math.cos(b)
    const chIm = Math.sinh(a) * Math.sin(b)
    const throughRe = twiceRe * chRe - twiceIm * chIm
    const throughIm = twiceRe * chIm + twiceIm * chRe
    const acrossRe = reference * Math.sinh(a) * Math.cos(b)
    const acrossIm = reference * Math.cosh(a) * Math.sin(b)
    const dRe = throughRe + acrossRe
    const dIm = throughIm + acrossIm
    const square = dRe * dRe + dIm * dIm
    const at = TWO_PORT * i
    s[at] = s[at + 6] = -(acrossRe * dRe + acrossIm * dIm) / square
    s[at + 1] = s[at + 7] = -(acrossIm * dRe - acrossRe * dIm) / square
    s[at + 2] = s[at + 4] = (throughRe * dRe + throughIm * dIm) / square
    s[at + 3] = s[at + 5] = (throughIm * dRe - throughRe * dIm) / square
  }
  return s
}
