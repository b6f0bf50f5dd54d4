import { afterAll, beforeAll, describe, expect, test, vi } from 'vitest'
import type { Declaration } from '../../../app/api/declaration'
import { OPERATIONS } from '../../../app/api/operations'
import type { Identity } from '../../../lib/access/identity'
import type { Role } from '../../../lib/sheet/wire'
import type { Services } from '../../../lib/sync/services'
import { call, PUBLIC_URL, publish, type Sent } from './caller'
import { type Found, routeFiles, routes } from './routeFiles'

const found = await routes()
const changing = found.filter(({ method }) => method !== 'GET')
const named = (list: Found[]) => list.map((each) => [`${each.method} ${each.path}`, each] as const)

const PERSON: Identity = {
  person: 'p1',
  name: 'Ada',
  email: 'ada@example.com',
  administrator: true,
  session: 's1',
  via: 'cookie',
  expiresAt: null,
}

/** Services that know a person and a role; whatever else a handler asks for counts as having been reached. */
function trap(identity: Identity | null, role: Role | null = 'owner'): Services {
  const reached = (): never => {
    throw new Error('A handler was reached')
  }
  const nothing = new Proxy({}, { get: () => reached })
  const access = new Proxy(
    { identify: async () => identity, role: async () => role },
    { get: (target, name) => Reflect.get(target, name) ?? reached },
  )
  return {
    publicUrl: PUBLIC_URL,
    engine: 'x',
    demo: false,
    access,
    budgets: nothing,
    evidence: nothing,
    submit: reached,
    ready: reached,
  } as never
}

/** A body of the type that the operation takes; what is in it comes after the checks that are tested here. */
function typed({ body }: Declaration): Sent {
  if (!body) return {}
  return 'upload' in body
    ? { raw: 'x', query: { name: 'a.txt' }, headers: { 'content-type': body.upload[0] ?? '' } }
    : { raw: '{}', headers: { 'content-type': 'application/json', 'idempotency-key': 'key-of-a-test' } }
}

const withHeaders = (sent: Sent, headers: Sent['headers']): Sent => ({
  ...sent,
  headers: { ...sent.headers, ...headers },
})

beforeAll(() => {
  vi.spyOn(console, 'error').mockImplementation(() => {})
})
afterAll(() => {
  publish(undefined)
  vi.restoreAllMocks()
})

test('there are as many routes as the API has operations, each where its declaration says', async () => {
  expect(found.length).toBeGreaterThan(20)
  const inFiles = found.map(({ path, method }) => `${method} ${path}`).sort()
  expect(inFiles).toEqual(OPERATIONS.map(({ path, method }) => `${method} ${path}`).sort())
  for (const { route, path, method, file } of found) {
    expect(route.declaration, file).toBeDefined()
    expect(route.declaration.path).toBe(path)
    expect(route.declaration.method).toBe(method)
    expect(OPERATIONS).toContain(route.declaration)
  }
})

test('a route file exports handlers and dynamic, nothing else', async () => {
  for (const { file, exports } of await routeFiles()) {
    const { dynamic, ...handlers } = exports
    expect(dynamic, file).toBe('force-dynamic')
    for (const name of Object.keys(handlers)) expect(['GET', 'POST', 'PUT', 'DELETE'], file).toContain(name)
  }
})

describe.each(named(changing))('[W3.53] %s', (_, { route }) => {
  const sent = typed(route.declaration)

  test.each([
    ['a foreign origin', { origin: 'https://evil.example.com' }],
    ['an origin that only starts like ours', { origin: `${PUBLIC_URL}.evil.example.com` }],
    ['our origin with another port', { origin: 'http://127.0.0.1:3001' }],
    ['the origin null', { origin: 'null' }],
    ['no origin', { origin: null }],
    ['no origin, and the browser says cross-site', { origin: null, 'sec-fetch-site': 'cross-site' }],
    ['no origin, and the browser says same-site', { origin: null, 'sec-fetch-site': 'same-site' }],
    [
      'a foreign origin that claims to be same-origin',
      { origin: 'https://evil.example.com', 'sec-fetch-site': 'same-origin' },
    ],
  ])('is refused with %s', async (_name, headers) => {
    publish(trap(PERSON))
    expect((await call(route, withHeaders(sent, headers))).code).toBe('other-site')
  })

  test('gets past that check from our own page', async () => {
    publish(trap(PERSON))
    expect((await call(route, sent)).code).not.toBe('other-site')
    const noOrigin = withHeaders(sent, { origin: null, 'sec-fetch-site': 'same-origin' })
    expect((await call(route, noOrigin)).code).not.toBe('other-site')
  })
})

const closed = found.filter(({ route }) => route.declaration.admission !== 'open')
test.each(named(closed))('%s needs somebody who is signed in', async (_, { route }) => {
  publish(trap(null))
  expect((await call(route, typed(route.declaration))).code).toBe('not-signed-in')
})

test('only signing in, becoming the first owner, health and this document are open', () => {
  const open = found.filter(({ route }) => route.declaration.admission === 'open')
  expect(open.map(({ route }) => route.declaration.operation).sort()).toEqual([
    'createOwner',
    'health',
    'openapi',
    'signIn',
  ])
})

const ofBudgets = found.filter(({ path }) => path.startsWith('/api/v1/budgets/{id}'))
test('every operation on one budget asks for a role', () => {
  expect(ofBudgets.length).toBeGreaterThan(8)
  for (const { route } of ofBudgets) expect(typeof route.declaration.admission).toBe('object')
})

test.each(named(ofBudgets))('%s does not tell an unknown budget from a foreign one', async (_, { route }) => {
  publish(trap(PERSON, null))
  const answers = []
  for (const sent of [typed(route.declaration), { raw: route.declaration.method === 'GET' ? undefined : 'no json' }]) {
    for (const id of ['unknown', 'foreign']) answers.push(await call(route, { ...sent, params: { id } }))
  }
  for (const answer of answers) expect(answer.json).toEqual(answers[0]?.json)
  expect(answers[0]?.code).toBe('not-found')
})

test.each(named(ofBudgets.filter(({ method }) => method !== 'GET')))(
  '%s is refused to a viewer',
  async (_, { route }) => {
    publish(trap(PERSON, 'viewer'))
    expect((await call(route, typed(route.declaration))).code).toBe('not-allowed')
  },
)

test.each(named(ofBudgets.filter(({ path }) => path.includes('{person}'))))(
  '%s is refused to an approver',
  async (_, { route }) => {
    publish(trap(PERSON, 'approver'))
    expect((await call(route, typed(route.declaration))).code).toBe('not-allowed')
  },
)

const withBody = changing.filter(({ route }) => route.declaration.body)
test.each(named(withBody))('%s takes only its own content type', async (_, { route }) => {
  publish(trap(PERSON))
  const sent = typed(route.declaration)
  const types = [
    'text/plain',
    'application/x-www-form-urlencoded',
    'multipart/form-data; boundary=b',
    'application/jsonp',
    null,
  ]
  for (const type of types) {
    const { code } = await call(route, withHeaders(sent, { 'content-type': type }))
    expect(code, String(type)).toBe('content-type')
  }
})

test.each(named(withBody))('%s refuses a body over its limit before reading it', async (_, { route }) => {
  publish(trap(PERSON))
  const sent = withHeaders(typed(route.declaration), { 'content-length': String(200 * 1024 * 1024) })
  const { code } = await call(route, sent)
  expect(code).toBe('too-large')
})

const bySession = found.filter(({ route }) => route.declaration.admission === 'session')
test.each(named(bySession))('%s is not for tokens', async (_, { route }) => {
  publish(trap({ ...PERSON, via: 'token' }))
  const answer = await call(route, withHeaders(typed(route.declaration), { origin: null }))
  expect(answer.code).toBe('needs-session')
})

test.each(named(found.filter(({ route }) => route.declaration.admission === 'administrator')))(
  '%s is for the administrator',
  async (_, { route }) => {
    publish(trap({ ...PERSON, administrator: false }))
    expect((await call(route, typed(route.declaration))).code).toBe('needs-administrator')
  },
)

test.each(named(found))('%s says so while the server is not ready', async (_, { route }) => {
  publish(undefined)
  expect((await call(route, typed(route.declaration))).code).toBe('not-ready')
})
