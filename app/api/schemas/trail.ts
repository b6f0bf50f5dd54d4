import { z } from 'zod'
import { component, seq, sha256, time } from './components'
import { sections } from './sections'

export const scalar = z.union([z.string(), z.number(), z.boolean(), z.null()])

const side = z
  .strictObject({ verdict: z.string(), marginDb: z.number().nullable(), knownDb: z.number().nullable() })
  .nullable()

const changeRow = component(
  'Change',
  z.strictObject({
    section: z.enum(['head', ...sections, 'laneValues']),
    id: z.string().nullable(),
    field: z.string(),
    kind: z.enum(['set', 'add', 'text', 'overtaken']),
    before: scalar,
    after: scalar,
    written: scalar.optional().meta({ description: 'Overtaken: what was sent; after is the value kept.' }),
    unseen: z.literal(true).optional().meta({ description: 'The author had not seen the value that was replaced.' }),
  }),
)

/** A committed entry of the trail with what it did to each margin (lib/sheet/wire's TrailEntry). */
export const trailEntry = component(
  'TrailEntry',
  z.strictObject({
    seq,
    epoch: z.number().int(),
    kind: z.enum(['seed', 'edit', 'bind']),
    editId: z.string(),
    person: z.string(),
    personName: z.string(),
    door: z.enum(['screen', 'token', 'import', 'restore']),
    time,
    changes: z.array(changeRow),
    effects: z.array(z.strictObject({ allowance: z.string(), name: z.string(), before: side, after: side })),
    hash: sha256,
  }),
)
