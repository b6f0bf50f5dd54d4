/** The closed lists of the trade's words that a budget uses (DEVELOPERS.md, 'Words'). */
export const LINE_KINDS = [
  'die',
  'package',
  'trace',
  'via',
  'connector',
  'cable',
  'component',
  'reserve',
  'overlap',
  'other',
] as const
export type LineKind = (typeof LINE_KINDS)[number]

export const MODELS = [
  'stated',
  'class',
  'per-length',
  'table',
  'geometry',
  'via',
  'pad',
  'package-line',
  'ac-capacitor',
  'cable',
  'network',
] as const
export type ModelType = (typeof MODELS)[number]

export const ASSEMBLY_KINDS = ['package', 'board', 'cable', 'connector-family', 'component'] as const

export const DISCIPLINES = ['system', 'hardware', 'silicon', 'package', 'layout', 'interconnect', 'test'] as const
export type Discipline = (typeof DISCIPLINES)[number]

/** A supplier may own a line or an assembly, but does not sign. */
export const OWNERS = [...DISCIPLINES, 'supplier'] as const
export type Owner = (typeof OWNERS)[number]

/** Where a number comes from, least proven first. */
export const BASES = ['target', 'estimate', 'simulated', 'datasheet', 'measured'] as const
export type Basis = (typeof BASES)[number]

export const GRADES = ['nominal', 'typical', 'maximum'] as const
export type Grade = (typeof GRADES)[number]

export const HUMIDITIES = ['dry', 'wet'] as const

export const TOLERANCE_MEANINGS = ['limit', '1-sigma', '3-sigma', '95-percent'] as const
export type ToleranceMeaning = (typeof TOLERANCE_MEANINGS)[number]

export const RESERVE_PURPOSES = ['temperature', 'process', 'measurement', 'growth'] as const

export const STATISTICS = ['nominal', 'rss', 'worst'] as const
export type Statistic = (typeof STATISTICS)[number]

export const CONFIDENCES = ['read', 'two-sources', 'from-memory', 'own'] as const
export type Confidence = (typeof CONFIDENCES)[number]

export const VERDICTS = ['over', 'undecided', 'tight', 'inside'] as const
export type Verdict = (typeof VERDICTS)[number]

/** Reference planes, transmitter side first. A test point belongs to the standard that the plane names. */
export const PLANE_CODES = [
  'tx-die',
  'tx-bump',
  'tx-ball',
  'rx-die',
  'rx-bump',
  'rx-ball',
  'board-edge',
  'connector-face',
  'module-ball',
  'tp0',
  'tp0d',
  'tp1',
  'tp1a',
  'tp2',
  'tp3',
  'tp4',
  'tp4a',
  'tp5',
  'tp5d',
] as const
export type PlaneCode = (typeof PLANE_CODES)[number]

/** What a line's number may include, by kind. A and B are the transmitter's and the receiver's side of the line. */
export const COVERS = {
  die: ['die-pad'],
  package: ['bump-pad', 'package-trace', 'ball', 'ball-via'],
  trace: ['breakout-a', 'breakout-b'],
  via: ['footprint-via-a', 'footprint-via-b', 'ball-via', 'breakout-a', 'breakout-b'],
  connector: ['mating-interface', 'footprint-via-a', 'footprint-via-b', 'breakout-a', 'breakout-b'],
  cable: ['bulk', 'terminations', 'paddle-cards', 'mated-pairs', 'test-fixtures'],
  component: ['pads', 'breakout-a', 'breakout-b'],
  reserve: [],
  overlap: [],
  other: ['pads', 'breakout-a', 'breakout-b', 'footprint-via-a', 'footprint-via-b'],
} as const satisfies Record<LineKind, readonly string[]>
export const COVER_CODES = [...new Set(Object.values(COVERS).flat())] as readonly string[]

export const CODES = ['NRZ', 'RZ', 'PAM3', 'PAM4', 'PAM6', 'PAM8', 'PAM16'] as const
export type LineCode = (typeof CODES)[number]
