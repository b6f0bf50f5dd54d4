import { ETA0 } from '../../materials/constants'
import { thinCoupledStripline, thinStripline } from './cohn'
import { centredStripline } from './thickStripline'

/**
 * Impedance in air of one conductor of a centred edge-coupled pair of finite thickness. Cohn (IRE Trans. MTT 3(5), 1955; from
 * memory) has the thick single line, then adds what coupling does to the thin pair, weighted by how the edge's fringing
 * capacitance grows with thickness. For a gap narrow against the thickness he has a second form of the odd mode, with the
 * facing walls as plates. Both leave some capacitance out, so the larger one is taken, instead of his change at s/t = 5,
 * which jumps. Far apart, both modes become the single line. Against boundary elements for w/b 0.08 to 1.2, s/b 0.05 to 1.8,
 * t/b 0.01 to 0.2: −1.5 to +2.6 % (odd).
 * @param width m
 * @param gap m
 * @param spacing m, plane to plane
 * @param thickness m, may be 0
 * @returns Ω
 */
export function centredCoupledStripline(
  width: number,
  gap: number,
  spacing: number,
  thickness: number,
  mode: 'odd' | 'even' = 'odd',
): number {
  const alone = 1 / centredStripline(width, spacing, thickness)
  const thinAlone = 1 / thinStripline(width, spacing)
  const coupling = 1 / thinCoupledStripline(width, gap, spacing, mode) - thinAlone
  const grown = edgeFringing(thickness / spacing) / edgeFringing(0)
  const distant = grown * coupling
  if (mode === 'even' || thickness === 0) return 1 / (alone + distant)
  const more = edgeFringing(thickness / spacing) - edgeFringing(0)
  const near = coupling + (2 / ETA0) * (thickness / gap - more)
  return 1 / (alone + Math.max(distant, near))
}

/** Fringing capacitance of one edge to one plane over ε0, by thickness over plane to plane: (2/π) ln 2 where thin. */
function edgeFringing(t: number): number {
  if (t === 0) return (2 / Math.PI) * Math.LN2
  const x = 1 / (1 - t)
  return (2 * x * Math.log(x + 1) - (x - 1) * Math.log(x * x - 1)) / Math.PI
}
