/**
 * Cross-sections by boundary elements: strips of constant charge on every surface, graded to the corners, with Green's function of
 * one or two planes (images for a dielectric slab), computed once in numpy, apart from every closed form used here. Against
 * the exact thin stripline (elliptic integrals) the method is 0.01 % high. Sizes in any one unit.
 * ohm: impedance in air, of one conductor, of pairs in the odd mode; effective: static effective permittivity;
 * crowding: dZ/dn over η0, every surface receding by n, in 1 over that unit.
 */
export type Solved = {
  readonly width: number
  readonly gap: number
  readonly thickness: number
  readonly below: number
  readonly above: number
  readonly ohm: number
  readonly crowding: number
}

export const STRIPLINES: readonly Solved[] = [
  { width: 2, gap: 0, thickness: 0.5, below: 5, above: 5, ohm: 135.134, crowding: 0.30568 },
  { width: 4, gap: 0, thickness: 0.6, below: 6, above: 6, ohm: 111.902, crowding: 0.18138 },
  { width: 5, gap: 0, thickness: 0.6, below: 6.2, above: 6.2, ohm: 103.22, crowding: 0.15461 },
  { width: 8, gap: 0, thickness: 1.2, below: 5, above: 5, ohm: 67.868, crowding: 0.0971 },
  { width: 20, gap: 0, thickness: 1, below: 5, above: 5, ohm: 36.658, crowding: 0.04668 },
  { width: 5, gap: 0, thickness: 0.6, below: 4, above: 8, ohm: 94.346, crowding: 0.16056 },
  { width: 4, gap: 0, thickness: 0.6, below: 3, above: 9, ohm: 94.497, crowding: 0.19647 },
  { width: 6, gap: 0, thickness: 1.3, below: 3, above: 12, ohm: 74.91, crowding: 0.13069 },
]

export const COUPLED_STRIPLINES: readonly (Solved & { readonly even: number })[] = [
  { width: 4, gap: 5, thickness: 0.6, below: 5, above: 5, ohm: 91.502, even: 111.797, crowding: 0.17942 },
  { width: 5, gap: 6, thickness: 0.6, below: 7, above: 7, ohm: 95.93, even: 122.527, crowding: 0.15037 },
  { width: 5, gap: 10, thickness: 1.2, below: 5, above: 5, ohm: 84.388, even: 89.013, crowding: 0.13128 },
  { width: 3.5, gap: 2, thickness: 0.6, below: 4.7, above: 4.7, ohm: 75.804, even: 128.438, crowding: 0.2164 },
  { width: 8, gap: 4, thickness: 1.2, below: 6, above: 6, ohm: 63.672, even: 86.191, crowding: 0.09753 },
  { width: 4.5, gap: 7, thickness: 0.6, below: 4, above: 8, ohm: 92.551, even: 105.446, crowding: 0.16732 },
  { width: 4, gap: 5, thickness: 1.2, below: 3.6, above: 10.8, ohm: 83.272, even: 111.181, crowding: 0.15226 },
  { width: 5, gap: 20, thickness: 0.6, below: 5, above: 7, ohm: 99.458, even: 100.002, crowding: 0.15576 },
]

export const MICROSTRIPS: readonly (Solved & { readonly dielectric: number; readonly effective: number })[] = [
  {
    width: 5,
    gap: 0,
    thickness: 0.6,
    below: 3,
    above: 0,
    dielectric: 3.6,
    ohm: 91.172,
    effective: 2.6563,
    crowding: 0.17781,
  },
  {
    width: 8,
    gap: 0,
    thickness: 1.4,
    below: 5,
    above: 0,
    dielectric: 4.4,
    ohm: 91.052,
    effective: 3.1049,
    crowding: 0.10291,
  },
  {
    width: 20,
    gap: 0,
    thickness: 1.4,
    below: 5,
    above: 0,
    dielectric: 3.2,
    ohm: 54.819,
    effective: 2.6022,
    crowding: 0.0564,
  },
  {
    width: 3,
    gap: 0,
    thickness: 1.0,
    below: 5,
    above: 0,
    dielectric: 4.0,
    ohm: 135.759,
    effective: 2.6445,
    crowding: 0.19841,
  },
  {
    width: 4,
    gap: 0,
    thickness: 1.4,
    below: 8,
    above: 0,
    dielectric: 3.8,
    ohm: 145.039,
    effective: 2.518,
    crowding: 0.14317,
  },
]

export const COUPLED_MICROSTRIPS: readonly (Solved & { readonly dielectric: number; readonly effective: number })[] = [
  {
    width: 5,
    gap: 6,
    thickness: 0.6,
    below: 3,
    above: 0,
    dielectric: 3.6,
    ohm: 80.814,
    effective: 2.4637,
    crowding: 0.16383,
  },
  {
    width: 6,
    gap: 5,
    thickness: 1.4,
    below: 5,
    above: 0,
    dielectric: 4.4,
    ohm: 77.659,
    effective: 2.5878,
    crowding: 0.11229,
  },
  {
    width: 5,
    gap: 12,
    thickness: 1.4,
    below: 4,
    above: 0,
    dielectric: 3.6,
    ohm: 91.511,
    effective: 2.3905,
    crowding: 0.13163,
  },
  {
    width: 8,
    gap: 6,
    thickness: 0.6,
    below: 5,
    above: 0,
    dielectric: 3.2,
    ohm: 78.65,
    effective: 2.205,
    crowding: 0.11121,
  },
  {
    width: 4,
    gap: 16,
    thickness: 1.2,
    below: 4,
    above: 0,
    dielectric: 4.0,
    ohm: 104.42,
    effective: 2.6118,
    crowding: 0.159,
  },
]
