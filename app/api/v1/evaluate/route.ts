import { WHOLE } from '../../../../lib/budget/evaluate'
import { change } from '../../wrapper'
import { evaluateBudget } from './declaration'

export const dynamic = 'force-dynamic'

export const POST = change(evaluateBudget, async ({ body, services }) => ({
  json: await services.evaluate(body, WHOLE),
}))
