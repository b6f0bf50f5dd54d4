import { evaluate } from '../../../../lib/budget/evaluate'
import { change } from '../../wrapper'
import { evaluateBudget } from './declaration'

export const dynamic = 'force-dynamic'

export const POST = change(evaluateBudget, ({ body }) => ({ json: evaluate(body, new Map()) }))
