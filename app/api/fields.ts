import type { z } from 'zod'
import { type FieldProblem, Problem } from './problem'

/** @throws Problem 'invalid-fields' that names each field and what to do about it */
export function parseFields<S extends z.ZodType>(schema: S, value: unknown): z.output<S> {
  const result = schema.safeParse(value)
  if (result.success) return result.data
  throw new Problem('invalid-fields', { errors: result.error.issues.flatMap((issue) => described(issue, [])) })
}

function described(issue: z.core.$ZodIssue, above: readonly PropertyKey[]): FieldProblem[] {
  const path = [...above, ...issue.path]
  if (issue.code === 'invalid_union' && issue.errors.length > 0) return nearest(issue.errors, path)
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({ field: nameOf([...path, key]), todo: 'Leave it out; there is no such field.' }))
  }
  const message = issue.code === 'invalid_key' ? (issue.issues[0]?.message ?? issue.message) : issue.message
  return [{ field: nameOf(path), todo: message }]
}

/** Of the shapes that a value could have had, the one that it misses by least. */
function nearest(shapes: readonly (readonly z.core.$ZodIssue[])[], path: readonly PropertyKey[]): FieldProblem[] {
  const problems = shapes.map((issues) => issues.flatMap((issue) => described(issue, path)))
  return problems.reduce((best, next) => (next.length < best.length ? next : best))
}

/** ['edits', 3, 'value'] → 'edits[3].value' */
function nameOf(path: readonly PropertyKey[]): string {
  const name = path.reduce<string>(
    (text, key) => (typeof key === 'number' ? `${text}[${key}]` : text === '' ? String(key) : `${text}.${String(key)}`),
    '',
  )
  return name === '' ? 'body' : name
}
