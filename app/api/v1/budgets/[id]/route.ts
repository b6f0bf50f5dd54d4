import { Problem } from '../../../problem'
import { read } from '../../../wrapper'
import { readBudget } from './declaration'

export const dynamic = 'force-dynamic'

export const GET = read(readBudget, async ({ services, params, headers }) => {
  const state = await services.budgets.read(params.id)
  if (!state) throw new Problem('budget-locked')
  const etag = `"${state.epoch}-${state.seq}-${state.head}"`
  if (headers['if-none-match'] === etag) return new Response(null, { status: 304, headers: { etag } })
  return { json: { id: params.id, ...state }, headers: { etag } }
})
