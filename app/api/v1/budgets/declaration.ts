import { z } from 'zod'
import { declare } from '../../declaration'
import { budgetBody, budgetSummary } from '../../schemas/budgets'

export const listBudgets = declare({
  method: 'GET',
  path: '/api/v1/budgets',
  operation: 'listBudgets',
  summary: 'The budgets that one is a member of.',
  admission: 'person',
  answer: { status: 200, description: 'The budgets.', json: z.strictObject({ budgets: z.array(budgetSummary) }) },
})

export const createBudget = declare({
  method: 'POST',
  path: '/api/v1/budgets',
  operation: 'createBudget',
  summary: 'Make a budget from a budget file; one becomes its owner.',
  admission: 'person',
  body: budgetBody,
  answer: { status: 201, description: 'Made; Location names it.', json: z.strictObject({ id: z.string() }) },
})
