import { z } from 'zod'
import { declare } from '../../../../declaration'
import { component, role } from '../../../../schemas/components'
import { person } from '../../../../schemas/people'

const member = component('Member', z.strictObject({ person, role }))

export const listMembers = declare({
  method: 'GET',
  path: '/api/v1/budgets/{id}/members',
  operation: 'listMembers',
  summary: 'Who may do what in the budget.',
  admission: { role: 'viewer' },
  answer: { status: 200, description: 'The members.', json: z.strictObject({ members: z.array(member) }) },
})
