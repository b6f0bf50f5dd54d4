import { z } from 'zod'
import { declare } from '../../declaration'
import { email, password, signedInPerson } from '../../schemas/people'

export const signIn = declare({
  method: 'POST',
  path: '/api/v1/session',
  operation: 'signIn',
  summary: 'Sign in; sets the session cookie.',
  admission: 'open',
  body: { json: z.strictObject({ email, password }) },
  answer: { status: 201, description: 'Signed in.', json: signedInPerson },
  problems: ['wrong-sign-in', 'slow-down'],
})

export const whoAmI = declare({
  method: 'GET',
  path: '/api/v1/session',
  operation: 'whoAmI',
  summary: 'Who is signed in here.',
  admission: 'person',
  answer: { status: 200, description: 'The person.', json: signedInPerson },
})

export const renewSession = declare({
  method: 'PUT',
  path: '/api/v1/session',
  operation: 'renewSession',
  summary: 'Keep the session alive; asked for every hour while a page is visible.',
  admission: 'session',
  answer: { status: 200, description: 'Renewed where a day of it was used up.', json: signedInPerson },
})

export const signOut = declare({
  method: 'DELETE',
  path: '/api/v1/session',
  operation: 'signOut',
  summary: 'Sign out; ends the session everywhere at once.',
  admission: 'session',
  answer: { status: 204, description: 'Signed out.' },
})
