import { afterAll, afterEach, beforeAll, expect, test, vi } from 'vitest'
import { DELETE as removeEntry } from '../../../app/api/v1/catalogues/[id]/route'
import { POST as addEntry, GET as listEntries } from '../../../app/api/v1/catalogues/route'
import { PUBLISHED_ALLOWANCES } from '../../../lib/budget/catalogues/allowances'
import { LAMINATE_CLASSES } from '../../../lib/budget/catalogues/laminates'
import { PUBLISHED_PACKAGES } from '../../../lib/budget/catalogues/packages'
import { call } from './caller'
import { openWorksheet, type Person } from './worksheet'

let sheet: Awaited<ReturnType<typeof openWorksheet>>
let owner: Person
let ada: Person
let ben: Person
const logged = vi.spyOn(console, 'error')

beforeAll(async () => {
  sheet = await openWorksheet()
  owner = await sheet.as()
  const [first, second] = [
    await sheet.access.addPerson({ name: 'Ada', email: 'ada@example.com' }),
    await sheet.access.addPerson({ name: 'Ben', email: 'ben@example.com' }),
  ]
  ada = await sheet.as('ada@example.com', first?.password)
  ben = await sheet.as('ben@example.com', second?.password)
})
afterEach(() => expect(logged).not.toHaveBeenCalled())
afterAll(async () => {
  logged.mockRestore()
  await sheet.close()
})

type Listed = { id: string; kind: string; entry: object; person: string; time: number; mayRemove: boolean }
const list = async (by: Person) =>
  ((await call(listEntries, { headers: { cookie: by.cookie } })).json as { entries: Listed[] }).entries
const add = (by: Person, json: unknown) => call(addEntry, { json, headers: { cookie: by.cookie } })
const remove = (by: Person, id: string) => call(removeEntry, { params: { id }, headers: { cookie: by.cookie } })

const { id: _, ...published } = PUBLISHED_ALLOWANCES[0] ?? { id: '' }
const own = { name: 'Alder, board to board', limit: '18 dB', at: '12.890625 GHz', confidence: 'own' }

test('whoever is signed in adds an entry, and everybody on the server finds it with who and when', async () => {
  const added = await add(ada, { kind: 'allowance', entry: own })
  expect(added.status).toBe(201)
  const { id } = added.json as { id: string }
  expect(added.headers.get('location')).toBe(`/api/v1/catalogues/${id}`)
  const found = (await list(ben)).find((one) => one.id === id)
  expect(found).toMatchObject({ kind: 'allowance', personName: 'Ada', mayRemove: false })
  expect(found?.person).toBe(ada.identity.person)
  expect(found?.entry).toMatchObject({ ...own, curve: null, split: [] })
  expect(found?.time).toBeGreaterThan(1_700_000_000_000)
  expect((await remove(ada, id)).status).toBe(204)
  expect((await list(ada)).some((one) => one.id === id)).toBe(false)
})

test('entries of every kind come back as they were added', async () => {
  const entries = [
    { kind: 'allowance', entry: published },
    { kind: 'laminate', entry: (({ id, ...rest }) => rest)(LAMINATE_CLASSES[0] ?? { id: '' }) },
    { kind: 'package', entry: (({ id, ...rest }) => rest)(PUBLISHED_PACKAGES[0] ?? { id: '' }) },
  ]
  for (const entry of entries) {
    const { json } = await add(ada, entry)
    const { id } = json as { id: string }
    expect((await list(owner)).find((one) => one.id === id)).toMatchObject(entry)
    expect((await remove(ada, id)).status).toBe(204)
  }
})

test('what is no entry is refused with the place of the mistake', async () => {
  const wrong = await add(ada, { kind: 'allowance', entry: { ...own, limit: '-18 dB', colour: 'red' } })
  expect(wrong.code).toBe('invalid-fields')
  const { errors } = wrong.json as { errors: { field: string; todo: string }[] }
  expect(errors.map(({ field }) => field)).toEqual(['entry.limit', 'entry.colour'])
  expect(errors[0]?.todo).toContain('leave the minus sign out')
  expect((await add(ada, { kind: 'colour', entry: {} })).code).toBe('invalid-fields')
  expect((await add(ada, { kind: 'laminate', entry: own })).code).toBe('invalid-fields')
  expect(await list(ada)).toEqual([])
})

test('an entry is removed by who added it or by the administrator, by nobody else', async () => {
  const ids = [
    await add(ada, { kind: 'allowance', entry: own }),
    await add(ada, { kind: 'allowance', entry: own }),
  ].map(({ json }) => (json as { id: string }).id)
  const [first = '', second = ''] = ids
  expect(await remove(ben, first)).toMatchObject({ status: 403, code: 'not-allowed' })
  expect((await list(ben)).map(({ id }) => id).sort()).toEqual([...ids].sort())
  expect(owner.identity.administrator).toBe(true)
  for (const by of [owner, ada]) expect((await list(by)).every(({ mayRemove }) => mayRemove)).toBe(true)
  expect((await remove(owner, first)).status).toBe(204)
  expect((await remove(ada, second)).status).toBe(204)
  expect(await remove(ada, second)).toMatchObject({ status: 404, code: 'not-found' })
})

test('who is not signed in sees and adds nothing', async () => {
  expect((await call(listEntries)).code).toBe('not-signed-in')
  expect((await call(addEntry, { json: { kind: 'allowance', entry: own } })).code).toBe('not-signed-in')
  expect(await list(ada)).toEqual([])
})
