import { z } from 'zod'
import { declare } from '../../declaration'
import { email, password, person, shortText } from '../../schemas/people'

export const createOwner = declare({
  method: 'POST',
  path: '/api/v1/owner',
  operation: 'createOwner',
  summary: 'Become the first person and administrator of this server, with the code that it printed at its start.',
  admission: 'open',
  body: {
    json: z.strictObject({
      code: z.string().max(100, 'Type the code as it was printed.'),
      name: shortText(120, 'Name, as signatures will show it.'),
      email,
      password,
    }),
  },
  answer: { status: 201, description: 'The person; sign in next.', json: person },
  problems: ['wrong-code', 'password-refused'],
})
