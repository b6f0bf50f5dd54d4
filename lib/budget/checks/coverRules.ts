import type { Line, LineKind } from '../schema'

/** One of the two lines at a joint, and the end of it that lies there: 'a' towards the transmitter, 'b' towards the receiver. */
export type End = {
  readonly line: Line
  /** Null: what the number includes is not said. */
  readonly covers: ReadonlySet<string> | null
  readonly facing: 'a' | 'b'
}

/** Who may count an item at a joint between two neighbours, and beside what it is missed. */
export type CoverRule = {
  readonly item: string
  /** Kinds whose `covers` decide. */
  readonly kinds: readonly LineKind[]
  /** The code that says that the line's number includes the item at this end. */
  readonly code: (end: End) => string
  /** Whether the neighbour counts the item too. */
  readonly neighbourCounts: (neighbour: End) => boolean
  /** Kinds of neighbour that cannot do without the item: beside them somebody must count it. */
  readonly missedBeside: readonly LineKind[]
  readonly ifMissed: string
}

const has = (end: End, code: string) => end.covers?.has(code) ?? false
const board: readonly LineKind[] = ['trace', 'component']

/** A via line is the via of the footprint beside it, unless it says that it is the one under a ball. */
const isFootprintVia = (end: End) =>
  end.line.kind === 'via' && (has(end, `footprint-via-${end.facing}`) || !has(end, 'ball-via'))

/** A via line is the via under the ball beside it, unless it says that it belongs to another footprint. */
const isBallVia = (end: End) =>
  end.line.kind === 'via' && (has(end, 'ball-via') || !(has(end, 'footprint-via-a') || has(end, 'footprint-via-b')))

/** The adjacency rules of what neighbours include. A line that does not say what it covers is never accused by its own silence. */
export const COVER_RULES: readonly CoverRule[] = [
  {
    item: 'footprint via',
    kinds: ['connector'],
    code: ({ facing }) => `footprint-via-${facing}`,
    neighbourCounts: (end) => isFootprintVia(end) || has(end, `footprint-via-${end.facing}`),
    missedBeside: board,
    ifMissed:
      'Add a line for the via, or let the connector cover it; tick it as covered where a surface mount needs none.',
  },
  {
    item: 'footprint via',
    kinds: ['other'],
    code: ({ facing }) => `footprint-via-${facing}`,
    neighbourCounts: (end) => isFootprintVia(end) || has(end, `footprint-via-${end.facing}`),
    missedBeside: [],
    ifMissed: '',
  },
  {
    item: 'via under the ball',
    kinds: ['package'],
    code: () => 'ball-via',
    neighbourCounts: (end) => isBallVia(end) || has(end, 'ball-via'),
    missedBeside: board,
    ifMissed:
      'Add a line for the via, or let the package cover it; tick it as covered where the trace starts on the pad.',
  },
  {
    item: 'breakout',
    kinds: ['via', 'trace', 'connector', 'component', 'other'],
    code: ({ facing }) => `breakout-${facing}`,
    neighbourCounts: (end) => has(end, `breakout-${end.facing}`),
    missedBeside: [],
    ifMissed: '',
  },
  {
    item: 'mating interface',
    kinds: ['connector'],
    code: () => 'mating-interface',
    neighbourCounts: (end) => has(end, 'mating-interface') || has(end, 'mated-pairs'),
    missedBeside: [],
    ifMissed: '',
  },
  {
    item: 'mated pair',
    kinds: ['cable'],
    code: () => 'mated-pairs',
    neighbourCounts: () => false,
    missedBeside: ['trace', 'via', 'component'],
    ifMissed: 'Add a line for the connector, or take the loss of the cable assembly with its mated pairs.',
  },
  {
    item: 'pad',
    kinds: ['component', 'other'],
    code: () => 'pads',
    neighbourCounts: ({ line }) => line.model === 'pad' && line.kind !== 'die' && line.kind !== 'package',
    missedBeside: [],
    ifMissed: '',
  },
]
