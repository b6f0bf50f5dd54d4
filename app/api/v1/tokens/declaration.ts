import { z } from 'zod'
import { declare } from '../../declaration'
import { time } from '../../schemas/components'
import { shortText, token } from '../../schemas/people'

export const listTokens = declare({
  method: 'GET',
  path: '/api/v1/tokens',
  operation: 'listTokens',
  summary: "One's own personal tokens, without the secrets.",
  admission: 'person',
  answer: { status: 200, description: 'The tokens.', json: z.strictObject({ tokens: z.array(token) }) },
})

export const createToken = declare({
  method: 'POST',
  path: '/api/v1/tokens',
  operation: 'createToken',
  summary: 'Make a personal token. It may do what its person may do, but makes no tokens and changes no password.',
  admission: 'session',
  body: {
    json: z.strictObject({
      name: shortText(80, 'What it is for.'),
      expiresAt: time
        .refine((value) => value > Date.now(), 'Choose a time that is still to come, or null for no end.')
        .nullable(),
    }),
  },
  answer: {
    status: 201,
    description: 'The token; the secret is shown this once.',
    json: z.strictObject({ secret: z.string(), token }),
  },
})
