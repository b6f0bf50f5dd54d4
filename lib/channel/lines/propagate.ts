import { SPEED_OF_LIGHT } from '../materials/constants'
import { dfAt, dkAt, type WidebandDebye } from '../materials/widebandDebye'
import type { CrossSection } from './crossSection'
import { foilImpedance, type Metal } from './foil'
import type { Propagation } from './propagation'

/**
 * What a line of this cross-section does over frequency. Without losses it has Z0(f) and εe(f); from these come its external
 * inductance L = Z0√εe/c, capacitance C = √εe/(c·Z0) and conductance G = ωC·(fill·εr/εe)·tan δ, and with the conductors' R + jX
 * γ = √((R + j(ωL + X))(G + jωC)) and Z = √((R + j(ωL + X))/(G + jωC)), nothing neglected. Since Im γ² = 2αβ, the parts
 * α = R·ωC/2β + (ωL + X)·G/2β add up exactly.
 * @param hz rising, above 0
 */
export function propagate(section: CrossSection, laminate: WidebandDebye, metal: Metal, hz: Float64Array): Propagation {
  const count = hz.length
  const [alpha, beta] = [new Float64Array(count), new Float64Array(count)]
  const [conductor, dielectric] = [new Float64Array(count), new Float64Array(count)]
  const [zRe, zIm] = [new Float64Array(count), new Float64Array(count)]
  // R and X stand where Z will be.
  foilImpedance(section, metal, hz, zRe, zIm)
  const { airImpedance, fill, conductors, dispersion } = section
  for (let i = 0; i < count; i++) {
    const at = hz[i] as number
    const omega = 2 * Math.PI * at
    const dk = dkAt(laminate, at)
    const fixed = 1 + fill * (dk - 1)
    let effective = fixed
    let impedance = airImpedance / Math.sqrt(fixed)
    if (dispersion !== null) {
      effective = dispersion.permittivity(fixed, dk, at)
      impedance *= dispersion.impedance(fixed, effective)
    }
    const slowness = Math.sqrt(effective) / SPEED_OF_LIGHT
    const b = (omega * slowness) / impedance
    const g = b * felt(fill, fixed, effective, dk) * dfAt(laminate, at, dk)
    const r = zRe[i] as number
    const x = omega * slowness * impedance + (zIm[i] as number)
    // γ² = (rg − xb) + j(rb + xg); β is the larger root, so that it keeps its digits.
    const re = r * g - x * b
    const im = r * b + x * g
    const b2 = Math.sqrt((Math.sqrt(re * re + im * im) - re) / 2)
    beta[i] = b2
    conductor[i] = (r * b) / (2 * b2)
    dielectric[i] = (x * g) / (2 * b2)
    alpha[i] = im / (2 * b2)
    // Z = γ/(g + jb)
    const size = (g * g + b * b) / conductors
    zRe[i] = ((alpha[i] as number) * g + b2 * b) / size
    zIm[i] = (b2 * g - (alpha[i] as number) * b) / size
  }
  return { hz, alpha, conductor, dielectric, beta, zRe, zIm }
}

/**
 * What of the dielectric's loss tangent the wave feels: fill·εr/εe = εr(εe − 1)/(εe(εr − 1)) (Pozar, Microwave Engineering,
 * section 3.8), with the dispersed εe, as the field moves into the dielectric.
 */
function felt(fill: number, fixed: number, effective: number, dk: number): number {
  const share = fixed > 1 ? (fill * (effective - 1)) / (fixed - 1) : fill
  return (share * dk) / effective
}
