import { z } from 'zod'
import { LIMITS } from '../../../../../../lib/budget/schema'
import { declare } from '../../../../declaration'
import { seq, sha256 } from '../../../../schemas/components'
import { apiEdit } from './operations'

export const editBudget = declare({
  method: 'POST',
  path: '/api/v1/budgets/{id}/edits',
  operation: 'editBudget',
  summary: 'Change the budget: all of the edits or none, as one entry of the trail.',
  admission: { role: 'editor' },
  headers: z.object({
    'idempotency-key': z
      .string('Send an Idempotency-Key, such as a UUID, that is new for every edit.')
      .regex(/^[A-Za-z0-9_-]{8,64}$/, 'An Idempotency-Key has 8 to 64 letters, digits, _ or -.')
      .meta({ description: 'New for every edit; the same key with the same edits is stored once.' }),
  }),
  body: {
    json: z.strictObject({
      expectedSeq: seq
        .optional()
        .meta({ description: "Refused with 'conflict' where the budget has moved past this seq." }),
      edits: z.array(apiEdit).min(1, 'Send at least one edit.').max(5000, 'Send at most 5000 edits at once.'),
    }),
    limit: LIMITS.editBytes,
  },
  answer: {
    status: 200,
    description: 'In the trail, on disk.',
    json: z.strictObject({ editId: z.string(), seq, head: sha256 }),
  },
  problems: ['conflict', 'key-reused', 'edit-refused', 'not-stored', 'too-large'],
})
