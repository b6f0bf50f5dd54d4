import type { Propagation } from '../lines/propagation'
import { ETA0, SPEED_OF_LIGHT } from '../materials/constants'

/** η0/2π in Ω: 59.958, the impedance of a coaxial line in air whose diameters differ by the factor e. */
const COAX = ETA0 / (2 * Math.PI)

/** Diameters and centre distance of the two barrels of a pair, m. */
export type BarrelPair = { readonly barrel: number; readonly antipad: number; readonly pitch: number }

/**
 * A single barrel in its antipads as a coaxial line: (η0/2π)/√εr · ln(D/d). D. Pozar, Microwave Engineering, coaxial line.
 * @param dk effective permittivity of the barrel; planes and pads beside it make it larger than the laminate's
 * @returns Ω
 */
export function barrelImpedance(barrel: number, antipad: number, dk: number): number {
  return (COAX / Math.sqrt(dk)) * Math.log(antipad / barrel)
}

/**
 * Differential impedance of two barrels, twice the odd mode's: (η0/π)/√εr · ln(2ρ/d), where ρ is the conformal radius about a
 * barrel of the room that it has, its round antipad cut off by the wall of symmetry half a pitch away.
 * - Antipads that do not meet (pitch ≥ antipad): ρ = D/2, two coaxial lines.
 * - Barrels close against their antipads: ρ = pitch, twin rods without planes, (η0/π)/√εr · ln(2·pitch/d); the twin rods' exact
 *   acosh(pitch/d) (from memory) is 0.8 % less at 4 diameters, 5 % at 2.
 * Between both it is the conformal radius of a circle cut by a chord (a Möbius map onto a wedge, own derivation):
 * ρ/(D/2) = (1 − θ/π) · sin(π(π − 2θ)/(π − θ)) / sin θ, cos θ = pitch/D. Exact for thin barrels.
 * @returns Ω, differential
 */
export function barrelPairImpedance({ barrel, antipad, pitch }: BarrelPair, dk: number): number {
  return ((2 * COAX) / Math.sqrt(dk)) * Math.log((2 * room({ antipad, pitch })) / barrel)
}

function room({ antipad, pitch }: Pick<BarrelPair, 'antipad' | 'pitch'>): number {
  if (pitch >= antipad) return antipad / 2
  const theta = Math.acos(pitch / antipad)
  const wedge = 1 - theta / Math.PI
  return ((antipad / 2) * wedge * Math.sin((Math.PI - 2 * theta) / wedge)) / Math.sin(theta)
}

/**
 * Hz at which a second wave (TE11 of the coaxial line) begins to run along the barrel, c/(√εr · π(D + d)/2): beyond it the barrel is no
 * line of one wave. D. Pozar, Microwave Engineering, higher modes of the coaxial line (approximate, 5 %).
 */
export function secondWave(barrel: number, antipad: number, dk: number): number {
  return (2 * SPEED_OF_LIGHT) / (Math.sqrt(dk) * Math.PI * (antipad + barrel))
}

/**
 * A line of constant permittivity without conductor loss: γ = j(ω√εr/c)·√(1 − j·tan δ), Z = Z0/√(1 − j·tan δ). Exact for
 * such a medium; a constant loss tangent is not causal, which over the length of a barrel is nothing.
 * @param impedance Ω, without loss
 */
export function barrelLine(impedance: number, dk: number, df: number, hz: Float64Array): Propagation {
  // √(1 − j·df) = p − jq
  const p = Math.sqrt((Math.hypot(1, df) + 1) / 2)
  const q = df / (2 * p)
  const alpha = new Float64Array(hz.length)
  const beta = new Float64Array(hz.length)
  for (let i = 0; i < hz.length; i++) {
    const constant = (2 * Math.PI * (hz[i] as number) * Math.sqrt(dk)) / SPEED_OF_LIGHT
    alpha[i] = constant * q
    beta[i] = constant * p
  }
  const size = p * p + q * q
  return {
    hz,
    alpha,
    conductor: new Float64Array(hz.length),
    dielectric: alpha,
    beta,
    zRe: new Float64Array(hz.length).fill((impedance * p) / size),
    zIm: new Float64Array(hz.length).fill((impedance * q) / size),
  }
}
