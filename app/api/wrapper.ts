import 'server-only'
import { randomUUID } from 'node:crypto'
import type { z } from 'zod'
import type { Identity } from '../../lib/access/identity'
import type { Services } from '../../lib/sync/services'
import { publishedServices } from '../services'
import { admit } from './admission'
import { bytesOf, JSON_LIMIT, jsonOf, requireMediaType, requireSize } from './body'
import type { Admission, Declaration, JsonBody, ParamsOf, UploadBody } from './declaration'
import { parseFields } from './fields'
import { Problem, problemResponse } from './problem'

/** What a handler is given: everything has been judged as its declaration says. */
export type Call<P extends string, A extends Admission, Q, H, B> = {
  readonly services: Services
  readonly request: Request
  readonly identity: A extends 'open' ? null : Identity
  readonly params: ParamsOf<P>
  readonly query: Q
  readonly headers: H
  readonly body: B extends JsonBody<infer S>
    ? z.output<S>
    : B extends UploadBody
      ? { readonly mediaType: string; readonly bytes: AsyncIterable<Uint8Array> }
      : null
}

/** What a handler answers: JSON with the declared status, or a whole response of its own (files, 304). */
export type Reply = { readonly json?: unknown; readonly headers?: Record<string, string>; readonly cookies?: string[] }

type Handler<P extends string, A extends Admission, Q, H, B> = (
  call: Call<P, A, Q, H, B>,
) => Promise<Reply | Response> | Reply | Response

/** As Next calls it. The declaration comes along for the test that walks all routes. */
export type Route = ((request: Request, context: { params: Promise<object | undefined> }) => Promise<Response>) & {
  readonly declaration: Declaration
}

/** The wrapper of every handler that changes something: POST, PUT and DELETE. */
export function change<
  P extends string,
  A extends Admission,
  Q extends z.ZodObject,
  H extends z.ZodObject,
  B extends JsonBody | UploadBody | null,
>(declaration: Declaration<P, A, Q, H, B>, handler: Handler<P, A, z.output<Q>, z.output<H>, NoInfer<B>>): Route {
  if (declaration.method === 'GET')
    throw new Error(`${declaration.operation}: GET changes nothing; wrap it with read().`)
  return wrap(declaration, handler as Handler<string, Admission, unknown, unknown, unknown>)
}

/** The wrapper of every handler that only reads: GET. */
export function read<P extends string, A extends Admission, Q extends z.ZodObject, H extends z.ZodObject>(
  declaration: Declaration<P, A, Q, H, null>,
  handler: Handler<P, A, z.output<Q>, z.output<H>, null>,
): Route {
  if (declaration.method !== 'GET') throw new Error(`${declaration.operation} is no GET; wrap it with change().`)
  return wrap(declaration, handler as Handler<string, Admission, unknown, unknown, unknown>)
}

function wrap(declaration: Declaration, handler: Handler<string, Admission, unknown, unknown, unknown>): Route {
  const { admission, method, query, headers, body } = declaration
  const answer = async (request: Request, context: { params: Promise<object | undefined> }): Promise<Response> => {
    const services = publishedServices()
    if (!services) throw new Problem('not-ready')
    // Next resolves to nothing where the address has no parameters.
    const params: { id?: string } = (await context.params) ?? {}
    const identity = await admit(services, request, admission, method !== 'GET', params.id)
    const call = {
      services,
      request,
      identity,
      params,
      query: query && parseFields(query, Object.fromEntries(new URL(request.url).searchParams)),
      headers: headers && parseFields(headers, namedHeaders(headers, request.headers)),
      body: body ? await readBody(body, request) : null,
    }
    return toResponse(await handler(call as never), declaration.answer.status)
  }
  const route = async (request: Request, context: { params: Promise<object | undefined> }) =>
    guarded(await answer(request, context).catch((error) => problemResponse(asProblem(error, declaration))))
  return Object.assign(route, { declaration })
}

function namedHeaders(schema: z.ZodObject, headers: Headers): Record<string, string> {
  return Object.fromEntries(
    Object.keys(schema.shape).flatMap((name) => {
      const value = headers.get(name)
      return value === null ? [] : [[name, value]]
    }),
  )
}

async function readBody(body: JsonBody | UploadBody, request: Request): Promise<unknown> {
  const upload = 'upload' in body
  const mediaType = requireMediaType(request.headers, upload ? body.upload : ['application/json'])
  const limit = body.limit ?? JSON_LIMIT
  requireSize(request.headers, limit)
  if (upload) return { mediaType, bytes: bytesOf(request, limit) }
  const value = await jsonOf(request, limit)
  return body.parse ? body.parse(value) : parseFields(body.json, value)
}

function toResponse(reply: Reply | Response, status: number): Response {
  if (reply instanceof Response) return reply
  const headers = new Headers(reply.headers)
  for (const cookie of reply.cookies ?? []) headers.append('set-cookie', cookie)
  return reply.json === undefined
    ? new Response(null, { status, headers })
    : Response.json(reply.json, { status, headers })
}

/** Nothing that the API says is kept by a cache, guessed at, or readable from another site. */
function guarded(response: Response): Response {
  response.headers.set('cache-control', 'no-store')
  response.headers.set('x-content-type-options', 'nosniff')
  response.headers.set('cross-origin-resource-policy', 'same-origin')
  return response
}

/** An error that nobody foresaw is logged under a number and told as that number only: its words may hold secrets. */
function asProblem(error: unknown, { method, path }: Declaration): Problem {
  if (error instanceof Problem) return error
  const id = randomUUID()
  console.error(`${id} ${method} ${path}`, error)
  return new Problem('internal', { instance: `urn:uuid:${id}` })
}
