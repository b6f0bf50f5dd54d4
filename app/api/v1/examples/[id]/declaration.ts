import { z } from 'zod'
import { declare } from '../../../declaration'

export const makeFromExample = declare({
  method: 'POST',
  path: '/api/v1/examples/{id}',
  operation: 'makeFromExample',
  summary: 'Make a budget from an invented example link, with its evidence files; one becomes its owner.',
  admission: 'person',
  answer: { status: 201, description: 'Made; Location names it.', json: z.strictObject({ id: z.string() }) },
  problems: ['not-found'],
})
