import { z } from 'zod'
import { declare } from '../../declaration'
import { password } from '../../schemas/people'

export const changePassword = declare({
  method: 'POST',
  path: '/api/v1/password',
  operation: 'changePassword',
  summary: 'Change the own password; ends every other session and gives this browser a new one.',
  admission: 'session',
  body: { json: z.strictObject({ current: password, next: password }) },
  answer: { status: 204, description: 'Changed.' },
  problems: ['wrong-password', 'password-refused', 'slow-down'],
})
