import { afterAll, beforeAll, expect, test } from 'vitest'
import { GET as listEvidence } from '../../../app/api/v1/budgets/[id]/evidence/route'
import { GET as readBudget } from '../../../app/api/v1/budgets/[id]/route'
import { POST as makeFromExample } from '../../../app/api/v1/examples/[id]/route'
import { call } from './caller'
import { openWorksheet, type Person } from './worksheet'

let sheet: Awaited<ReturnType<typeof openWorksheet>>
let owner: Person

beforeAll(async () => {
  sheet = await openWorksheet()
  owner = await sheet.as()
})
afterAll(async () => {
  expect(sheet.logged).toEqual([])
  await sheet.close()
})

const mine = (id: string) => ({ params: { id }, headers: { cookie: owner.cookie } })

test('the examples are offered with the verdict that their files give', async () => {
  const offered = await sheet.services.examples.list()
  expect(offered.map(({ id, verdict }) => [id, verdict])).toEqual([
    ['larch', 'inside'],
    ['osier', 'over'],
    ['sedge', 'inside'],
    ['tamarack', 'tight'],
  ])
  expect(offered[0]).toMatchObject({ name: 'Larch mezzanine', words: 'inside' })
})

test('a budget made from one is its own, with the files attached', async () => {
  const made = await call(makeFromExample, mine('larch'))
  expect(made.status).toBe(201)
  const { id } = made.json as { id: string }
  expect(made.headers.get('location')).toBe(`/api/v1/budgets/${id}`)
  expect((await call(readBudget, mine(id))).json).toMatchObject({ budget: { head: { name: 'Larch mezzanine' } } })
  const { evidence } = (await call(listEvidence, mine(id))).json as { evidence: { name: string; person: string }[] }
  expect(evidence.map(({ name }) => name).sort()).toEqual(['larch-connector.s4p', 'larch-mezzanine-line.s2p'])
  for (const { person } of evidence) expect(person).toBe(owner.identity.person)
})

test('what is no example is not found', async () => {
  for (const id of ['birch', '', '../people', 'people']) {
    expect((await call(makeFromExample, mine(id))).code, id).toBe('not-found')
  }
})
