import { declare } from '../../declaration'
import { budgetBody } from '../../schemas/budgets'
import { evaluation } from '../../schemas/evaluation'

export const evaluateBudget = declare({
  method: 'POST',
  path: '/api/v1/evaluate',
  operation: 'evaluateBudget',
  summary: 'Evaluate a budget file without keeping it.',
  admission: 'person',
  body: budgetBody,
  answer: { status: 200, description: 'What the budget comes to.', json: evaluation },
})
