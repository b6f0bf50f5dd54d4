import { z } from 'zod'
import { allowance, corner, plane, share } from './allowances'
import { assembly, layer, lossClass } from './assemblies'
import { head } from './head'
import { LANE_FIELDS, line } from './lines'
import { evidence, figure, requiredSignOff } from './proof'
import { ID, identifier } from './scalars'

export const LIMITS = {
  lines: 500,
  lanes: 256,
  recordsPerSection: 500,
  laneValues: 500 * 256,
  laneValueLength: 40,
  editBytes: 4 * 1024 * 1024,
  evidenceBytes: 100 * 1024 * 1024,
} as const

/** The sections of a budget that hold records by id. A record is flat: field → scalar. */
export const SECTIONS = {
  assemblies: assembly,
  lossClasses: lossClass,
  layers: layer,
  lines: line,
  planes: plane,
  allowances: allowance,
  shares: share,
  corners: corner,
  evidence: evidence,
  figures: figure,
  signOffs: requiredSignOff,
} as const
export type SectionName = keyof typeof SECTIONS

/** zod skips this name without a word; what stands under it would be lost. */
function refuseProto<T>(records: T, ctx: z.core.$RefinementCtx): T {
  if (typeof records === 'object' && records !== null && Object.hasOwn(records, '__proto__')) {
    ctx.addIssue({ code: 'custom', message: "'__proto__' cannot be an id; choose another." })
  }
  return records
}

/** A refused key says what is wrong with it, not only that something is. */
const keyRefusal: z.core.$ZodRecordParams = {
  error: (issue) => (issue.code === 'invalid_key' ? issue.issues[0]?.message : undefined),
}

const section = <T extends z.ZodType>(record: T) =>
  z
    .preprocess(
      refuseProto<Record<string, z.input<T>>>,
      z
        .record(identifier, record, keyRefusal)
        .refine(
          (records) => Object.keys(records).length <= LIMITS.recordsPerSection,
          `At most ${LIMITS.recordsPerSection} records.`,
        ),
    )
    .default({})

/** 'line id/lane number/field' → the value of that lane, as typed, or null for the line's own. */
export const LANE_KEY = new RegExp(`^(${ID.source.slice(1, -1)})/([1-9]\\d{0,2})/(${LANE_FIELDS.join('|')})$`)
const laneKey = z
  .string()
  .regex(LANE_KEY, "A lane value's key is 'line/lane/field'.")
  .refine((key) => Number(key.split('/')[1]) <= LIMITS.lanes, `A link has at most ${LIMITS.lanes} lanes.`)
export const laneValue = z
  .string('Write the value of the lane as text, with its unit.')
  .max(LIMITS.laneValueLength, `Write at most ${LIMITS.laneValueLength} characters.`)
  .nullable()

/** What a lane says instead of its line obeys the bounds of the line's own field. */
const laneValues = z
  .preprocess(
    refuseProto<Record<string, string | null>>,
    z
      .record(laneKey, laneValue, keyRefusal)
      .refine((values) => Object.keys(values).length <= LIMITS.laneValues, `At most ${LIMITS.laneValues} lane values.`)
      .superRefine((values, ctx) => {
        for (const [key, value] of Object.entries(values)) {
          const field = LANE_FIELDS.find((name) => key.endsWith(`/${name}`))
          const result = field && line.shape[field].safeParse(value)
          for (const issue of result?.error?.issues ?? []) ctx.addIssue({ ...issue, path: [key] })
        }
      }),
  )
  .default({})

/** The budget: the shared worksheet of one link, version 1. The budget file is this as JSON. */
export const budgetSchema = z.strictObject({
  head,
  assemblies: section(SECTIONS.assemblies),
  lossClasses: section(SECTIONS.lossClasses),
  layers: section(SECTIONS.layers),
  lines: section(SECTIONS.lines),
  planes: section(SECTIONS.planes),
  allowances: section(SECTIONS.allowances),
  shares: section(SECTIONS.shares),
  corners: section(SECTIONS.corners),
  evidence: section(SECTIONS.evidence),
  figures: section(SECTIONS.figures),
  signOffs: section(SECTIONS.signOffs),
  laneValues,
})

export type Budget = z.output<typeof budgetSchema>
export type BudgetFile = z.input<typeof budgetSchema>
export type Head = Budget['head']
export type Records<S extends SectionName> = Budget[S]
export type RecordOf<S extends SectionName> = Budget[S][string]
export type Line = RecordOf<'lines'>
export type Plane = RecordOf<'planes'>
export type Assembly = RecordOf<'assemblies'>
export type LossClass = RecordOf<'lossClasses'>
export type Allowance = RecordOf<'allowances'>
export type Scalar = string | number | boolean | null

/** Where a comment hangs: a record of a section, and optionally one of its fields. */
export const commentAnchor = z.strictObject({
  section: z.enum(['head', ...(Object.keys(SECTIONS) as [SectionName, ...SectionName[]])]),
  id: identifier.nullable(),
  field: z.string().max(40).nullable(),
})
