import { afterAll, beforeAll, beforeEach, expect, test, vi } from 'vitest'
import type { Revoked } from '../../lib/access/service'
import { cookieOf, from, OWNER, ownedWorld, signedIn } from './world'

let world: Awaited<ReturnType<typeof ownedWorld>>
let revoked: Revoked[]
beforeAll(async () => {
  world = await ownedWorld()
  world.access.onRevoked((what) => revoked.push(what))
})
beforeEach(() => {
  revoked = []
})
afterAll(async () => {
  expect(world.logged).toEqual([])
  await world.close()
})

test('[W3.41] a person with the right password is known by the cookie', async () => {
  const { identity, headers, cookies } = await signedIn(world.access, 'OWNER@example.com ', OWNER.password)
  expect(identity).toMatchObject({ person: world.owner.id, name: OWNER.name, administrator: true, via: 'cookie' })
  expect(await world.access.identify(headers)).toEqual(identity)
  expect(world.access.valid(identity)).toBe(true)
  expect(cookies).toHaveLength(1)
  expect(cookies[0]).toMatch(/^halfbaud\.session_token=/)
  expect(cookies[0]).toMatch(/HttpOnly/i)
  expect(cookies[0]).toMatch(/SameSite=Lax/i)
  expect(cookies[0]).not.toMatch(/Secure/i)
})

test('a wrong password, an unknown address and no cookie are nobody', async () => {
  expect(await world.access.signIn(OWNER.email, 'not the password', from('192.0.2.1'))).toBeNull()
  expect(await world.access.signIn('nobody@example.com', OWNER.password, from('192.0.2.1'))).toBeNull()
  expect(await world.access.signIn('not an address', OWNER.password, from('192.0.2.1'))).toBeNull()
  expect(await world.access.signIn(OWNER.email, 'x'.repeat(5000), from('192.0.2.1'))).toBeNull()
  expect(await world.access.identify(from('192.0.2.1'))).toBeNull()
})

test('a changed cookie is nobody', async () => {
  const { headers } = await signedIn(world.access, OWNER.email, OWNER.password)
  const cookie = headers.get('cookie') ?? ''
  const forged = cookie.replace(/=(.)/, (_, first) => `=${first === 'A' ? 'B' : 'A'}`)
  expect(forged).not.toBe(cookie)
  expect(await world.access.identify(from('192.0.2.1', { cookie: forged }))).toBeNull()
})

test('over https the cookie is Secure', async () => {
  const secure = await ownedWorld({ publicUrl: 'https://budgets.example.com' })
  const { cookies } = await signedIn(secure.access, OWNER.email, OWNER.password)
  expect(cookies[0]).toMatch(/^__Secure-halfbaud\.session_token=/)
  expect(cookies[0]).toMatch(/; Secure/i)
  await secure.close()
})

test('[W3.42] sign-out ends the session at once, tells of it, and clears the cookie', async () => {
  const { identity, headers } = await signedIn(world.access, OWNER.email, OWNER.password)
  const { cookies } = await world.access.signOut(identity, headers)
  expect(world.access.valid(identity)).toBe(false)
  expect(revoked).toContainEqual({ session: identity.session })
  expect(cookies.find((line) => line.startsWith('halfbaud.session_token='))).toMatch(/Max-Age=0/)
  expect(await world.access.identify(headers)).toBeNull()
})

test('[W3.43] a changed password ends every session of the person and none of others', async () => {
  const email = 'ada@example.com'
  const first = (await world.access.addPerson({ name: 'Ada', email }))?.password ?? ''
  const other = await signedIn(world.access, OWNER.email, OWNER.password)
  const here = await signedIn(world.access, email, first)
  const elsewhere = await signedIn(world.access, email, first, '192.0.2.77')
  const next = 'quite another long one'
  const changed = await world.access.changePassword(here.identity, first, next, here.headers)
  if (!changed || !('cookies' in changed)) throw new Error('not changed')
  expect(world.access.valid(elsewhere.identity)).toBe(false)
  expect(world.access.valid(here.identity)).toBe(false)
  expect(world.access.valid(other.identity)).toBe(true)
  expect(revoked).toContainEqual({ session: elsewhere.identity.session })
  expect(await world.access.identify(elsewhere.headers)).toBeNull()
  const renewed = await world.access.identify(from('192.0.2.1', { cookie: cookieOf(changed.cookies) }))
  expect(renewed?.email).toBe(email)
  expect(renewed && world.access.valid(renewed)).toBe(true)
  expect(await world.access.signIn(email, first, from('192.0.2.1'))).toBeNull()
  await signedIn(world.access, email, next)
})

test('a password is not changed with a wrong current one, nor to one that is too short', async () => {
  const { identity, headers } = await signedIn(world.access, OWNER.email, OWNER.password)
  expect(
    await world.access.changePassword(identity, 'a wrong current one', 'quite another long one', headers),
  ).toBeNull()
  expect(await world.access.changePassword(identity, OWNER.password, 'short', headers)).toEqual({
    refused: 'Use at least 12 characters; a few unrelated words do.',
  })
  expect(world.access.valid(identity)).toBe(true)
})

test('signing in ends the session that this browser had before', async () => {
  const first = await signedIn(world.access, OWNER.email, OWNER.password)
  const again = await world.access.signIn(OWNER.email, OWNER.password, first.headers)
  expect(again).not.toBeNull()
  expect(world.access.valid(first.identity)).toBe(false)
})

test('a session that has run out is not valid, and is told of when it is read again', async () => {
  const { identity, headers } = await signedIn(world.access, OWNER.email, OWNER.password)
  const left = (identity.expiresAt ?? 0) - world.now()
  expect(left).toBeGreaterThan(6.99 * 86_400_000)
  world.advance(left - 1)
  expect(world.access.valid(identity)).toBe(true)
  world.advance(1)
  expect(world.access.valid(identity)).toBe(false)
  expect(await world.access.identify(headers)).toBeNull()
  await world.access.reread()
  expect(revoked).toContainEqual({ session: identity.session })
  world.advance(-left)
})

test('a session is renewed once a day of it is used up, and asking who one is renews nothing', async () => {
  const { identity, headers } = await signedIn(world.access, OWNER.email, OWNER.password)
  const expiry = identity.expiresAt ?? 0
  expect(expiry - Date.now()).toBeGreaterThan(6.99 * 86_400_000)
  vi.useFakeTimers({ toFake: ['Date'], now: Date.now() + 2 * 86_400_000 })
  try {
    expect((await world.access.identify(headers))?.expiresAt).toBe(expiry)
    const renewed = await world.access.renew(identity, headers)
    expect(renewed?.identity).toMatchObject({ session: identity.session })
    expect((renewed?.identity.expiresAt ?? 0) - expiry).toBeGreaterThan(1.99 * 86_400_000)
    expect(cookieOf(renewed?.cookies ?? [])).toContain('halfbaud.session_token=')
    expect(renewed && world.access.valid(renewed.identity)).toBe(true)
  } finally {
    vi.useRealTimers()
  }
  await world.access.signOut(identity, headers)
  expect(await world.access.renew(identity, headers)).toBeNull()
})
