import { afterAll, afterEach, beforeAll, beforeEach, expect, test, vi } from 'vitest'
import { POST as createOwner } from '../../../app/api/v1/owner/route'
import { POST as changePassword } from '../../../app/api/v1/password/route'
import { POST as addPerson, GET as listPeople } from '../../../app/api/v1/people/route'
import { PUT as renew, POST as signIn, DELETE as signOut, GET as whoAmI } from '../../../app/api/v1/session/route'
import { DELETE as revokeToken } from '../../../app/api/v1/tokens/[id]/route'
import { POST as createToken, GET as listTokens } from '../../../app/api/v1/tokens/route'
import type { Services } from '../../../lib/sync/services'
import { cookieOf, OWNER, openWorld, type World } from '../../access/world'
import { call, PUBLIC_URL, publish } from './caller'

let world: World
const logged = vi.spyOn(console, 'error')
beforeAll(async () => {
  world = await openWorld({ publicUrl: PUBLIC_URL })
  const services: Partial<Services> = {
    publicUrl: PUBLIC_URL,
    engine: 'x',
    demo: false,
    access: world.access,
    ready: async () => null,
  }
  publish(services as Services)
})
beforeEach(() => {
  logged.mockReset()
})
afterEach(() => {
  expect(logged).not.toHaveBeenCalled()
  expect(world.logged).toEqual([])
})
afterAll(async () => {
  publish(undefined)
  logged.mockRestore()
  await world.close()
})

const peer = '192.0.2.1'

async function session(email: string = OWNER.email, password: string = OWNER.password, from = peer) {
  const answer = await call(signIn, { json: { email, password }, headers: { 'x-halfbaud-peer': from } })
  return { ...answer, cookie: cookieOf(answer.headers.getSetCookie()) }
}

let people = 0
async function newPerson() {
  const { cookie } = await session()
  const email = `person${++people}@example.com`
  const { json } = await call(addPerson, { json: { name: `Person ${people}`, email }, headers: { cookie } })
  const { person, password } = json as { person: { id: string }; password: string }
  return { id: person.id, email, password }
}

test('the first owner comes in with the printed code, once', async () => {
  const code = (await world.access.ownerCode()) ?? ''
  const json = { code, ...OWNER }
  expect((await call(createOwner, { json: { ...json, code: 'wrong' } })).code).toBe('wrong-code')
  const short = await call(createOwner, { json: { ...json, password: 'short' } })
  expect(short).toMatchObject({ code: 'password-refused', json: { detail: expect.stringContaining('at least 12') } })
  const wrong = await call(createOwner, { json: { ...json, email: 'no address', name: ' \n' } })
  expect(wrong.json).toMatchObject({ errors: [{ field: 'name' }, { field: 'email' }] })
  expect(await call(createOwner, { json })).toMatchObject({
    status: 201,
    json: { name: OWNER.name, email: OWNER.email },
  })
  expect((await call(createOwner, { json: { ...json, email: 'second@example.com' } })).code).toBe('wrong-code')
})

test('signing in gives a cookie that tells who one is; signing out ends it at once', async () => {
  const { cookie, status, headers, json } = await session()
  expect(status).toBe(201)
  expect(headers.getSetCookie()[0]).toMatch(/HttpOnly/i)
  expect((await call(whoAmI, { headers: { cookie } })).json).toEqual(json)
  const out = await call(signOut, { headers: { cookie } })
  expect(out.status).toBe(204)
  expect(out.headers.getSetCookie()[0]).toMatch(/Max-Age=0/i)
  expect((await call(whoAmI, { headers: { cookie } })).code).toBe('not-signed-in')
  expect((await call(renew, { headers: { cookie } })).code).toBe('not-signed-in')
})

test('a wrong password and an unknown address are answered alike', async () => {
  const wrong = await session(OWNER.email, 'not the password', '192.0.2.30')
  const unknown = await session('nobody@example.com', 'not the password', '192.0.2.30')
  expect(wrong.code).toBe('wrong-sign-in')
  expect(unknown.json).toEqual(wrong.json)
  expect(wrong.headers.getSetCookie()).toEqual([])
})

test('after too many wrong passwords the answer says how long to wait, and a forged address does not help', async () => {
  const { email } = await newPerson()
  const attempt = (i: number) =>
    call(signIn, {
      json: { email, password: `guess ${i}` },
      headers: {
        'x-halfbaud-peer': '192.0.2.40',
        'x-forwarded-for': `203.0.113.${i}`,
        forwarded: `for=203.0.113.${i}`,
      },
    })
  const codes = await Promise.all(Array.from({ length: 8 }, async (_, i) => (await attempt(i)).code))
  expect(codes.filter((code) => code === 'wrong-sign-in')).toHaveLength(5)
  expect(codes.filter((code) => code === 'slow-down')).toHaveLength(3)
  expect((await attempt(9)).headers.get('retry-after')).toBe('1')
  expect((await session(OWNER.email, OWNER.password, '192.0.2.40')).status).toBe(201)
})

test('the session is renewed by PUT, and GET leaves it as it is', async () => {
  const { cookie, json } = await session()
  const renewed = await call(renew, { headers: { cookie } })
  expect(renewed.status).toBe(200)
  expect((await call(whoAmI, { headers: { cookie } })).json).toEqual(json)
})

test('[W3.55] a changed password ends the other sessions and needs the current one', async () => {
  const { email, password } = await newPerson()
  const here = await session(email, password)
  const elsewhere = await session(email, password)
  const next = 'quite another long one'
  const send = (json: object) =>
    call(changePassword, { json, headers: { cookie: here.cookie, 'x-halfbaud-peer': peer } })
  expect((await send({ current: 'a wrong current one', next })).code).toBe('wrong-password')
  expect((await send({ current: password, next: 'short' })).code).toBe('password-refused')
  expect((await call(whoAmI, { headers: { cookie: elsewhere.cookie } })).status).toBe(200)
  const changed = await send({ current: password, next })
  expect(changed.status).toBe(204)
  expect((await call(whoAmI, { headers: { cookie: elsewhere.cookie } })).code).toBe('not-signed-in')
  const cookie = cookieOf(changed.headers.getSetCookie())
  expect((await call(whoAmI, { headers: { cookie } })).json).toMatchObject({ person: { email } })
})

test('only the administrator adds people, and everybody sees who is here', async () => {
  const { email, password } = await newPerson()
  const { cookie } = await session(email, password)
  const refused = await call(addPerson, { json: { name: 'X', email: 'x@example.com' }, headers: { cookie } })
  expect(refused.code).toBe('needs-administrator')
  const { json } = await call(listPeople, { headers: { cookie } })
  expect((json as { people: { email: string }[] }).people.map((person) => person.email)).toContain(email)
  const again = await call(addPerson, { json: { name: 'X', email }, headers: { cookie: (await session()).cookie } })
  expect(again.code).toBe('e-mail-taken')
})

test('[W3.56] a token works without Origin, takes no cookie, and cannot make tokens or change the password', async () => {
  const { cookie } = await session()
  const made = await call(createToken, { json: { name: 'build server', expiresAt: null }, headers: { cookie } })
  const { secret, token } = made.json as { secret: string; token: { id: string } }
  const bearer = { authorization: `Bearer ${secret}`, origin: null }
  expect((await call(whoAmI, { headers: bearer })).json).toMatchObject({ via: 'token', expiresAt: null })
  const listed = await call(listTokens, { headers: bearer })
  expect(JSON.stringify(listed.json)).toContain(token.id)
  expect(JSON.stringify(listed.json)).not.toContain(secret)
  expect((await call(createToken, { json: { name: 'x', expiresAt: null }, headers: bearer })).code).toBe(
    'needs-session',
  )
  const password = { current: OWNER.password, next: 'quite another long one' }
  expect((await call(changePassword, { json: password, headers: bearer })).code).toBe('needs-session')
  const withCookie = { authorization: 'Bearer hb_wrong', cookie }
  expect((await call(whoAmI, { headers: withCookie })).code).toBe('not-signed-in')
  expect((await call(createToken, { json: { name: 'x', expiresAt: null }, headers: withCookie })).code).toBe(
    'not-signed-in',
  )
  expect((await call(revokeToken, { params: { id: token.id }, headers: bearer })).status).toBe(204)
  expect((await call(whoAmI, { headers: bearer })).code).toBe('not-signed-in')
})

test('a token of somebody else is not found, nor is one that ends before it begins made', async () => {
  const { cookie } = await session()
  const { json } = await call(createToken, { json: { name: 'mine', expiresAt: null }, headers: { cookie } })
  const { email, password } = await newPerson()
  const other = await session(email, password)
  const id = (json as { token: { id: string } }).token.id
  expect((await call(revokeToken, { params: { id }, headers: { cookie: other.cookie } })).code).toBe('not-found')
  expect((await call(revokeToken, { params: { id: 'unknown' }, headers: { cookie } })).code).toBe('not-found')
  const past = await call(createToken, { json: { name: 'x', expiresAt: 1000 }, headers: { cookie } })
  expect(past.json).toMatchObject({ code: 'invalid-fields', errors: [{ field: 'expiresAt' }] })
})
