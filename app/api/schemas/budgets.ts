import { z } from 'zod'
import { parseBudget } from '../../../lib/budget/parse'
import { budgetSchema, VERDICTS } from '../../../lib/budget/schema'
import type { JsonBody } from '../declaration'
import { Problem } from '../problem'
import { component, role, seq, sha256, time } from './components'

export const budget = component('Budget', budgetSchema)

/** A budget file as a body: judged by lib/budget, whose sentences name the record and the field. */
export const budgetBody: JsonBody<typeof budgetSchema> = {
  json: budget,
  limit: 4 * 1024 * 1024,
  parse: (value) => {
    const parsed = parseBudget(value)
    if ('budget' in parsed) return parsed.budget
    const errors = parsed.issues.map(({ path, message }) => ({ field: path === '' ? 'body' : path, todo: message }))
    throw new Problem('invalid-fields', { errors })
  },
}

export const budgetState = component(
  'BudgetState',
  z.strictObject({
    id: z.string(),
    epoch: z.number().int().meta({ description: "One life of the budget's document." }),
    seq,
    head: sha256.meta({ description: "Hash of the trail's last entry." }),
    budget,
  }),
)

export const budgetSummary = component(
  'BudgetSummary',
  z.strictObject({
    id: z.string(),
    name: z.string(),
    description: z.string(),
    role,
    verdict: z.enum(VERDICTS),
    words: z.string().nullable().meta({ description: 'The verdict of the allowance that decides, in words.' }),
    marginDb: z.number().nullable().meta({ description: 'Its margin in decibels; null: unknown.' }),
    seq,
    lastChange: z.strictObject({ personName: z.string(), time }).nullable(),
    locked: z.string().nullable().meta({ description: 'Why the budget cannot be served, and what to do.' }),
  }),
)
