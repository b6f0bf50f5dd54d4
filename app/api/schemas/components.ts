import { z } from 'zod'

/** Schemas that openapi.json gives a name of their own, wherever they are used. */
export const components = new Map<z.ZodType, string>()

export function component<S extends z.ZodType>(name: string, schema: S): S {
  components.set(schema, name)
  return schema
}

export const time = z.number().int().meta({ description: 'Milliseconds since 1970-01-01 UTC.' })
export const seq = z.number().int().min(0).meta({ description: "Number of an entry in the budget's trail, from 1." })
export const sha256 = z
  .string()
  .regex(/^[0-9a-f]{64}$/)
  .meta({ description: 'SHA-256 in hexadecimal.' })
export const role = z.enum(['viewer', 'editor', 'approver', 'owner']).meta({
  description: 'viewer reads, editor writes, approver also seals and signs, owner also members and deletion.',
})
