import { PROBLEMS, type ProblemCode } from './problems'

/** One field that cannot be taken: where it is ('edits[3].value'), and what to do. */
export type FieldProblem = { readonly field: string; readonly todo: string }

type More = {
  /** What is particular to this case, in a sentence. */
  readonly detail?: string
  readonly errors?: readonly FieldProblem[]
  readonly instance?: string
  readonly retryAfterS?: number
  /** Why the gate refused an edit (lib/sheet/wire). */
  readonly refusal?: string
}

/** Thrown by handlers, answered by the wrapper as problem details (RFC 9457). */
export class Problem extends Error {
  constructor(
    readonly code: ProblemCode,
    readonly more: More = {},
  ) {
    super(code)
  }
}

export function problemResponse({ code, more }: Problem): Response {
  const { status, title, todo } = PROBLEMS[code]
  const { retryAfterS, ...shown } = more
  const body = { type: `urn:halfbaud:problem:${code}`, title, status, code, todo, ...shown }
  const headers = new Headers({ 'content-type': 'application/problem+json' })
  if (retryAfterS !== undefined) headers.set('retry-after', String(retryAfterS))
  if (code === 'not-signed-in') headers.set('www-authenticate', 'Bearer')
  return new Response(JSON.stringify(body), { status, headers })
}
