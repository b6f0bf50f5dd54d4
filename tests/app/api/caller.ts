import { expect } from 'vitest'
import { type Declaration, problemsOf } from '../../../app/api/declaration'
import { PROBLEMS, type ProblemCode } from '../../../app/api/problems'
import type { Route } from '../../../app/api/wrapper'
import type { Services } from '../../../lib/sync/services'

export const PUBLIC_URL = 'http://127.0.0.1:3000'

export function publish(services: Services | undefined): void {
  Reflect.set(globalThis, Symbol.for('halfbaud.services'), services)
}

export type Sent = {
  readonly params?: Record<string, string>
  readonly query?: Record<string, string>
  readonly json?: unknown
  readonly raw?: BodyInit
  /** Null takes a header away that is sent otherwise. */
  readonly headers?: Record<string, string | null>
}

export type Answered = {
  readonly status: number
  readonly headers: Headers
  readonly json: unknown
  /** The problem's code, where it is one. */
  readonly code: ProblemCode | null
  readonly response: Response
}

/** A request as a page of this server sends it, unless the test says otherwise. */
export function requestOf({ method, path }: Declaration, sent: Sent): Request {
  const filled = path.replace(/\{(\w+)\}/g, (_, name) => encodeURIComponent(sent.params?.[name] ?? 'x'))
  const url = new URL(filled, PUBLIC_URL)
  for (const [name, value] of Object.entries(sent.query ?? {})) url.searchParams.set(name, value)
  const headers = new Headers()
  if (method !== 'GET') headers.set('origin', PUBLIC_URL)
  if (sent.json !== undefined) headers.set('content-type', 'application/json')
  for (const [name, value] of Object.entries(sent.headers ?? {})) {
    if (value === null) headers.delete(name)
    else headers.set(name, value)
  }
  const body = sent.json === undefined ? sent.raw : JSON.stringify(sent.json)
  return new Request(url, { method, headers, body, ...(body !== undefined && { duplex: 'half' }) } as RequestInit)
}

/**
 * Calls a route and holds its answer against its own declaration: the status and shape that it declares, or a problem of the
 * closed list that it declares, and never anything that a cache may keep.
 */
export async function call(route: Route, sent: Sent = {}): Promise<Answered> {
  const { declaration } = route
  const params = { ...sent.params }
  for (const [, name] of declaration.path.matchAll(/\{(\w+)\}/g)) params[name ?? ''] ??= 'x'
  const response = await route(requestOf(declaration, sent), { params: Promise.resolve(params) })
  const { status, headers } = response
  expect(headers.get('cache-control')).toBe('no-store')
  expect(headers.get('x-content-type-options')).toBe('nosniff')
  if (headers.get('content-type')?.startsWith('application/problem+json')) {
    const json = (await response.json()) as { code: ProblemCode; status: number; title: string; todo: string }
    expect(PROBLEMS[json.code], `${json.code} is on the closed list`).toMatchObject({ status, title: json.title })
    expect(problemsOf(declaration), `${declaration.operation} declares ${json.code}`).toContain(json.code)
    expect(json.status).toBe(status)
    return { status, headers, json, code: json.code, response }
  }
  const answer = [declaration.answer, ...(declaration.also ?? [])].find((each) => each.status === status)
  expect(answer, `${declaration.operation} declares ${status}`).toBeDefined()
  const json = answer?.json ? answer.json.parse(await response.json()) : null
  return { status, headers, json, code: null, response }
}
