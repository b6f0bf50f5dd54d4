import { afterEach, beforeEach, expect, test } from 'vitest'
import { from, OWNER, openWorld, signedIn, type World } from './world'

let world: World
beforeEach(async () => {
  world = await openWorld()
})
afterEach(async () => {
  expect(world.logged).toEqual([])
  await world.close()
})

async function newCode(): Promise<string> {
  const code = await world.access.ownerCode()
  if (code === null) throw new Error('no code')
  return code
}

test('the first owner comes in with the code, once, and is the administrator', async () => {
  expect(await world.access.needsOwner()).toBe(true)
  const code = await newCode()
  const owner = await world.access.createOwner(` ${code.toUpperCase()} `, OWNER)
  expect(owner).toMatchObject({ name: OWNER.name, email: OWNER.email })
  expect(await world.access.needsOwner()).toBe(false)
  expect(await world.access.ownerCode()).toBeNull()
  expect(await world.access.createOwner(code, { ...OWNER, email: 'second@example.com' })).toBeNull()
  const { identity } = await signedIn(world.access, OWNER.email, OWNER.password)
  expect(identity.administrator).toBe(true)
})

test('under a race only one becomes the owner', async () => {
  const code = await newCode()
  const tries = ['a', 'b', 'c', 'd'].map((name) =>
    world.access.createOwner(code, { ...OWNER, email: `${name}@example.com` }),
  )
  const made = (await Promise.all(tries)).filter((person) => person !== null)
  expect(made).toHaveLength(1)
  expect(await world.records.people.count()).toBe(1)
})

test('only the newest code is good, and only its hash is kept', async () => {
  const old = await newCode()
  const code = await newCode()
  expect(code).not.toBe(old)
  expect(await world.records.settings.get('owner-code-sha256')).toMatch(/^[0-9a-f]{64}$/)
  expect(await world.access.createOwner(old, OWNER)).toBeNull()
  expect(await world.access.createOwner('', OWNER)).toBeNull()
  expect(await world.access.createOwner(code, OWNER)).not.toBeNull()
  expect(await world.records.settings.get('owner-code-sha256')).toBeNull()
})

test('a refused password leaves the code good', async () => {
  const code = await newCode()
  expect(await world.access.createOwner(code, { ...OWNER, password: 'elevenchars' })).toEqual({
    refused: 'Use at least 12 characters; a few unrelated words do.',
  })
  expect(await world.records.people.count()).toBe(0)
  expect(await world.access.createOwner(code, OWNER)).not.toBeNull()
})

test('a crash before the person became the administrator does not lock the server', async () => {
  const code = await newCode()
  const cut = world.records.people.setAdministrator
  const people = world.records.people as { setAdministrator: typeof cut }
  people.setAdministrator = async () => {
    throw new Error('the power went')
  }
  await expect(world.access.createOwner(code, OWNER)).rejects.toThrow('the power went')
  people.setAdministrator = cut
  expect(await world.access.needsOwner()).toBe(true)
  const again = { ...OWNER, password: 'a password of the second try' }
  expect(await world.access.createOwner(code, again)).toMatchObject({ email: OWNER.email })
  await signedIn(world.access, OWNER.email, again.password)
})

test('a person added gets a first password; an address is given once, whatever its case', async () => {
  await world.access.createOwner(await newCode(), OWNER)
  const added = await world.access.addPerson({ name: 'Ada', email: 'Ada@Example.com' })
  expect(added?.password).toMatch(/^([a-z2-9]{5}-){3}[a-z2-9]{5}$/)
  const { identity } = await signedIn(world.access, 'ada@example.com', added?.password ?? '')
  expect(identity).toMatchObject({ name: 'Ada', administrator: false })
  expect(await world.access.addPerson({ name: 'Other', email: 'ada@example.com' })).toBeNull()
  const both = await Promise.all([1, 2].map(() => world.access.addPerson({ name: 'B', email: 'b@example.com' })))
  expect(both.filter(Boolean)).toHaveLength(1)
  expect((await world.access.people()).map(({ email }) => email).sort()).toEqual([
    'ada@example.com',
    'b@example.com',
    'owner@example.com',
  ])
})

test('nobody signs up by themselves', async () => {
  await world.access.createOwner(await newCode(), OWNER)
  expect(await world.access.signIn('new@example.com', 'a password of my own', from('192.0.2.1'))).toBeNull()
  expect(await world.records.people.count()).toBe(1)
})
