import { z } from 'zod'
import { declare } from '../../declaration'

export const openapi = declare({
  method: 'GET',
  path: '/api/v1/openapi.json',
  operation: 'openapi',
  summary: 'This document: OpenAPI 3.1, written from what the handlers themselves declare.',
  admission: 'open',
  answer: { status: 200, description: 'The document.', json: z.looseObject({ openapi: z.string() }) },
})
