import { Problem } from '../../../../problem'
import { read } from '../../../../wrapper'
import { readTrail } from './declaration'

export const dynamic = 'force-dynamic'

export const GET = read(readTrail, async ({ services, params, query }) => {
  const { after, before, limit } = query
  const entries = await services.budgets.trail(params.id, after === undefined ? { before, limit } : { after, limit })
  if (!entries) throw new Problem('budget-locked')
  return { json: { entries } }
})
