import { createHash } from 'node:crypto'
import { readdir, readFile } from 'node:fs/promises'
import { join } from 'node:path'
import { afterAll, afterEach, beforeAll, beforeEach, expect, test, vi } from 'vitest'
import { POST as editBudget } from '../../../app/api/v1/budgets/[id]/edits/route'
import { GET as readEvaluation } from '../../../app/api/v1/budgets/[id]/evaluation/route'
import { DELETE as removeMember, PUT as setMember } from '../../../app/api/v1/budgets/[id]/members/[person]/route'
import { GET as listMembers } from '../../../app/api/v1/budgets/[id]/members/route'
import { GET as readBudget } from '../../../app/api/v1/budgets/[id]/route'
import { GET as readTrail } from '../../../app/api/v1/budgets/[id]/trail/route'
import { POST as createBudget, GET as listBudgets } from '../../../app/api/v1/budgets/route'
import { POST as evaluateBudget } from '../../../app/api/v1/evaluate/route'
import { DELETE as signOut } from '../../../app/api/v1/session/route'
import { evaluate, WHOLE } from '../../../lib/budget/evaluate'
import type { Budget } from '../../../lib/budget/schema'
import type { TrailEntry } from '../../../lib/sheet/wire'
import { line, link } from '../../budget/links'
import { call, publish, type Sent } from './caller'
import { routes } from './routeFiles'
import { openWorksheet, type Person } from './worksheet'

const LINK = link({ lines: { cable: line('b0', '3 dB'), board: line('c0', null) } })

let sheet: Awaited<ReturnType<typeof openWorksheet>>
let owner: Person
let ada: Person
let id: string
const logged = vi.spyOn(console, 'error')

beforeAll(async () => {
  sheet = await openWorksheet()
  owner = await sheet.as()
  const added = await sheet.access.addPerson({ name: 'Ada', email: 'ada@example.com' })
  ada = await sheet.as('ada@example.com', added?.password)
})
beforeEach(async () => {
  logged.mockReset()
  id = await made(owner)
})
afterEach(() => {
  expect(logged).not.toHaveBeenCalled()
  expect(sheet.logged).toEqual([])
})
afterAll(async () => {
  logged.mockRestore()
  await sheet.close()
})

async function made(by: Person): Promise<string> {
  const answer = await call(createBudget, { json: LINK, headers: { cookie: by.cookie } })
  expect(answer.status).toBe(201)
  const budget = (answer.json as { id: string }).id
  expect(answer.headers.get('location')).toBe(`/api/v1/budgets/${budget}`)
  return budget
}

const by = (person: Person, sent: Sent = {}): Sent => ({
  params: { id },
  ...sent,
  headers: { cookie: person.cookie, ...sent.headers },
})

let keys = 0
const newKey = () => `key-of-test-${++keys}`
const edit = (edits: unknown, more: { expectedSeq?: number; key?: string; person?: Person } = {}) => {
  const { expectedSeq, key = newKey(), person = owner } = more
  return call(editBudget, by(person, { json: { edits, expectedSeq }, headers: { 'idempotency-key': key } }))
}

async function state(): Promise<{ budget: Budget; seq: number; head: string }> {
  return (await call(readBudget, by(owner))).json as never
}

async function trail(query: Record<string, string> = {}): Promise<TrailEntry[]> {
  return ((await call(readTrail, by(owner, { query }))).json as { entries: TrailEntry[] }).entries
}

test('a budget is made from its file, read as it was sent, and listed with its verdict', async () => {
  expect((await state()).budget).toEqual(LINK)
  const { budgets } = (await call(listBudgets, by(owner))).json as { budgets: { id: string }[] }
  const expected = evaluate(LINK, new Map())
  expect(budgets.find((each) => each.id === id)).toMatchObject({
    name: 'Alder',
    role: 'owner',
    verdict: expected.verdict,
    words: expected.allowances[0]?.words,
    locked: null,
  })
  expect((await call(listBudgets, by(ada))).json).toEqual({ budgets: [] })
})

test('a file that is no budget is refused with the place of each mistake', async () => {
  const wrong = { ...LINK, lines: { cable: { ...LINK.lines.cable, loss: '-3 dB', colour: 'red' } } }
  for (const route of [createBudget, evaluateBudget]) {
    const { code, json } = await call(route, { json: wrong, headers: { cookie: owner.cookie } })
    expect(code).toBe('invalid-fields')
    const { errors } = json as { errors: { field: string; todo: string }[] }
    expect(errors.map(({ field }) => field)).toEqual(['lines.cable.loss', 'lines.cable'])
    expect(errors[0]?.todo).toContain('leave the minus sign out')
    expect(errors[1]?.todo).toContain('colour')
  }
})

test('evaluating a file keeps nothing of it', async () => {
  const before = await call(listBudgets, by(owner))
  const { json } = await call(evaluateBudget, { json: LINK, headers: { cookie: ada.cookie } })
  expect(json).toEqual(evaluate(LINK, new Map(), WHOLE))
  expect((await call(listBudgets, by(owner))).json).toEqual(before.json)
})

test('[W9.41] a batch of edits is one entry of the trail, in the name of whoever sent it, with what it did to the margin', async () => {
  const { seq, json, status } = await edit([
    { section: 'head', field: 'description', value: 'Shorter cable' },
    { line: 'cable', field: 'loss', value: '2 dB' },
    { section: 'lines', id: 'board', field: 'loss', value: '4 dB' },
    { section: 'lines', id: 'board', field: 'note', value: 'From the coupon.' },
    { line: 'cable', lane: 2, field: 'loss', value: '2.5 dB' },
    { add: 'lines', id: 'via', values: { order: 'd0', kind: 'via', model: 'stated', loss: '1 dB', at: '10 GHz' } },
  ]).then((answer) => ({ ...answer, seq: (answer.json as { seq: number }).seq }))
  expect(status, JSON.stringify(json)).toBe(200)
  const now = await state()
  expect(now.seq).toBe(seq)
  expect(now.head).toBe((json as { head: string }).head)
  expect(now.budget.head.description).toBe('Shorter cable')
  expect(now.budget.lines.cable?.loss).toBe('2 dB')
  expect(now.budget.lines.board).toMatchObject({ loss: '4 dB', note: 'From the coupon.' })
  expect(now.budget.lines.via).toMatchObject({ loss: '1 dB', removed: false })
  expect(now.budget.laneValues['cable/2/loss']).toBe('2.5 dB')
  const [entry] = await trail({ limit: '1' })
  expect(entry).toMatchObject({ seq, kind: 'edit', door: 'screen', person: owner.identity.person })
  expect(entry?.changes).toContainEqual(
    expect.objectContaining({ section: 'lines', id: 'cable', field: 'loss', before: '3 dB', after: '2 dB' }),
  )
  expect(entry?.effects.map(({ allowance }) => allowance)).toContain('limit')
  const { json: evaluated } = await call(readEvaluation, by(owner))
  expect(evaluated).toEqual({ seq, evaluation: evaluate(now.budget, new Map(), WHOLE) })
})

test('[W9.42] an edit by token comes in by its own door', async () => {
  const { token } = await sheet.access.createToken(owner.identity, 'script', null)
  const answer = await call(editBudget, {
    params: { id },
    json: { edits: [{ line: 'board', field: 'loss', value: '4 dB' }] },
    headers: { authorization: `Bearer ${token}`, origin: null, 'idempotency-key': newKey() },
  })
  expect(answer.status, JSON.stringify(answer.json)).toBe(200)
  expect((await trail({ limit: '1' }))[0]).toMatchObject({ door: 'token', person: owner.identity.person })
})

test('[W9.43] the same key with the same edits is stored once; with others it is refused', async () => {
  const edits = [{ line: 'cable', field: 'loss', value: '2 dB' }]
  const key = newKey()
  const first = await edit(edits, { key })
  const before = await state()
  const again = await edit(edits, { key })
  expect(again).toMatchObject({ status: 200, json: first.json })
  expect(await state()).toEqual(before)
  const other = await edit([{ line: 'cable', field: 'loss', value: '9 dB' }], { key })
  expect(other).toMatchObject({ status: 409, code: 'key-reused' })
  expect(await state()).toEqual(before)
})

test('[W9.44] an edit that expects an older state is a conflict and changes nothing', async () => {
  const { seq } = await state()
  const mine = [{ line: 'cable', field: 'loss', value: '2 dB' }]
  expect((await edit(mine, { expectedSeq: seq })).status).toBe(200)
  const before = await state()
  const late = await edit([{ line: 'cable', field: 'loss', value: '5 dB' }], { expectedSeq: seq })
  expect(late).toMatchObject({ status: 409, code: 'conflict' })
  expect(await state()).toEqual(before)
})

test('all edits of a batch are made or none, and each that cannot be is named', async () => {
  const before = await state()
  const { code, json } = await edit([
    { line: 'cable', field: 'loss', value: '2 dB' },
    { line: 'cable', field: 'loss', value: '-2 dB' },
    { section: 'lines', id: 'cable', field: 'colour', value: 'red' },
    { add: 'lines', id: 'via', values: { order: 'd0', loss: 'much' } },
    { line: 'cable', lane: 2, field: 'loss', value: 'much' },
  ])
  expect(code).toBe('invalid-fields')
  expect((json as { errors: { field: string }[] }).errors.map(({ field }) => field)).toEqual([
    'edits[1].value',
    'edits[2].value',
    'edits[3].values.loss',
    'edits[4].value',
  ])
  const missing = await edit([
    { line: 'cable', field: 'loss', value: '2 dB' },
    { line: 'no-such-line', field: 'loss', value: '2 dB' },
  ])
  expect(missing).toMatchObject({ code: 'edit-refused', json: { refusal: 'bad-value' } })
  expect(await state()).toEqual(before)
})

test('an edit without a key, and one of an unknown shape, are refused with the field', async () => {
  const noKey = await call(
    editBudget,
    by(owner, { json: { edits: [{ line: 'cable', field: 'loss', value: '2 dB' }] } }),
  )
  expect(noKey.json).toMatchObject({ code: 'invalid-fields', errors: [{ field: 'idempotency-key' }] })
  for (const [wrong, field] of [
    [{ section: 'colours', id: 'x', field: 'name', value: 'y' }, 'edits[0].section'],
    [{ line: 'cable', field: 'loss' }, 'edits[0].value'],
    [{ line: 'cable', lane: 0, field: 'loss', value: null }, 'edits[0].lane'],
  ] as const) {
    expect((await edit([wrong])).json).toMatchObject({ code: 'invalid-fields', errors: [{ field }] })
  }
  expect((await edit([])).json).toMatchObject({ code: 'invalid-fields', errors: [{ field: 'edits' }] })
})

test('the trail is read forwards from a seq and backwards from one, in pages', async () => {
  for (const value of ['1 dB', '2 dB', '4 dB']) await edit([{ line: 'cable', field: 'loss', value }])
  const all = await trail({ after: '0' })
  const seqs = all.map(({ seq }) => seq)
  expect(seqs).toEqual(Array.from({ length: seqs.length }, (_, index) => index + 1))
  expect(all[0]).toMatchObject({ kind: 'seed' })
  expect((await trail({ after: '1', limit: '2' })).map(({ seq }) => seq)).toEqual([2, 3])
  expect((await trail({ limit: '2' })).map(({ seq }) => seq)).toEqual(seqs.slice(-2).reverse())
  // Entry 2 binds the sender's client id: a program that checks the chain needs it, a person does not.
  expect(all[1]).toMatchObject({ kind: 'bind' })
  expect((await trail({ before: '4', limit: '10' })).map(({ seq }) => seq)).toEqual([3, 1])
  const wrong: Record<string, string>[] = [
    { after: '0', before: '9' },
    { limit: '0' },
    { limit: '501' },
    { after: 'x' },
    { page: '2' },
  ]
  for (const query of wrong) {
    expect((await call(readTrail, by(owner, { query }))).code, JSON.stringify(query)).toBe('invalid-fields')
  }
})

test('the ETag changes with every entry, and an unchanged budget is not sent again', async () => {
  const first = await call(readBudget, by(owner))
  const etag = first.headers.get('etag') ?? ''
  expect(etag).toMatch(/^"\d+-\d+-[0-9a-f]{64}"$/)
  const same = await call(readBudget, by(owner, { headers: { 'if-none-match': etag } }))
  expect([same.status, same.headers.get('etag'), await same.response.text()]).toEqual([304, etag, ''])
  await edit([{ line: 'cable', field: 'loss', value: '2 dB' }])
  expect((await call(readBudget, by(owner, { headers: { 'if-none-match': etag } }))).status).toBe(200)
})

test('a budget that is not one’s own looks like one that does not exist', async () => {
  const foreign = await call(readBudget, by(ada))
  const unknown = await call(readBudget, by(ada, { params: { id: 'no-such-budget' } }))
  expect(foreign.status).toBe(404)
  expect(foreign.json).toEqual(unknown.json)
  expect([...foreign.headers]).toEqual([...unknown.headers])
})

test('a member may what the role says, from the next request on', async () => {
  const person = ada.identity.person
  const give = (role: string) => call(setMember, by(owner, { params: { id, person }, json: { role } }))
  const write = () => edit([{ line: 'cable', field: 'loss', value: '2 dB' }], { person: ada })
  expect((await give('viewer')).status).toBe(204)
  expect((await call(readBudget, by(ada))).status).toBe(200)
  expect((await write()).code).toBe('not-allowed')
  expect((await give('editor')).status).toBe(204)
  expect((await write()).status).toBe(200)
  expect((await call(setMember, by(ada, { params: { id, person }, json: { role: 'owner' } }))).code).toBe('not-allowed')
  expect((await call(listMembers, by(ada))).json).toMatchObject({
    members: expect.arrayContaining([{ person: expect.objectContaining({ id: person }), role: 'editor' }]),
  })
  expect((await call(removeMember, by(owner, { params: { id, person } }))).status).toBe(204)
  expect((await call(readBudget, by(ada))).code).toBe('not-found')
})

test('a budget keeps an owner, and only people become members', async () => {
  const self = { id, person: owner.identity.person }
  expect((await call(removeMember, by(owner, { params: self }))).code).toBe('last-owner')
  expect((await call(setMember, by(owner, { params: self, json: { role: 'viewer' } }))).code).toBe('last-owner')
  const nobody = { params: { id, person: 'nobody' }, json: { role: 'viewer' } }
  expect((await call(setMember, by(owner, nobody))).code).toBe('no-such-person')
  const role = { params: { id, person: ada.identity.person }, json: { role: 'king' } }
  expect((await call(setMember, by(owner, role))).json).toMatchObject({ errors: [{ field: 'role' }] })
})

test('a budget that cannot be served says so to its members', async () => {
  const { budgets } = sheet.services
  publish({
    ...sheet.services,
    budgets: { ...budgets, read: async () => null, evaluation: async () => null, trail: async () => null },
  })
  try {
    for (const route of [readBudget, readEvaluation, readTrail]) {
      expect(await call(route, by(owner))).toMatchObject({ status: 503, code: 'budget-locked' })
    }
  } finally {
    publish(sheet.services)
  }
})

test('[W3.57] no GET handler writes a byte to the databases', async () => {
  const { cookie } = await sheet.as()
  await call(readEvaluation, by(owner))
  const before = await fingerprint()
  const reading = (await routes()).filter(({ method }) => method === 'GET')
  expect(reading.length).toBeGreaterThan(8)
  for (const { route } of reading) {
    const { status } = await call(route, { params: { id }, headers: { cookie } })
    expect(status).toBe(route.declaration.path.endsWith('{sha256}') ? 404 : 200)
  }
  expect(await fingerprint()).toBe(before)
  await call(signOut, { headers: { cookie } })
  expect(await fingerprint()).not.toBe(before)
})

/** Over the bytes of both databases and their logs, but not their shared-memory indices, in which readers take locks. */
async function fingerprint(): Promise<string> {
  const hash = createHash('sha256')
  for (const file of (await readdir(sheet.directory)).filter((name) => /\.sqlite(-wal)?$/.test(name)).sort()) {
    hash.update(file).update(await readFile(join(sheet.directory, file)))
  }
  return hash.digest('hex')
}
