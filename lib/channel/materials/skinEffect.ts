import { MU0 } from './constants'

/**
 * Depth at which the current density in a thick smooth metal has fallen to 1/e: δ = √(1/(π f µ0 σ)) (Pozar, Microwave
 * Engineering, chapter 1).
 * @param conductivity S/m
 * @param hz Hz, above 0
 * @returns m
 */
export function skinDepth(conductivity: number, hz: number): number {
  return Math.sqrt(1 / (Math.PI * hz * MU0 * conductivity))
}

/**
 * Resistance of a square of thick smooth metal: Rs = √(π f µ0/σ) = 1/(σδ).
 * @param conductivity S/m
 * @param hz Hz
 * @returns Ω per square
 */
export function surfaceResistance(conductivity: number, hz: number): number {
  return Math.sqrt((Math.PI * hz * MU0) / conductivity)
}
