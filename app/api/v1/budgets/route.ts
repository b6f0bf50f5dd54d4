import type { BudgetSummary } from '../../../../lib/sync/services'
import { doorOf } from '../../door'
import { change, read } from '../../wrapper'
import { createBudget, listBudgets } from './declaration'

export const dynamic = 'force-dynamic'

export const GET = read(listBudgets, async ({ services, identity }) => ({
  json: { budgets: (await services.budgets.list(identity)).map(shown) },
}))

export const POST = change(createBudget, async ({ services, identity, body }) => {
  const { id } = await services.budgets.create(identity, doorOf(identity), body)
  return { json: { id }, headers: { location: `/api/v1/budgets/${id}` } }
})

/** The evaluation as a whole is at …/evaluation; the list says what decides. */
function shown({ evaluation, ...summary }: BudgetSummary) {
  const deciding = evaluation.allowances.find(({ verdict }) => verdict === evaluation.verdict)
  return { ...summary, words: deciding?.words ?? null, marginDb: deciding?.marginDb ?? null }
}
