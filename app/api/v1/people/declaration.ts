import { z } from 'zod'
import { declare } from '../../declaration'
import { email, person, shortText } from '../../schemas/people'

export const listPeople = declare({
  method: 'GET',
  path: '/api/v1/people',
  operation: 'listPeople',
  summary: 'Everybody who has an account here.',
  admission: 'person',
  answer: { status: 200, description: 'The people.', json: z.strictObject({ people: z.array(person) }) },
})

export const addPerson = declare({
  method: 'POST',
  path: '/api/v1/people',
  operation: 'addPerson',
  summary: 'Give somebody an account.',
  admission: 'administrator',
  body: { json: z.strictObject({ name: shortText(120, 'Name, as signatures will show it.'), email }) },
  answer: {
    status: 201,
    description: 'The person, and a first password to hand over; it is shown this once.',
    json: z.strictObject({ person, password: z.string() }),
  },
  problems: ['e-mail-taken'],
})
