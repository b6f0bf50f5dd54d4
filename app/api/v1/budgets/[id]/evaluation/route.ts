import { Problem } from '../../../../problem'
import { read } from '../../../../wrapper'
import { readEvaluation } from './declaration'

export const dynamic = 'force-dynamic'

export const GET = read(readEvaluation, async ({ services, params }) => {
  const result = await services.budgets.evaluation(params.id)
  if (!result) throw new Problem('budget-locked')
  return { json: result }
})
