import { ETA0, MU0, SPEED_OF_LIGHT } from '../../materials/constants'

/**
 * Effective permittivity of a microstrip over frequency: Kirschning and Jansen, Electronics Letters 18(6), 1982. 0.6 % for u
 * from 0.1 to 100, εr up to 20 and h/λ0 up to 0.13 (range from memory).
 * @param u width/height
 * @param height m
 * @param nominal relative permittivity that the factors are taken at: they hardly feel how it moves over frequency
 */
export function kirschningJansen(u: number, height: number, nominal: number) {
  const base = 0.27488 - 0.065683 * Math.exp(-8.7513 * u) + 0.6315 * u
  const scale = 0.33622 * (1 - Math.exp(-0.03442 * nominal))
  const high = 0.0363 * Math.exp(-4.6 * u) * (1 + 2.751 * (1 - Math.exp(-((nominal / 15.916) ** 8))))
  return (effective: number, dielectric: number, hz: number): number => {
    const fn = hz * height * 1e-6
    const width = base + (0.525 * u) / (1 + 0.0157 * fn) ** 20
    const slope = 0.1844 + high * (1 - Math.exp(-((fn / 38.7) ** 4.97)))
    const p = width * scale * (slope * fn) ** 1.5763
    return dielectric - (dielectric - effective) / (1 + p)
  }
}

/** Hz · m up to which it holds: h/λ0 = 0.13. */
export const KIRSCHNING_JANSEN_LIMIT = 0.13 * SPEED_OF_LIGHT

/**
 * The older form of the same by Hammerstad and Jensen (IEEE MTT-S 1980), less accurate above a few GHz · mm: kept as the
 * bridge to published results that were computed with it.
 * @param impedance Ω, static
 */
export function hammerstadJensenDispersion(impedance: number, height: number) {
  return (effective: number, dielectric: number, hz: number): number => {
    const g = ((Math.PI ** 2 / 12) * (dielectric - 1) * Math.sqrt((2 * Math.PI * impedance) / ETA0)) / effective
    const fp = (2 * MU0 * height * hz) / impedance
    return dielectric - (dielectric - effective) / (1 + g * fp * fp)
  }
}

/** Impedance over the static one by the effective permittivities, static and dispersed (Hammerstad and Jensen 1980). */
export function impedanceDispersion(effective: number, dispersed: number): number {
  if (effective <= 1) return 1
  return (Math.sqrt(effective / dispersed) * (dispersed - 1)) / (effective - 1)
}
