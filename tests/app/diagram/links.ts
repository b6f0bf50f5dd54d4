import type { AllowanceEvaluation, Evaluation, LineEvaluation } from '../../../lib/budget/evaluation'
import { type Budget, budgetSchema } from '../../../lib/budget/schema'

/**
 * Evaluated links with sums known beforehand: three invented example links whose totals were added by hand (common
 * practice, no source), and one of 40 lines that crowds the drawing. Rows: name, kind, assembly, dB, basis, inches, ± dB,
 * group, owner. A row '|name' is a plane.
 */
type Row = readonly [
  name: string,
  kind: string,
  assembly: string,
  db: number | null,
  basis: string,
  inches: number | null,
  tolerance: number,
  group: string,
  owner: string,
  grade?: string,
]
export type Link = { readonly budget: Budget; readonly evaluation: Evaluation }

type Sums = Partial<AllowanceEvaluation> & { readonly id: string }

const order = (at: number) => `a${'0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz'[at]}`

export function linkOf(
  name: string,
  assemblies: Record<string, readonly [name: string, kind: string]>,
  rows: readonly (Row | string)[],
  sums: readonly Sums[],
): Link {
  const ids = rows.map((row, at) => (typeof row === 'string' ? row : `l${at}`))
  const lines = rows.flatMap((row, at) => (typeof row === 'string' ? [] : [{ id: ids[at] as string, row, at }]))
  const budget = budgetSchema.parse({
    head: { schemaVersion: 1, name, laneCount: 16 },
    assemblies: Object.fromEntries(
      Object.entries(assemblies).map(([id, [title, kind]], at) => [id, { order: order(at), name: title, kind }]),
    ),
    planes: Object.fromEntries(
      rows.flatMap((row, at) => (typeof row === 'string' ? [[row, { order: order(at), name: row }]] : [])),
    ),
    lines: Object.fromEntries(
      lines.map(({ id, row, at }) => [id, { order: order(at), name: row[0], kind: row[1], assembly: row[2] || null }]),
    ),
    allowances: Object.fromEntries(
      sums.map((sum, at) => [
        sum.id,
        { order: order(at), name: sum.name ?? sum.id, from: sum.from ?? null, to: sum.to ?? null },
      ]),
    ),
  })
  const signed = (row: Row) => (row[3] === null ? null : row[1] === 'overlap' ? -row[3] : row[3])
  const factsOf = (row: Row, id: string): LineEvaluation => ({
    id,
    loss: { atHz: null, nominalDb: row[3], lowDb: edge(row, -1), highDb: edge(row, 1), by: 'stated', beside: [] },
    owner: row[8] as LineEvaluation['owner'],
    basis: (row[4] || null) as LineEvaluation['basis'],
    grade: (row[9] ?? 'nominal') as LineEvaluation['grade'],
    lengthM: row[5] === null ? null : row[5] * 0.0254,
    group: row[7],
    lane: null,
  })
  const allowances = sums.map((sum): AllowanceEvaluation => {
    const from = rows.indexOf(sum.from ?? '')
    const to = rows.indexOf(sum.to ?? '')
    const inside = lines.filter(({ at }) => at > from && at < to)
    const byBasis = { measured: 0, datasheet: 0, simulated: 0, estimate: 0, target: 0, unsaid: 0 }
    for (const { row } of inside) byBasis[(row[4] || 'unsaid') as keyof typeof byBasis] += signed(row) ?? 0
    return {
      name: sum.id,
      limitDb: null,
      atHz: null,
      requiredMarginDb: 1.5,
      judged: {
        corner: '25 °C, dry',
        statistic: 'nominal',
        lane: 11,
        lanes: 16,
        shortestLane: null,
        movedDb: null,
        unmovedDb: null,
      },
      verdict: 'undecided',
      words: 'undecided',
      reasons: [],
      from: null,
      to: null,
      knownDb: 0,
      lossDb: null,
      marginDb: null,
      leftDb: null,
      undecidedLines: inside.flatMap(({ id, row }) => (row[3] === null ? [id] : [])),
      nominalDb: null,
      worstDb: null,
      rssDb: null,
      channel: null,
      builds: null,
      sensitivity: null,
      byBasis,
      lines: inside.map(({ id, row }) => ({
        id,
        countedDb: signed(row),
        lowDb: edge(row, -1),
        highDb: edge(row, 1),
      })),
      shares: [],
      ...sum,
    }
  })
  return {
    budget,
    evaluation: {
      engine: 'test',
      signalling: {
        lineRate: null,
        bitsPerSymbol: null,
        symbolRate: null,
        unitInterval: null,
        nyquist: null,
        statement: '',
      },
      rows: rows.map((row, at) => (typeof row === 'string' ? { plane: row } : { line: ids[at] as string })),
      lines: Object.fromEntries(lines.map(({ id, row }) => [id, factsOf(row, id)])),
      allowances,
      verdict: allowances[0]?.verdict ?? 'undecided',
      flags: [],
    },
  }
}

function edge(row: Row, sign: 1 | -1): number | null {
  return row[3] === null ? null : row[3] + sign * row[6]
}

const boards = {
  'tx-package': ['TX package', 'package'],
  'line-card': ['Line card', 'board'],
  connector: ['Backplane connector', 'connector-family'],
  backplane: ['Backplane', 'board'],
  'switch-card': ['Switch card', 'board'],
  'rx-package': ['RX package', 'package'],
} as const

/** Tamarack: 27.20 of 28 dB, margin 0.80, grouped ±1.09; hot 28.19. */
export const tamarack = linkOf(
  'Tamarack',
  boards,
  [
    ['TX package', 'package', 'tx-package', 3.1, 'simulated', 1.02, 0.25, 'tx', 'package'],
    'tx-ball',
    ['BGA via and breakout', 'via', 'line-card', 0.6, 'simulated', null, 0.15, 'card-via', 'layout'],
    ['Line-card stripline L5', 'trace', 'line-card', 4.75, 'measured', 5, 0.285, 'card', 'layout'],
    ['Press-fit footprint via', 'via', 'line-card', 0.45, 'simulated', null, 0.12, 'conn-via', 'interconnect'],
    [
      'Backplane connector, near',
      'connector',
      'connector',
      1.35,
      'datasheet',
      null,
      0.2,
      'conn',
      'interconnect',
      'typical',
    ],
    ['Backplane via, near', 'via', 'backplane', 0.65, 'simulated', null, 0.15, 'bp-via', 'layout'],
    ['Backplane stripline L14', 'trace', 'backplane', 9.2, 'estimate', 11.5, 0.552, 'bp', 'layout'],
    ['Backplane via, far', 'via', 'backplane', 0.65, 'simulated', null, 0.15, 'bp-via', 'layout'],
    [
      'Backplane connector, far',
      'connector',
      'connector',
      1.35,
      'datasheet',
      null,
      0.2,
      'conn',
      'interconnect',
      'typical',
    ],
    ['Press-fit footprint via', 'via', 'switch-card', 0.45, 'simulated', null, 0.12, 'conn-via', 'interconnect'],
    ['Switch-card stripline L7', 'trace', 'switch-card', 6.65, 'measured', 7, 0.399, 'card', 'layout'],
    ['AC capacitor with pads', 'component', 'switch-card', 0.5, 'simulated', null, 0.1, 'cap', 'hardware'],
    ['BGA via and breakout', 'via', 'switch-card', 0.6, 'simulated', null, 0.15, 'card-via', 'layout'],
    'rx-ball',
    ['RX package', 'package', 'rx-package', 2.7, 'simulated', 0.87, 0.25, 'rx', 'package'],
  ],
  [
    {
      id: 'room',
      from: 'tx-ball',
      to: 'rx-ball',
      limitDb: 28,
      atHz: 26.5625e9,
      verdict: 'tight',
      words: 'tight',
      knownDb: 27.2,
      lossDb: 27.2,
      nominalDb: 27.2,
      marginDb: 0.8,
      leftDb: 0.8,
      rssDb: 1.09,
    },
    {
      id: 'hot',
      from: 'tx-ball',
      to: 'rx-ball',
      limitDb: 28,
      atHz: 26.5625e9,
      judged: {
        corner: '65 °C',
        statistic: 'nominal',
        lane: 11,
        lanes: 16,
        shortestLane: null,
        movedDb: null,
        unmovedDb: null,
      },
      verdict: 'over',
      words: 'over',
      knownDb: 28.19,
      lossDb: 28.19,
      nominalDb: 28.19,
      marginDb: -0.19,
      leftDb: -0.19,
      rssDb: 1.12,
    },
  ],
)

const slot = {
  root: ['Root package', 'package'],
  system: ['System board', 'board'],
  slot: ['Slot connector', 'connector-family'],
  card: ['Card', 'board'],
  endpoint: ['Endpoint package', 'package'],
} as const

/** Osier: 37.11 of 36 dB, margin −1.11; the system board 1.16 dB and the card 0.55 dB past their shares. */
export const osier = linkOf(
  'Osier',
  slot,
  [
    'root-bump',
    ['Root package', 'package', 'root', 8.4, 'simulated', null, 0.4, 'root', 'package'],
    ['BGA via', 'via', 'system', 0.45, 'simulated', null, 0.1, 'sys-via', 'layout'],
    ['Breakout microstrip', 'trace', 'system', 0.69, 'estimate', 0.6, 0.048, 'sys', 'layout'],
    ['Main stripline L3', 'trace', 'system', 15.07, 'simulated', 13.7, 1.055, 'sys', 'layout'],
    ['AC capacitor', 'component', 'system', 0.4, 'simulated', null, 0.1, 'cap', 'hardware'],
    ['Slot footprint via', 'via', 'system', 0.55, 'simulated', null, 0.15, 'sys-via', 'layout'],
    ['Slot connector', 'connector', 'slot', 1.5, 'datasheet', null, 0.2, 'slot', 'interconnect', 'maximum'],
    ['Edge finger and pad', 'other', 'card', 0.45, 'simulated', null, 0.1, 'finger', 'layout'],
    ['Card via', 'via', 'card', 0.35, 'simulated', null, 0.1, 'crd-via', 'layout'],
    ['Card stripline', 'trace', 'card', 4.5, 'target', 3.6, 0.36, 'crd', 'layout'],
    ['BGA via', 'via', 'card', 0.45, 'simulated', null, 0.1, 'crd-via', 'layout'],
    ['Endpoint package', 'package', 'endpoint', 4.3, 'estimate', null, 0.3, 'end', 'package'],
    'endpoint-bump',
  ],
  [
    {
      id: 'slot',
      from: 'root-bump',
      to: 'endpoint-bump',
      limitDb: 36,
      atHz: 16e9,
      verdict: 'over',
      words: 'over',
      knownDb: 37.11,
      lossDb: 37.11,
      nominalDb: 37.11,
      marginDb: -1.11,
      leftDb: -1.11,
      rssDb: 1.33,
      shares: [
        { id: 's1', of: { kind: 'assembly', ref: 'root' }, shareDb: 9, usedDb: 8.4, freeDb: 0.6, undecidedLines: [] },
        {
          id: 's2',
          of: { kind: 'assembly', ref: 'system' },
          shareDb: 16,
          usedDb: 17.16,
          freeDb: -1.16,
          undecidedLines: [],
        },
        { id: 's3', of: { kind: 'assembly', ref: 'slot' }, shareDb: 1.5, usedDb: 1.5, freeDb: 0, undecidedLines: [] },
        {
          id: 's4',
          of: { kind: 'assembly', ref: 'card' },
          shareDb: 5.2,
          usedDb: 5.75,
          freeDb: -0.55,
          undecidedLines: [],
        },
      ],
    },
  ],
)

/** Osier reversed, three lines without a number: 26.81 of 36 dB known, 9.19 left. */
export const upstream = linkOf(
  'Osier, upstream',
  slot,
  [
    'endpoint-bump',
    ['Endpoint package', 'package', 'card', null, '', null, 0, 'end', 'package'],
    ['BGA via', 'via', 'card', 0.45, 'simulated', null, 0.1, 'crd-via', 'layout'],
    ['Card stripline', 'trace', 'card', null, 'target', 3.6, 0, 'crd', 'layout'],
    ['Card via', 'via', 'card', 0.35, 'simulated', null, 0.1, 'crd-via', 'layout'],
    ['Edge finger and pad', 'other', 'card', 0.45, 'simulated', null, 0.1, 'finger', 'layout'],
    ['Slot connector', 'connector', 'slot', null, '', null, 0, 'slot', 'interconnect'],
    ['Slot footprint via', 'via', 'system', 0.55, 'simulated', null, 0.15, 'sys-via', 'layout'],
    ['AC capacitor', 'component', 'system', 0.4, 'simulated', null, 0.1, 'cap', 'hardware'],
    ['Main stripline L3', 'trace', 'system', 15.07, 'simulated', 13.7, 1.055, 'sys', 'layout'],
    ['Breakout microstrip', 'trace', 'system', 0.69, 'estimate', 0.6, 0.048, 'sys', 'layout'],
    ['BGA via', 'via', 'system', 0.45, 'simulated', null, 0.1, 'sys-via', 'layout'],
    ['Root package', 'package', 'root', 8.4, 'simulated', null, 0.4, 'root', 'package'],
    'root-bump',
  ],
  [
    {
      id: 'slot',
      from: 'endpoint-bump',
      to: 'root-bump',
      limitDb: 36,
      atHz: 16e9,
      verdict: 'undecided',
      words: 'undecided',
      knownDb: 26.81,
      leftDb: 9.19,
      shares: [
        {
          id: 's4',
          of: { kind: 'assembly', ref: 'card' },
          shareDb: 9.5,
          usedDb: 1.25,
          freeDb: 8.25,
          undecidedLines: ['l1', 'l3'],
        },
        {
          id: 's2',
          of: { kind: 'assembly', ref: 'system' },
          shareDb: 16,
          usedDb: 17.16,
          freeDb: -1.16,
          undecidedLines: [],
        },
      ],
    },
  ],
)

/** Sedge: 16.32 of 25 dB, margin 8.68; a 3 m cable beside short traces, a fixture counted twice taken off again. */
export const sedge = linkOf(
  'Sedge',
  {
    controller: ['Controller', 'board'],
    cable: ['Twin-axial cable', 'cable'],
    drive: ['Drive board', 'board'],
  },
  [
    'tp1',
    ['BGA via', 'via', 'controller', 0.15, 'simulated', null, 0.05, 'a-via', 'layout'],
    ['Controller trace', 'trace', 'controller', 2.9, 'measured', 5, 0.232, 'card', 'layout'],
    ['Header footprint', 'via', 'controller', 0.2, 'simulated', null, 0.05, 'a-via', 'layout'],
    ['Cable connector, near', 'connector', 'cable', 0.6, 'measured', null, 0.15, 'conn', 'interconnect'],
    ['Cable assembly', 'cable', 'cable', 9.65, 'datasheet', 118, 0.423, 'bulk', 'supplier', 'maximum'],
    ['Fixture of the cable file', 'overlap', 'cable', 1.9, 'measured', null, 0.1, 'term', 'test'],
    ['Cable connector, far', 'connector', 'cable', 0.6, 'measured', null, 0.15, 'conn', 'interconnect'],
    ['Header footprint', 'via', 'drive', 0.2, 'simulated', null, 0.05, 'b-via', 'layout'],
    'drive-edge',
    ['Drive-board trace', 'trace', 'drive', 3.77, 'measured', 6.5, 0.302, 'card', 'layout'],
    ['BGA via', 'via', 'drive', 0.15, 'simulated', null, 0.05, 'b-via', 'layout'],
    'tp4',
    ['AC capacitor and RX package', 'component', '', 0.9, 'estimate', null, 0.1, 'rx', 'hardware'],
  ],
  [
    {
      id: 'link',
      from: 'tp1',
      to: 'tp4',
      limitDb: 25,
      atHz: 5.15625e9,
      requiredMarginDb: 2.5,
      judged: {
        corner: '25 °C, dry',
        statistic: 'nominal',
        lane: null,
        lanes: 1,
        shortestLane: null,
        movedDb: null,
        unmovedDb: null,
      },
      verdict: 'inside',
      words: 'inside',
      knownDb: 16.32,
      lossDb: 16.32,
      nominalDb: 16.32,
      marginDb: 8.68,
      leftDb: 8.68,
      rssDb: 0.78,
    },
  ],
)

const ALDER_KINDS = ['via', 'trace', 'via', 'component', 'connector'] as const
const ALDER_BASES = ['simulated', 'measured', 'estimate', 'datasheet', 'target'] as const
const ALDER_OWNERS = ['layout', 'layout', 'interconnect', 'hardware', 'layout'] as const

/** Alder: 40 lines of 0.65 dB, so 26.00 of 26 dB. */
export const alder = linkOf(
  'Alder',
  {
    host: ['Host board', 'board'],
    riser: ['Riser', 'board'],
    cable: ['Cable', 'cable'],
    drive: ['Drive board', 'board'],
  },
  [
    'tx-ball',
    ...Array.from({ length: 40 }, (_, at): Row => {
      const kind = ALDER_KINDS[at % 5] ?? 'other'
      return [
        `Line ${at + 1}`,
        kind,
        ['host', 'riser', 'cable', 'drive'][Math.floor(at / 10)] ?? '',
        0.65,
        ALDER_BASES[at % 5] ?? '',
        kind === 'trace' ? 1 + (at % 7) : null,
        0.05,
        `g${at % 5}`,
        ALDER_OWNERS[at % 5] ?? 'system',
      ]
    }),
    'module-ball',
  ],
  [
    {
      id: 'long',
      from: 'tx-ball',
      to: 'module-ball',
      limitDb: 26,
      atHz: 16e9,
      requiredMarginDb: 1,
      judged: {
        corner: '25 °C, dry',
        statistic: 'nominal',
        lane: null,
        lanes: 1,
        shortestLane: null,
        movedDb: null,
        unmovedDb: null,
      },
      verdict: 'tight',
      words: 'tight',
      knownDb: 26,
      lossDb: 26,
      nominalDb: 26,
      marginDb: 0,
      leftDb: 0,
      rssDb: 0.9,
    },
  ],
)
