import { ETA0 } from '../../materials/constants'

/**
 * Impedance in air of a microstrip of no thickness by u = width/height: Hammerstad and Jensen, IEEE MTT-S 1980, p. 407, better
 * than 0.03 % for u up to 1000. Ω.
 */
export function thinMicrostrip(u: number): number {
  const f = 6 + (2 * Math.PI - 6) * Math.exp(-((30.666 / u) ** 0.7528))
  return (ETA0 / (2 * Math.PI)) * Math.log(f / u + Math.sqrt(1 + 4 / (u * u)))
}

/**
 * Static effective permittivity of a microstrip of no thickness (same paper): 0.2 % for εr up to 128 and u from 0.01 to 100.
 */
export function effectivePermittivity(u: number, dielectric: number): number {
  const a = 1 + Math.log((u ** 4 + (u / 52) ** 2) / (u ** 4 + 0.432)) / 49 + Math.log1p((u / 18.1) ** 3) / 18.7
  const b = 0.564 * ((dielectric - 0.9) / (dielectric + 3)) ** 0.053
  return (dielectric + 1) / 2 + ((dielectric - 1) / 2) * (1 + 10 / u) ** (-a * b)
}

/**
 * What the side walls add to u (same paper; u is width/height, and the walls count by thickness/height, not by thickness): the
 * whole in air, less above a dielectric, since the walls stand in air.
 * @param t thickness/height, may be 0
 */
export function widening(u: number, t: number, dielectric: number): number {
  if (t === 0) return 0
  const whole = (t / Math.PI) * Math.log1p((4 * Math.E * Math.tanh(Math.sqrt(6.517 * u)) ** 2) / t)
  return 0.5 * whole * (1 + 1 / Math.cosh(Math.sqrt(Math.max(0, dielectric - 1))))
}
