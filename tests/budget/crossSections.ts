import type { BudgetFile } from '../../lib/budget/schema'

type LineFile = NonNullable<BudgetFile['lines']>[string]

/** A stripline of 5 mil between planes 5 mil away, of smooth copper. */
export const STRIPLINE = {
  order: 'a1',
  kind: 'trace',
  model: 'geometry',
  basis: 'estimate',
  structure: 'stripline',
  length: '5 in',
  width: '5 mil',
  thickness: '0.6 mil',
  heightBelow: '5 mil',
  heightAbove: '5 mil',
  dk: '3.6',
  df: '0.006',
  anchor: '10 GHz',
  roughness: 'smooth',
} as const satisfies LineFile

/** A pair in a stripline with everything said that a checker asks for. */
export const PAIR = {
  kind: 'trace',
  model: 'geometry',
  at: null,
  structure: 'coupled-stripline',
  length: '5 in',
  width: '5 mil',
  gap: '6 mil',
  thickness: '0.6 mil',
  heightBelow: '6 mil',
  heightAbove: '6 mil',
  dk: '3.6',
  df: '0.004',
  anchor: '10 GHz',
  method: 'split-post resonator',
  resin: '55 %',
  roughness: 'cannonball',
  roughnessTop: '2 µm',
  roughnessBottom: '2 µm',
} as const satisfies Partial<LineFile>
