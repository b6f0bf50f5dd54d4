import { z } from 'zod'
import { declare } from '../../../../declaration'
import { trailEntry } from '../../../../schemas/trail'

const place = (what: string) =>
  z.coerce.number('Give a seq, a whole number.').int().min(0).optional().meta({ description: what })

export const readTrail = declare({
  method: 'GET',
  path: '/api/v1/budgets/{id}/trail',
  operation: 'readTrail',
  summary: 'Every change with its author and what it did to the margins.',
  admission: { role: 'viewer' },
  query: z
    .strictObject({
      after: place('The whole chain after this seq, oldest first: for programs that keep up.'),
      before: place(
        'Edits before this seq, newest first and without the bindings of client ids: for people. Neither: the newest.',
      ),
      limit: z.coerce
        .number('Give a whole number.')
        .int()
        .min(1, 'Ask for at least 1 entry.')
        .max(500, 'Ask for at most 500 entries at once.')
        .default(100)
        .meta({ description: 'Entries at most.' }),
    })
    .refine(({ after, before }) => after === undefined || before === undefined, {
      path: ['before'],
      message: 'Give after or before, not both.',
    }),
  answer: { status: 200, description: 'Entries.', json: z.strictObject({ entries: z.array(trailEntry) }) },
  problems: ['budget-locked'],
})
