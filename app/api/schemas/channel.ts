import { z } from 'zod'

const decibels = z.number().meta({ description: 'Decibels; a loss is positive.' })
const known = decibels.nullable()
const ids = z.array(z.string())

/** The two-ports between the planes joined: Infinity of a lossless or closed channel cannot be said in JSON and is null. */
export const channelEvaluation = z.strictObject({
  fromHz: z.number(),
  toHz: z.number(),
  coveredDb: decibels,
  reflectingDb: decibels,
  withoutBand: ids,
  withoutReflection: ids,
  lossDb: known,
  fittedDb: known,
  fit: z.array(z.number()).nullable(),
  deviation: z.strictObject({ rmsDb: decibels, maxDb: decibels, rippleDb: decibels }).nullable(),
  returnLoss: z
    .strictObject({ whole: z.boolean(), atNyquistDb: known, worstDb: known, worstAtHz: z.number() })
    .nullable(),
  curve: z
    .strictObject({
      whole: z.boolean(),
      missed: z
        .strictObject({ fromHz: z.number(), toHz: z.number(), worstDb: decibels, worstAtHz: z.number() })
        .nullable(),
    })
    .nullable(),
  trace: z.strictObject({
    hz: z.array(z.number()),
    lossDb: z.array(known),
    returnLossDb: z.array(known).nullable(),
    limitDb: z.array(known).nullable(),
  }),
})

const fraction = z.strictObject({ value: z.number(), low: z.number(), high: z.number() })
const percentile = z.strictObject({ db: decibels, error: decibels }).nullable()

/** Random builds of the link: each is one manufactured link with all its lanes. */
export const buildsEvaluation = z.strictObject({
  trials: z.number().int(),
  seed: z.number().int(),
  lanes: z.number().int(),
  meanDb: known,
  percentiles: z.strictObject({
    p50: percentile,
    p90: percentile,
    p95: percentile,
    p99: percentile,
    p99_7: percentile,
  }),
  fractionInside: fraction.nullable(),
  worstLane: z.strictObject({ lane: z.number().int(), fractionInside: fraction }).nullable(),
  common: ids,
  independent: ids,
  unknown: z.number().int(),
})

export const sensitivity = z.array(
  z.strictObject({ line: z.string(), input: z.string(), perUnit: z.number(), toleranceDb: decibels }),
)
