import { ETA0 } from '../materials/constants'
import type { Dimensions } from './crossSection'

/** Of the smallest dimension: small enough for a derivative to 1e-8, large enough for its digits. */
const STEP = 1e-4

/**
 * Wheeler's incremental inductance rule (Proc. IRE 30(9), 1942): R = (Rs/µ0)·∂L/∂n, where every metal surface recedes by n
 * from the field. With L = Z/c of the line in air, R/Rs = (1/η0)·dZ/dn; the derivative is a central difference. Against the
 * charge on the surfaces by boundary elements the closed forms used here are within 1 % for single lines and 6 % for pairs.
 * @param airImpedance Ω of the dimensions given, in air
 * @param dimensions m; those that the line does not have are 0
 * @returns 1/m
 */
export function crowding(airImpedance: (dimensions: Dimensions) => number, dimensions: Dimensions): number {
  const step = STEP * Math.min(...Object.values(dimensions).filter((size) => size > 0))
  const rise = airImpedance(receded(dimensions, step)) - airImpedance(receded(dimensions, -step))
  return rise / (2 * step * ETA0)
}

function receded({ width, gap, thickness, below, above }: Dimensions, by: number): Dimensions {
  return {
    width: width - 2 * by,
    gap: gap + 2 * by,
    thickness: thickness - 2 * by,
    below: below + 2 * by,
    above: above + 2 * by,
  }
}
