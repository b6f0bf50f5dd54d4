import { z } from 'zod'
import { declare } from '../../declaration'

export const health = declare({
  method: 'GET',
  path: '/api/v1/health',
  operation: 'health',
  summary: 'Whether the server can read and write; for whatever watches over it.',
  admission: 'open',
  answer: {
    status: 200,
    description: 'Both databases answer.',
    json: z.strictObject({ ready: z.literal(true), engine: z.string() }),
  },
})
