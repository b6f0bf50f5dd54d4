import type { z } from 'zod'
import type { Role } from '../../lib/sheet/wire'
import type { ProblemCode } from './problems'

/** Who may call: anybody; a person by cookie or token; a person by cookie only; the administrator; a member with this role. */
export type Admission = 'open' | 'person' | 'session' | 'administrator' | { readonly role: Role }

/** JSON of this shape; limit in bytes, else 64 kB. `parse` stands in for the schema's own reading where it says more. */
export type JsonBody<S extends z.ZodType = z.ZodType> = {
  readonly json: S
  readonly limit?: number
  readonly parse?: (value: unknown) => z.output<S>
}
/** Raw bytes of one of these media types; limit in bytes. */
export type UploadBody = { readonly upload: readonly string[]; readonly limit: number }

export type Answer = {
  readonly status: number
  readonly description: string
  /** Shape of the JSON, or the media type of raw bytes; neither: no body. */
  readonly json?: z.ZodType
  readonly mediaType?: string
}

/**
 * One operation of the API, said once: the wrapper enforces it and openapi.json is written from it. The problems are those
 * beside the ones that follow from the rest (see problemsOf).
 */
export type Declaration<
  P extends string = string,
  A extends Admission = Admission,
  Q extends z.ZodObject = z.ZodObject,
  H extends z.ZodObject = z.ZodObject,
  B extends JsonBody | UploadBody | null = JsonBody | UploadBody | null,
> = {
  readonly method: 'GET' | 'POST' | 'PUT' | 'DELETE'
  readonly path: P
  readonly operation: string
  readonly summary: string
  readonly admission: A
  readonly query?: Q
  readonly headers?: H
  readonly body?: B
  readonly answer: Answer
  /** Further answers that are no problems, such as 304. */
  readonly also?: readonly Answer[]
  readonly problems?: readonly ProblemCode[]
}

type None = z.ZodObject<Record<never, never>>

/** Keeps the exact types of a declaration for its handler. */
export function declare<
  const P extends string,
  const A extends Admission,
  Q extends z.ZodObject = None,
  H extends z.ZodObject = None,
  B extends JsonBody | UploadBody | null = null,
>(declaration: Declaration<P, A, Q, H, B>): Declaration<P, A, Q, H, B> {
  return declaration
}

/** '/budgets/{id}' → { id: string } */
export type ParamsOf<P extends string> = P extends `${string}{${infer Name}}${infer Rest}`
  ? Record<Name, string> & ParamsOf<Rest>
  : unknown

/** Every problem that the operation may answer with: its own, and those of the wrapper. */
export function problemsOf(declaration: Declaration): ProblemCode[] {
  const { admission, method, query, headers, body, problems = [] } = declaration
  const codes = new Set<ProblemCode>(problems)
  if (admission !== 'open') codes.add('not-signed-in')
  if (admission === 'session') codes.add('needs-session')
  if (admission === 'administrator') codes.add('needs-administrator')
  if (typeof admission === 'object') codes.add('not-found')
  if (typeof admission === 'object' && admission.role !== 'viewer') codes.add('not-allowed')
  if (method !== 'GET') codes.add('other-site')
  if (query || headers) codes.add('invalid-fields')
  if (body) codes.add('content-type').add('too-large')
  if (body && 'json' in body) codes.add('bad-json').add('invalid-fields')
  return [...codes.add('not-ready').add('internal')]
}
