import { z } from 'zod'
import type { PersonSummary, TokenSummary } from '../../../lib/sync/services'
import { component, time } from './components'

export const person = component(
  'Person',
  z.strictObject({
    id: z.string(),
    name: z.string(),
    email: z.string(),
  }) satisfies z.ZodType<PersonSummary>,
)

export const signedInPerson = component(
  'SignedInPerson',
  z.strictObject({
    person,
    administrator: z.boolean().meta({ description: 'May add people.' }),
    via: z.enum(['cookie', 'token']),
    expiresAt: time.nullable(),
  }),
)

export const token = component(
  'Token',
  z.strictObject({
    id: z.string(),
    name: z.string(),
    createdAt: time,
    expiresAt: time.nullable(),
    lastUsedAt: time.nullable(),
  }) satisfies z.ZodType<TokenSummary>,
)

/** Control characters, and halves of a pair, which no UTF-8 can hold. */
const UNPRINTABLE = /[\p{Cc}\p{Cs}]/u

/** A line of text that a person types: no control characters, no spaces around it. */
export function shortText(most: number, what: string) {
  return z
    .string()
    .trim()
    .min(1, 'Type something.')
    .max(most, `Use at most ${most} characters.`)
    .refine((text) => !UNPRINTABLE.test(text), 'Leave line breaks and control characters out.')
    .meta({ description: what })
}

export const email = z
  .email('Type an e-mail address, such as ada@example.com.')
  .max(200, 'Use at most 200 characters.')
  .meta({ description: 'E-mail address.' })

/** Length and the rest are judged by lib/access/passwords; here only what no password is. */
export const password = z.string().max(1000, 'Use at most 128 characters.')
