import { z } from 'zod'
import { declare } from '../../../../declaration'
import { seq } from '../../../../schemas/components'
import { evaluation } from '../../../../schemas/evaluation'

export const readEvaluation = declare({
  method: 'GET',
  path: '/api/v1/budgets/{id}/evaluation',
  operation: 'readEvaluation',
  summary: 'What the budget comes to, as every screen and document shows it.',
  admission: { role: 'viewer' },
  answer: { status: 200, description: 'The evaluation.', json: z.strictObject({ seq, evaluation }) },
  problems: ['budget-locked'],
})
