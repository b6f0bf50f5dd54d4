import { ETA0 } from '../../materials/constants'
import { effectivePermittivity, thinMicrostrip } from './hammerstadJensen'

/**
 * An edge-coupled pair of no thickness: Kirschning and Jansen, IEEE Trans. MTT 32(1), 1984 (from memory), for u and g from 0.1 to
 * 10 and εr up to 18. Boundary elements differ by −0.2 to +0.25 % in impedance.
 * @param u width/height
 * @param g gap/height
 * @returns Ω in air, of one conductor
 */
export function thinCoupledMicrostrip(u: number, g: number, mode: 'odd' | 'even'): number {
  const alone = thinMicrostrip(u)
  return alone / (1 - (alone / ETA0) * (mode === 'odd' ? oddCoupling(u, g) : evenCoupling(u, g)))
}

/** Q4 of the paper. */
function evenCoupling(u: number, g: number): number {
  const q1 = 0.8695 * u ** 0.194
  const q3 = 0.1975 + (16.6 + (8.4 / g) ** 6) ** -0.387 + Math.log(g ** 10 / (1 + (g / 3.4) ** 10)) / 241
  const near = Math.exp(-g)
  return (2 * q1) / far(g) / (near * u ** q3 + (2 - near) * u ** -q3)
}

/** Q10 of the paper. */
function oddCoupling(u: number, g: number): number {
  const q5 = 1.794 + 1.14 * Math.log1p(0.638 / (g + 0.517 * g ** 2.43))
  const q6 = 0.2305 + Math.log(g ** 10 / (1 + (g / 5.8) ** 10)) / 281.3 + Math.log1p(0.598 * g ** 1.154) / 5.1
  const q7 = (10 + 190 * g * g) / (1 + 82.3 * g ** 3)
  const q8 = Math.exp(-6.5 - 0.95 * Math.log(g) - (g / 0.15) ** 5)
  const q9 = Math.log(q7) * (q8 + 1 / 16.5)
  return evenCoupling(u, g) - (q5 * Math.exp(Math.log(u) * q6 * u ** -q9)) / far(g)
}

/** Q2 of the paper. */
function far(g: number): number {
  return 1 + 0.7519 * g + 0.189 * g ** 2.31
}

/** Static effective permittivity of the pair (same paper). Its odd mode feels less of the dielectric than a single line. */
export function coupledPermittivity(u: number, g: number, dielectric: number, mode: 'odd' | 'even'): number {
  if (mode === 'even') {
    const v = (u * (20 + g * g)) / (10 + g * g) + g * Math.exp(-g)
    return effectivePermittivity(v, dielectric)
  }
  const alone = effectivePermittivity(u, dielectric)
  const half = (dielectric + 1) / 2
  const a = 0.7287 * (alone - half) * (1 - Math.exp(-0.179 * u))
  const b = (0.747 * dielectric) / (0.15 + dielectric)
  const c = b - (b - 0.207) * Math.exp(-0.414 * u)
  const d = 0.593 + 0.694 * Math.exp(-0.562 * u)
  return (half + a - alone) * Math.exp(-c * g ** d) + alone
}
