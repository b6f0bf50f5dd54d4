import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest'
import { roleAllows } from '../../lib/access/identity'
import { ownedWorld } from './world'

let world: Awaited<ReturnType<typeof ownedWorld>>
let ada: string
let budget: string
let made = 0
beforeAll(async () => {
  world = await ownedWorld()
  ada = (await world.access.addPerson({ name: 'Ada', email: 'ada@example.com' }))?.person.id ?? ''
})
beforeEach(async () => {
  budget = `b${++made}`
  await makeBudget(budget)
})
afterAll(() => world.close())

async function makeBudget(id: string) {
  const record = {
    id,
    name: id,
    createdAt: 1,
    createdBy: world.owner.id,
    state: 'made',
    headSeq: 1,
    headHash: '00',
  } as const
  await world.records.budgets.create(record, world.owner.id)
}

test('[W3.50] a change of role is seen at once and told of', async () => {
  const told: unknown[] = []
  const off = world.access.onRevoked((what) => told.push(what))
  expect(await world.access.role(ada, budget)).toBeNull()
  expect(await world.access.setMember(budget, ada, 'editor')).toBe('done')
  expect(await world.access.role(ada, budget)).toBe('editor')
  expect(await world.access.setMember(budget, ada, 'viewer')).toBe('done')
  expect(await world.access.role(ada, budget)).toBe('viewer')
  expect(await world.access.setMember(budget, ada, null)).toBe('done')
  expect(await world.access.role(ada, budget)).toBeNull()
  off()
  expect(told).toEqual(Array(3).fill({ person: ada, budget }))
})

test('[W3.51] what another process changes is seen within ten seconds', async () => {
  await world.access.setMember(budget, ada, 'editor')
  expect(await world.access.role(ada, budget)).toBe('editor')
  await world.records.members.set(budget, ada, null)
  expect(await world.access.role(ada, budget)).toBe('editor')
  world.advance(10_000)
  expect(await world.access.role(ada, budget)).toBeNull()
})

test('a role that was being read while it was changed is not remembered', async () => {
  await world.access.setMember(budget, ada, 'editor')
  const members = world.records.members as { role: typeof world.records.members.role }
  const read = members.role
  let release = () => {}
  const held = new Promise<void>((resolve) => {
    release = resolve
  })
  members.role = async (person, budget) => {
    const role = await read(person, budget)
    await held
    return role
  }
  const late = world.access.role(ada, budget)
  members.role = read
  await world.access.setMember(budget, ada, null)
  release()
  await late
  expect(await world.access.role(ada, budget)).toBeNull()
})

test('the last owner stays, a stranger is no member, and members are listed by name', async () => {
  expect(await world.access.setMember(budget, world.owner.id, 'editor')).toBe('last-owner')
  expect(await world.access.role(world.owner.id, budget)).toBe('owner')
  expect(await world.access.setMember(budget, 'no-such-person', 'viewer')).toBe('no-such-person')
  await world.access.setMember(budget, ada, 'viewer')
  const members = await world.access.members(budget)
  expect(members.map(({ person, role }) => [person.name, role]).sort()).toEqual([
    ['Ada', 'viewer'],
    ['Ines Owner', 'owner'],
  ])
})

test('a listener that fails keeps no other from hearing of a revocation, and one taken off hears nothing', async () => {
  const told: string[] = []
  const offBad = world.access.onRevoked(() => {
    throw new Error('bad listener')
  })
  const offSecond = world.access.onRevoked(() => told.push('second'))
  const off = world.access.onRevoked(() => told.push('third'))
  off()
  await world.access.setMember(budget, ada, 'viewer')
  offBad()
  offSecond()
  expect(told).toEqual(['second'])
  expect(world.logged).toHaveLength(1)
})

test('each role may all that the lesser ones may', () => {
  expect(roleAllows('owner', 'viewer')).toBe(true)
  expect(roleAllows('approver', 'editor')).toBe(true)
  expect(roleAllows('editor', 'approver')).toBe(false)
  expect(roleAllows('viewer', 'editor')).toBe(false)
  expect(roleAllows(null, 'viewer')).toBe(false)
})
