import { z } from 'zod'
import { LIMITS } from '../../../../../../lib/budget/schema'
import { declare } from '../../../../declaration'
import { EVIDENCE_TYPES, storedEvidence } from '../../../../schemas/evidence'
import { shortText } from '../../../../schemas/people'

export const listEvidence = declare({
  method: 'GET',
  path: '/api/v1/budgets/{id}/evidence',
  operation: 'listEvidence',
  summary: 'The files attached to the budget.',
  admission: { role: 'viewer' },
  answer: { status: 200, description: 'The files.', json: z.strictObject({ evidence: z.array(storedEvidence) }) },
})

export const attachEvidence = declare({
  method: 'POST',
  path: '/api/v1/budgets/{id}/evidence',
  operation: 'attachEvidence',
  summary: "Attach a file: its bytes are the body. Refer to it afterwards by an edit of the section 'evidence'.",
  admission: { role: 'editor' },
  query: z.strictObject({
    name: shortText(200, 'File name.').refine((name) => !/[/\\]/.test(name), 'Leave the folder out.'),
  }),
  body: { upload: EVIDENCE_TYPES, limit: LIMITS.evidenceBytes },
  answer: { status: 201, description: 'Stored once by its SHA-256; Location names it.', json: storedEvidence },
})
