import { doorOf } from '../../../door'
import { Problem } from '../../../problem'
import { change } from '../../../wrapper'
import { makeFromExample } from './declaration'

export const dynamic = 'force-dynamic'

export const POST = change(makeFromExample, async ({ services, identity, params }) => {
  const made = await services.examples.make(identity, doorOf(identity), params.id)
  if (!made) throw new Problem('not-found')
  return { json: made, headers: { location: `/api/v1/budgets/${made.id}` } }
})
