import { copyFile, mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { beforeAll, beforeEach, describe, expect, onTestFinished, test } from 'vitest'
import { migrateRecords } from '../../lib/records/migrate'
import { AlreadyRecorded, NotRecorded } from '../../lib/records/prisma/errors'
import { openRecords } from '../../lib/records/prisma/open'
import type { BudgetRecord, EvidenceRecord, Records, TokenRecord } from '../../lib/records/types'
import { accountsOver, addPerson } from './account'
import { temporaryDirectory } from './temporary'

let migrated: string
let file: string
let records: Records

beforeAll(async () => {
  migrated = await mkdtemp(join(tmpdir(), 'halfbaud-records-'))
  await migrateRecords(join(migrated, 'records.sqlite'))
  return () => rm(migrated, { recursive: true })
})

beforeEach(async () => {
  file = join(await temporaryDirectory(), 'records.sqlite')
  await copyFile(join(migrated, 'records.sqlite'), file)
  const opened = await openRecords(file)
  records = opened.records
  onTestFinished(opened.close)
})

const budget = (id: string, changes: Partial<BudgetRecord> = {}): BudgetRecord => ({
  id,
  name: `Link ${id}`,
  createdAt: 1_700_000_000_123,
  createdBy: 'p1',
  state: 'made',
  headSeq: 1,
  headHash: 'a'.repeat(64),
  ...changes,
})

describe('people', () => {
  test('are found by id, by e-mail in any case, and all by name', async () => {
    expect(await records.people.count()).toBe(0)
    const zoe = await addPerson(records, 'Zoe Test')
    const adam = await addPerson(records, 'Adam Test')
    const person = { id: adam, name: 'Adam Test', email: 'adam.test@example.test', administrator: false }
    expect(await records.people.count()).toBe(2)
    expect(await records.people.byId(adam)).toEqual(person)
    expect(await records.people.byEmail('Adam.Test@Example.test')).toEqual(person)
    expect(await records.people.byId('nobody')).toBeNull()
    expect(await records.people.byEmail('nobody@example.test')).toBeNull()
    expect((await records.people.all()).map(({ id }) => id)).toEqual([adam, zoe])
  })

  test('byIds leaves out who is not there, however many are asked for', async () => {
    const id = await addPerson(records, 'Adam Test')
    const many = Array.from({ length: 3000 }, (_, index) => `nobody-${index}`)
    expect([...(await records.people.byIds([id, id, ...many])).keys()]).toEqual([id])
    expect(await records.people.byIds([])).toEqual(new Map())
  })

  test('become administrator, and stop being one', async () => {
    const id = await addPerson(records, 'Adam Test')
    await records.people.setAdministrator(id, true)
    expect((await records.people.byId(id))?.administrator).toBe(true)
    await records.people.setAdministrator(id, false)
    expect((await records.people.byId(id))?.administrator).toBe(false)
    await expect(records.people.setAdministrator('nobody', true)).rejects.toThrow(NotRecorded)
  })
})

describe('budgets', () => {
  test('are made with their first owner', async () => {
    await records.budgets.create(budget('b1'), 'p1')
    expect(await records.budgets.byId('b1')).toEqual(budget('b1'))
    expect(await records.budgets.byId('b2')).toBeNull()
    expect(await records.members.list('b1')).toEqual([{ person: 'p1', role: 'owner' }])
  })

  test('are made once: a second time changes nothing', async () => {
    await records.budgets.create(budget('b1'), 'p1')
    await expect(records.budgets.create(budget('b1', { name: 'Other' }), 'p2')).rejects.toThrow(AlreadyRecorded)
    expect(await records.budgets.all()).toEqual([budget('b1')])
    expect(await records.members.list('b1')).toEqual([{ person: 'p1', role: 'owner' }])
  })

  test('are listed oldest first; for a person only those that stand, with the role', async () => {
    await records.budgets.create(budget('b2', { createdAt: 2 }), 'p1')
    await records.budgets.create(budget('b1', { createdAt: 1 }), 'p2')
    await records.budgets.create(budget('b3', { createdAt: 3, state: 'abandoned' }), 'p1')
    await records.members.set('b1', 'p1', 'viewer')
    expect((await records.budgets.all()).map(({ id }) => id)).toEqual(['b1', 'b2', 'b3'])
    const mine = await records.budgets.forPerson('p1')
    expect(mine.map(({ record, role }) => [record.id, role])).toEqual([
      ['b1', 'viewer'],
      ['b2', 'owner'],
    ])
    expect(await records.budgets.forPerson('p9')).toEqual([])
  })

  test('are renamed', async () => {
    await records.budgets.create(budget('b1'), 'p1')
    await records.budgets.rename('b1', "Backplane, 'long'")
    expect((await records.budgets.byId('b1'))?.name).toBe("Backplane, 'long'")
    await expect(records.budgets.rename('b2', 'x')).rejects.toThrow(NotRecorded)
  })
})

describe('members', () => {
  beforeEach(() => records.budgets.create(budget('b1'), 'p1'))

  test('get a role, another one, and none', async () => {
    expect(await records.members.role('p2', 'b1')).toBeNull()
    expect(await records.members.set('b1', 'p2', 'editor')).toBe('done')
    expect(await records.members.role('p2', 'b1')).toBe('editor')
    expect(await records.members.set('b1', 'p2', 'approver')).toBe('done')
    expect(await records.members.list('b1')).toEqual([
      { person: 'p1', role: 'owner' },
      { person: 'p2', role: 'approver' },
    ])
    expect(await records.members.set('b1', 'p2', null)).toBe('done')
    expect(await records.members.set('b1', 'p2', null)).toBe('done')
    expect(await records.members.role('p2', 'b1')).toBeNull()
  })

  test('never leave a budget without an owner', async () => {
    expect(await records.members.set('b1', 'p1', null)).toBe('last-owner')
    expect(await records.members.set('b1', 'p1', 'editor')).toBe('last-owner')
    expect(await records.members.role('p1', 'b1')).toBe('owner')
    expect(await records.members.set('b1', 'p2', 'owner')).toBe('done')
    expect(await records.members.set('b1', 'p1', null)).toBe('done')
    expect(await records.members.list('b1')).toEqual([{ person: 'p2', role: 'owner' }])
  })

  test('two owners who leave at the same time: one stays', async () => {
    await records.members.set('b1', 'p2', 'owner')
    const left = await Promise.all([records.members.set('b1', 'p1', null), records.members.set('b1', 'p2', null)])
    expect(left.sort()).toEqual(['done', 'last-owner'])
    expect(await records.members.list('b1')).toHaveLength(1)
  })

  test('of a budget that is not there are refused', async () => {
    await expect(records.members.set('b9', 'p1', 'owner')).rejects.toThrow(NotRecorded)
    expect(await records.members.list('b9')).toEqual([])
  })
})

describe('tokens', () => {
  let person: string
  beforeEach(async () => {
    person = await addPerson(records, 'Adam Test')
  })
  const token = (id: string, changes: Partial<TokenRecord> = {}): TokenRecord => ({
    id,
    person,
    name: 'Bench',
    sha256: id.repeat(64).slice(0, 64),
    createdAt: 1_700_000_000_000,
    expiresAt: null,
    lastUsedAt: null,
    ...changes,
  })

  test('are found by their hash and by person, oldest first', async () => {
    const old = token('b', { createdAt: 1, expiresAt: 1_800_000_000_001 })
    await records.tokens.create(token('a'))
    await records.tokens.create(old)
    expect(await records.tokens.bySha256(old.sha256)).toEqual(old)
    expect(await records.tokens.bySha256('c'.repeat(64))).toBeNull()
    expect(await records.tokens.forPerson(person)).toEqual([old, token('a')])
    expect(await records.tokens.forPerson('nobody')).toEqual([])
  })

  test('note their last use; one that is gone notes nothing', async () => {
    await records.tokens.create(token('a'))
    await records.tokens.touch('a', 1_700_000_000_777)
    await records.tokens.touch('gone', 1)
    expect(await records.tokens.forPerson(person)).toEqual([token('a', { lastUsedAt: 1_700_000_000_777 })])
  })

  test('are removed by their own person only', async () => {
    await records.tokens.create(token('a'))
    expect(await records.tokens.remove('somebody else', 'a')).toBe(false)
    expect(await records.tokens.remove(person, 'a')).toBe(true)
    expect(await records.tokens.remove(person, 'a')).toBe(false)
    expect(await records.tokens.forPerson(person)).toEqual([])
  })

  test('need a person, and are made once', async () => {
    await expect(records.tokens.create(token('a', { person: 'nobody' }))).rejects.toThrow(NotRecorded)
    await records.tokens.create(token('a'))
    await expect(records.tokens.create(token('a'))).rejects.toThrow(AlreadyRecorded)
    await expect(records.tokens.create(token('b', { sha256: token('a').sha256 }))).rejects.toThrow(AlreadyRecorded)
  })
})

describe('descriptions of evidence', () => {
  const described: EvidenceRecord = {
    budget: 'b1',
    sha256: 'e'.repeat(64),
    name: 'cable Ω.s4p',
    mediaType: 'application/octet-stream',
    size: 1234,
    person: 'p1',
    time: 1_700_000_000_000,
  }
  beforeEach(() => records.budgets.create(budget('b1'), 'p1'))

  test('are kept per budget; the first one of a file stays', async () => {
    expect(await records.evidence.describe(described)).toEqual(described)
    expect(await records.evidence.describe({ ...described, name: 'other.s4p', time: 2 })).toEqual(described)
    await records.budgets.create(budget('b2'), 'p1')
    const other = { ...described, budget: 'b2', name: 'other.s4p' }
    expect(await records.evidence.describe(other)).toEqual(other)
    expect(await records.evidence.list('b1')).toEqual([described])
    expect(await records.evidence.find('b2', described.sha256)).toEqual(other)
    expect(await records.evidence.find('b1', 'f'.repeat(64))).toBeNull()
  })

  test('are listed oldest first, and need a budget', async () => {
    const earlier = { ...described, sha256: 'f'.repeat(64), time: 5 }
    await records.evidence.describe(described)
    await records.evidence.describe(earlier)
    expect(await records.evidence.list('b1')).toEqual([earlier, described])
    await expect(records.evidence.describe({ ...described, budget: 'b9' })).rejects.toThrow(NotRecorded)
  })

  test('described twice at once are one', async () => {
    const both = await Promise.all([
      records.evidence.describe(described),
      records.evidence.describe({ ...described, name: 'x' }),
    ])
    expect(both[0]).toEqual(both[1])
    expect(await records.evidence.list('b1')).toHaveLength(1)
  })
})

test('settings are set, set again, and removed', async () => {
  expect(await records.settings.get('code')).toBeNull()
  await records.settings.set('code', 'one')
  await records.settings.set('code', 'two')
  expect(await records.settings.get('code')).toBe('two')
  await records.settings.remove('code')
  await records.settings.remove('code')
  expect(await records.settings.get('code')).toBeNull()
})

test('what was written is there after closing and opening again', async () => {
  await records.budgets.create(budget('b1'), 'p1')
  const again = await openRecords(file)
  onTestFinished(again.close)
  expect(await again.records.budgets.all()).toEqual([budget('b1')])
})

describe('the account library’s storage', () => {
  test('signs up, signs in, keeps the session, signs out; nobody makes himself administrator', async () => {
    const accounts = accountsOver(records)
    const body = { name: 'Adam Test', email: 'adam@example.test', password: 'twelve letters' }
    await accounts.api.signUpEmail({ body: { ...body, administrator: true } as typeof body })
    expect((await records.people.byEmail(body.email))?.administrator).toBe(false)
    await expect(accounts.api.signInEmail({ body: { ...body, password: 'another one' } })).rejects.toThrow()
    const { headers } = await accounts.api.signInEmail({ body, returnHeaders: true })
    const cookie = { headers: new Headers({ cookie: headers.getSetCookie().join('; ') }) }
    expect((await accounts.api.getSession(cookie))?.user).toMatchObject({ email: body.email, administrator: false })
    await accounts.api.signOut(cookie)
    expect(await accounts.api.getSession(cookie)).toBeNull()
  })
})
