import type { Confidence, Line } from '../../schema'

/** A generic class of copper foil; Rz is the ten-point peak-to-valley height, in µm as typed. */
export type FoilClass = {
  readonly id: string
  readonly name: string
  readonly rzFrom: string
  readonly rz: string
  readonly rzTo: string
  readonly confidence: Confidence
  readonly caution: string
}

const ASK = 'The two sides of a foil differ. Ask the fabricator for Rz of each, ten-point peak to valley, not Ra or Rq.'

function foil(id: string, name: string, rzFrom: number, rz: number, rzTo: number, confidence: Confidence): FoilClass {
  return { id, name, rzFrom: `${rzFrom} µm`, rz: `${rz} µm`, rzTo: `${rzTo} µm`, confidence, caution: ASK }
}

/** Generic classes of foil, roughest first. Ranges in common use; what is from memory says so. */
export const FOIL_CLASSES: readonly FoilClass[] = [
  foil('standard', 'Standard electrodeposited', 6, 8, 10, 'read'),
  foil('low-profile', 'Low profile', 3, 4, 5, 'read'),
  foil('reverse-treated', 'Reverse treated', 1.5, 3, 5, 'from-memory'),
  foil('very-low-profile', 'Very low profile', 1.5, 2.2, 3, 'read'),
  foil('hyper-very-low-profile', 'Hyper very low profile', 0.5, 1.2, 2, 'read'),
  foil('rolled', 'Rolled', 0.3, 0.6, 1, 'read'),
]

/** The fields of a line computed from its cross-section that a foil fills: the usual Rz on both sides. */
export function lineFromFoil({ rz }: FoilClass): Pick<Line, 'roughnessTop' | 'roughnessBottom'> {
  return { roughnessTop: rz, roughnessBottom: rz }
}
