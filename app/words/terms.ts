import type { Basis, Grade, LineKind, Owner, Plane, PlaneCode, Statistic, Verdict } from '../../lib/budget/schema'

/** The words of the closed lists as screens show them. */
export const VERDICT_WORD: Readonly<Record<Verdict, string>> = {
  over: 'Over',
  undecided: 'Undecided',
  tight: 'Tight',
  inside: 'Inside',
}

export const BASIS_WORD: Readonly<Record<Basis | 'unsaid', string>> = {
  measured: 'measured',
  datasheet: 'datasheet',
  simulated: 'simulated',
  estimate: 'estimate',
  target: 'target',
  unsaid: 'basis not said',
}

/** Most proven first, as decibels by basis are listed. */
export const PROOF_ORDER: readonly (Basis | 'unsaid')[] = [
  'measured',
  'datasheet',
  'simulated',
  'estimate',
  'target',
  'unsaid',
]

export const GRADE_WORD: Readonly<Record<Grade, string>> = {
  nominal: 'nominal',
  typical: 'typical',
  maximum: 'maximum',
}

export const OWNER_WORD: Readonly<Record<Owner, string>> = {
  system: 'system',
  hardware: 'hardware',
  silicon: 'silicon',
  package: 'package',
  layout: 'layout',
  interconnect: 'interconnect',
  test: 'test',
  supplier: 'supplier',
}

export const KIND_WORD: Readonly<Record<LineKind, string>> = {
  die: 'die',
  package: 'package',
  trace: 'trace',
  via: 'via',
  connector: 'connector',
  cable: 'cable',
  component: 'component',
  reserve: 'reserve',
  overlap: 'overlap',
  other: 'other',
}

export const STATISTIC_WORD: Readonly<Record<Statistic, string>> = {
  nominal: 'nominal',
  rss: 'RSS, three sigma',
  worst: 'worst case',
}

const PLANE_WORD: Readonly<Record<PlaneCode, string>> = {
  'tx-die': 'TX die',
  'tx-bump': 'TX bump',
  'tx-ball': 'TX ball',
  'rx-die': 'RX die',
  'rx-bump': 'RX bump',
  'rx-ball': 'RX ball',
  'board-edge': 'board edge',
  'connector-face': 'mating face',
  'module-ball': 'module ball',
  tp0: 'TP0',
  tp0d: 'TP0d',
  tp1: 'TP1',
  tp1a: 'TP1a',
  tp2: 'TP2',
  tp3: 'TP3',
  tp4: 'TP4',
  tp4a: 'TP4a',
  tp5: 'TP5',
  tp5d: 'TP5d',
}

export const planeCodeWord = (code: PlaneCode): string => PLANE_WORD[code]

/** A plane's own name on this link, else the word of its code. */
export function planeWords(plane: Pick<Plane, 'code' | 'name'>): string {
  return plane.name?.trim() || (plane.code ? PLANE_WORD[plane.code] : 'plane not said')
}
