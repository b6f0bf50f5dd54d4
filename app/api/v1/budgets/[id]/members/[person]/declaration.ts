import { z } from 'zod'
import { declare } from '../../../../../declaration'
import { role } from '../../../../../schemas/components'

export const setMember = declare({
  method: 'PUT',
  path: '/api/v1/budgets/{id}/members/{person}',
  operation: 'setMember',
  summary: 'Make somebody a member, or give a member another role.',
  admission: { role: 'owner' },
  body: { json: z.strictObject({ role }) },
  answer: { status: 204, description: 'Done; open pages of that person follow at once.' },
  problems: ['no-such-person', 'last-owner'],
})

export const removeMember = declare({
  method: 'DELETE',
  path: '/api/v1/budgets/{id}/members/{person}',
  operation: 'removeMember',
  summary: 'Take somebody out of the budget.',
  admission: { role: 'owner' },
  answer: { status: 204, description: 'Done; open pages of that person are closed at once.' },
  problems: ['no-such-person', 'last-owner'],
})
