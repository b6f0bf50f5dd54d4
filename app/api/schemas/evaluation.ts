import { z } from 'zod'
import type { Evaluation } from '../../../lib/budget/evaluation'
import { FLAGS, type FlagCode } from '../../../lib/budget/flags'
import { BASES, GRADES, OWNERS, STATISTICS, VERDICTS } from '../../../lib/budget/schema'
import { buildsEvaluation, channelEvaluation, sensitivity } from './channel'
import { component } from './components'
import { sections } from './sections'

const decibels = z.number().meta({ description: 'Decibels; a loss is positive.' })
const known = decibels.nullable()
const hertz = z.number().nullable().meta({ description: 'Hertz.' })
const ids = z.array(z.string())

const lineEvaluation = z.strictObject({
  id: z.string(),
  loss: z.strictObject({
    atHz: hertz,
    nominalDb: known,
    lowDb: known,
    highDb: known,
    by: z.enum(['stated', 'moved', 'table', 'computed', 'measured']).nullable(),
    beside: z.array(z.strictObject({ what: z.enum(['mismatch', 'dissipated', 'native', 'point']), db: decibels })),
  }),
  lane: z.number().int().nullable(),
  owner: z.enum(OWNERS).nullable(),
  basis: z.enum(BASES).nullable(),
  grade: z.enum(GRADES),
  lengthM: z.number().nullable(),
  group: z.string(),
})

const allowanceEvaluation = z.strictObject({
  id: z.string(),
  name: z.string(),
  limitDb: known,
  atHz: hertz,
  requiredMarginDb: decibels,
  judged: z.strictObject({
    corner: z.string(),
    statistic: z.enum(STATISTICS),
    lane: z.number().int().nullable(),
    lanes: z.number().int(),
    shortestLane: z.number().int().nullable(),
    movedDb: known,
    unmovedDb: known,
  }),
  verdict: z.enum(VERDICTS),
  words: z.string(),
  reasons: z.array(z.string()),
  from: z.string().nullable(),
  to: z.string().nullable(),
  knownDb: decibels,
  lossDb: known,
  marginDb: known,
  leftDb: known,
  undecidedLines: ids,
  nominalDb: known,
  worstDb: known,
  rssDb: known,
  channel: channelEvaluation.nullable(),
  builds: buildsEvaluation.nullable(),
  sensitivity: sensitivity.nullable(),
  byBasis: z.record(z.enum([...BASES, 'unsaid']), decibels),
  lines: z.array(z.strictObject({ id: z.string(), countedDb: known, lowDb: known, highDb: known })),
  shares: z.array(
    z.strictObject({
      id: z.string(),
      of: z.strictObject({ kind: z.enum(['assembly', 'line', 'discipline']), ref: z.string() }),
      shareDb: decibels,
      usedDb: decibels,
      freeDb: decibels,
      undecidedLines: ids,
    }),
  ),
})

const flag = z.strictObject({
  code: z.enum(Object.keys(FLAGS) as [FlagCode, ...FlagCode[]]),
  severity: z.enum(['problem', 'warning', 'notice']),
  section: z.enum(['head', ...sections]),
  id: z.string().nullable(),
  field: z.string().nullable(),
  message: z.string(),
  todo: z.string(),
})

/** The shape of lib/budget's Evaluation; the compiler checks that it keeps up. Null is unknown, never zero. */
export const evaluation = component(
  'Evaluation',
  z.strictObject({
    engine: z.string(),
    signalling: z.strictObject({
      lineRate: z.number().nullable(),
      bitsPerSymbol: z.number().nullable(),
      symbolRate: z.number().nullable(),
      unitInterval: z.number().nullable(),
      nyquist: hertz,
      statement: z.string(),
    }),
    rows: z.array(z.union([z.strictObject({ plane: z.string() }), z.strictObject({ line: z.string() })])),
    lines: z.record(z.string(), lineEvaluation),
    allowances: z.array(allowanceEvaluation),
    verdict: z.enum(VERDICTS),
    flags: z.array(flag),
  }) satisfies z.ZodType<Evaluation>,
)
