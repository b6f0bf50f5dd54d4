/** A problem of the API (RFC 9457), in the words that go beside the fields. */
export type ApiProblem = {
  readonly code: string
  /** What happened and what to do. */
  readonly sentence: string
  /** Field → what to do about it. */
  readonly fields: Readonly<Record<string, string>>
}

export type Answer =
  | { readonly ok: true; readonly json: unknown }
  | { readonly ok: false; readonly problem: ApiProblem }

/** Calls our own API with the session's cookie. Never throws: a server that does not answer is a problem like any other. */
export async function callApi(method: string, path: string, body?: unknown): Promise<Answer> {
  let response: Response
  try {
    response = await fetch(path, {
      method,
      cache: 'no-store',
      ...(body === undefined ? {} : { headers: { 'content-type': 'application/json' }, body: JSON.stringify(body) }),
    })
  } catch {
    return failed('no-answer', 'The server does not answer. Check the connection and try again.')
  }
  const json = await jsonOf(response)
  if (response.ok) return { ok: true, json }
  return { ok: false, problem: problemOf(json, response) }
}

async function jsonOf(response: Response): Promise<unknown> {
  try {
    return await response.json()
  } catch {
    return null
  }
}

function failed(code: string, sentence: string): Answer {
  return { ok: false, problem: { code, sentence, fields: {} } }
}

/** @param json what came back; anything may stand before our server, so nothing about it is believed */
export function problemOf(json: unknown, response: Pick<Response, 'status' | 'headers'>): ApiProblem {
  const given = typeof json === 'object' && json !== null ? (json as Record<string, unknown>) : {}
  const text = (key: string) => (typeof given[key] === 'string' ? given[key] : '')
  const code = text('code') || `status-${response.status}`
  const fields: Record<string, string> = {}
  for (const error of Array.isArray(given.errors) ? given.errors : []) {
    const { field, todo } = (error ?? {}) as { field?: unknown; todo?: unknown }
    if (typeof field === 'string' && typeof todo === 'string') fields[field] ??= todo
  }
  if (Object.keys(fields).length > 0) {
    return { code, sentence: 'Some fields cannot be taken; what to do stands beside each.', fields }
  }
  const wait = response.headers.get('retry-after')
  const todo = code === 'slow-down' && wait ? `Wait ${wait} seconds, then try again.` : text('detail') || text('todo')
  const title = text('title') || `The server answered with status ${response.status}`
  return { code, sentence: [`${title}.`, todo || 'Try again, or tell the administrator.'].join(' '), fields }
}
