import { z } from 'zod'
import { declare } from '../../../declaration'
import { budgetState } from '../../../schemas/budgets'

export const readBudget = declare({
  method: 'GET',
  path: '/api/v1/budgets/{id}',
  operation: 'readBudget',
  summary:
    'The budget as a file, and where its trail stands. ETag changes with every entry; If-None-Match is answered 304.',
  admission: { role: 'viewer' },
  headers: z.object({ 'if-none-match': z.string().optional() }),
  answer: { status: 200, description: 'The budget.', json: budgetState },
  also: [{ status: 304, description: 'No entry since.' }],
  problems: ['budget-locked'],
})
