import { doorOf } from '../../../../door'
import { change } from '../../../../wrapper'
import { editBudget } from './declaration'
import { operationsOf } from './operations'
import { problemOf } from './refusals'

export const dynamic = 'force-dynamic'

export const POST = change(editBudget, async ({ services, identity, params, headers, body }) => {
  const result = await services.submit(params.id, identity, doorOf(identity), {
    editId: headers['idempotency-key'],
    operations: operationsOf(body.edits),
    expectedSeq: body.expectedSeq,
  })
  if ('code' in result) throw problemOf(result)
  return { json: result }
})
