import { createHash } from 'node:crypto'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { from, OWNER, ownedWorld, signedIn } from './world'

let world: Awaited<ReturnType<typeof ownedWorld>>
beforeAll(async () => {
  world = await ownedWorld()
})
afterAll(async () => {
  expect(world.logged).toEqual([])
  await world.close()
})

async function withToken(expiresAt: number | null = null) {
  const { identity, headers } = await signedIn(world.access, OWNER.email, OWNER.password)
  const { token, summary } = await world.access.createToken(identity, 'build server', expiresAt)
  return { token, summary, cookie: headers.get('cookie') ?? '', identity }
}

const bearer = (token: string, more: Record<string, string> = {}) =>
  from('192.0.2.1', { authorization: `Bearer ${token}`, ...more })

test('[W3.44] a token is its person, and only its SHA-256 is kept', async () => {
  const { token, summary } = await withToken()
  expect(token).toMatch(/^hb_[A-Za-z0-9_-]{43}$/)
  expect(Buffer.from(token.slice(3), 'base64url')).toHaveLength(32)
  const identity = await world.access.identify(bearer(token))
  expect(identity).toMatchObject({ person: world.owner.id, via: 'token', session: summary.id, expiresAt: null })
  expect(identity && world.access.valid(identity)).toBe(true)
  const kept = (await world.records.tokens.forPerson(world.owner.id)).find(({ id }) => id === summary.id)
  expect(kept?.sha256).toBe(createHash('sha256').update(token).digest('hex'))
  expect(JSON.stringify(kept)).not.toContain(token.slice(3))
})

test('[W3.45] a request with a bearer takes no cookie', async () => {
  const { cookie } = await withToken()
  expect(await world.access.identify(from('192.0.2.1', { cookie }))).not.toBeNull()
  expect(await world.access.identify(bearer('hb_wrong', { cookie }))).toBeNull()
  expect(await world.access.identify(bearer('', { cookie }))).toBeNull()
})

test('[W3.46] a revoked token is dropped at once; only its person can revoke it', async () => {
  const { token, summary } = await withToken()
  const identity = await world.access.identify(bearer(token))
  if (!identity) throw new Error('no identity')
  const told: unknown[] = []
  world.access.onRevoked((what) => told.push(what))
  expect(await world.access.revokeToken('somebody-else', summary.id)).toBe(false)
  expect(world.access.valid(identity)).toBe(true)
  expect(await world.access.revokeToken(world.owner.id, summary.id)).toBe(true)
  expect(world.access.valid(identity)).toBe(false)
  expect(told).toEqual([{ session: summary.id }])
  expect(await world.access.identify(bearer(token))).toBeNull()
  expect(await world.access.revokeToken(world.owner.id, summary.id)).toBe(false)
})

test('a token ends when it expires', async () => {
  const { token } = await withToken(world.now() + 60_000)
  const identity = await world.access.identify(bearer(token))
  expect(identity && world.access.valid(identity)).toBe(true)
  world.advance(60_000)
  expect(identity && world.access.valid(identity)).toBe(false)
  expect(await world.access.identify(bearer(token))).toBeNull()
})

test('the last use of a token is noted, at most once a minute', async () => {
  const { token, summary } = await withToken()
  const lastUse = async () =>
    (await world.access.tokens(world.owner.id)).find(({ id }) => id === summary.id)?.lastUsedAt
  expect(await lastUse()).toBeNull()
  await world.access.identify(bearer(token))
  await expect.poll(lastUse).toBeTypeOf('number')
  const first = (await lastUse()) ?? 0
  world.advance(30_000)
  await world.access.identify(bearer(token))
  expect(await lastUse()).toBe(first)
  world.advance(30_001)
  await world.access.identify(bearer(token))
  await expect.poll(lastUse).toBeGreaterThan(first)
})

test('a token lives on when the password is changed, since it is no session', async () => {
  const added = await world.access.addPerson({ name: 'Ada', email: 'ada@example.com' })
  const { identity, headers } = await signedIn(world.access, 'ada@example.com', added?.password ?? '')
  const { token } = await world.access.createToken(identity, 'build server', null)
  await world.access.changePassword(identity, added?.password ?? '', 'quite another long one', headers)
  expect(world.access.valid(identity)).toBe(false)
  expect(await world.access.identify(bearer(token))).not.toBeNull()
})

test('what another process revokes is dropped when it is read again', async () => {
  const { token, summary, identity } = await withToken()
  const byToken = await world.access.identify(bearer(token))
  await world.records.tokens.remove(world.owner.id, summary.id)
  expect(byToken && world.access.valid(byToken)).toBe(true)
  const told: unknown[] = []
  world.access.onRevoked((what) => told.push(what))
  await world.access.reread()
  expect(byToken && world.access.valid(byToken)).toBe(false)
  expect(world.access.valid(identity)).toBe(true)
  expect(told).toContainEqual({ session: summary.id })
})

test('sessions and tokens of a person who is gone are dropped when they are read again', async () => {
  const { token, identity } = await withToken()
  const byToken = await world.access.identify(bearer(token))
  const people = world.records.people as { byIds: typeof world.records.people.byIds }
  const { byIds } = people
  people.byIds = async (ids) => new Map([...(await byIds(ids))].filter(([id]) => id !== world.owner.id))
  await world.access.reread()
  people.byIds = byIds
  expect(world.access.valid(identity)).toBe(false)
  expect(byToken && world.access.valid(byToken)).toBe(false)
})
