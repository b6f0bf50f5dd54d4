import { createHash } from 'node:crypto'
import { readdir } from 'node:fs/promises'
import { join } from 'node:path'
import { afterAll, beforeAll, expect, test, vi } from 'vitest'
import { attachment } from '../../../app/api/v1/budgets/[id]/evidence/[sha256]/attachment'
import { GET as fetchEvidence } from '../../../app/api/v1/budgets/[id]/evidence/[sha256]/route'
import { POST as attach, GET as listEvidence } from '../../../app/api/v1/budgets/[id]/evidence/route'
import { link } from '../../budget/links'
import { call, publish, type Sent } from './caller'
import { openWorksheet, type Person } from './worksheet'

const FILE = '! Two ports, invented\n# GHz S DB R 50\n1 -20 0 -1 0 -1 0 -20 0\n'
const SHA256 = createHash('sha256').update(FILE).digest('hex')

let sheet: Awaited<ReturnType<typeof openWorksheet>>
let owner: Person
let id: string
const logged = vi.spyOn(console, 'error')

beforeAll(async () => {
  sheet = await openWorksheet()
  owner = await sheet.as()
  id = (await sheet.services.budgets.create(owner.identity, 'screen', link({}))).id
})
afterAll(async () => {
  expect(logged).not.toHaveBeenCalled()
  expect(sheet.logged).toEqual([])
  logged.mockRestore()
  await sheet.close()
})

const mine = (sent: Sent = {}): Sent => ({
  params: { id },
  ...sent,
  headers: { cookie: owner.cookie, 'content-type': 'application/octet-stream', ...sent.headers },
})
const upload = (name: string, raw: BodyInit = FILE, headers: Sent['headers'] = {}) =>
  call(attach, mine({ query: { name }, raw, headers }))

test('a file is stored by its SHA-256, listed, and given back byte for byte, to be saved only', async () => {
  const stored = await upload('Kabel „α“ 1m.s2p')
  const description = { sha256: SHA256, name: 'Kabel „α“ 1m.s2p', size: FILE.length, person: owner.identity.person }
  expect(stored).toMatchObject({ status: 201, json: description })
  expect(stored.headers.get('location')).toBe(`/api/v1/budgets/${id}/evidence/${SHA256}`)
  expect((await call(listEvidence, mine())).json).toMatchObject({ evidence: [description] })
  const { headers, response } = await call(fetchEvidence, mine({ params: { id, sha256: SHA256 } }))
  expect(await response.text()).toBe(FILE)
  expect(headers.get('content-type')).toBe('application/octet-stream')
  expect(headers.get('content-disposition')).toMatch(/^attachment; filename="/)
  expect(headers.get('x-content-type-options')).toBe('nosniff')
  expect(headers.get('content-security-policy')).toBe("default-src 'none'; sandbox")
  expect(headers.get('content-length')).toBe(String(FILE.length))
})

test('a page that somebody uploads is not shown as one', async () => {
  const page = '<script>alert(1)</script>'
  expect((await upload('page.html', page, { 'content-type': 'text/html' })).code).toBe('content-type')
  const { json } = await upload('page.html', page)
  const { sha256 } = json as { sha256: string }
  const { headers } = await call(fetchEvidence, mine({ params: { id, sha256 } }))
  expect(headers.get('content-type')).toBe('application/octet-stream')
  expect(headers.get('content-disposition')).toContain('attachment')
})

test('a file of another budget, an unknown one and a name that is no SHA-256 are not found', async () => {
  const other = (await sheet.services.budgets.create(owner.identity, 'screen', link({}))).id
  for (const params of [
    { id: other, sha256: SHA256 },
    { id, sha256: '0'.repeat(64) },
    { id, sha256: '../../records.sqlite' },
    { id, sha256: SHA256.toUpperCase() },
  ]) {
    expect((await call(fetchEvidence, mine({ params }))).code, JSON.stringify(params)).toBe('not-found')
  }
})

test('a file name is one line without a folder', async () => {
  for (const name of ['', '  ', '../x', 'a\\b', 'a\nb', 'x'.repeat(201)]) {
    expect((await upload(name)).json, name).toMatchObject({ code: 'invalid-fields', errors: [{ field: 'name' }] })
  }
})

test('[W6.41] an upload over 100 MB is cut off while it comes, and nothing of it stays', async () => {
  const before = await files()
  const chunk = new Uint8Array(4 * 1024 * 1024)
  let sent = 0
  const endless = new ReadableStream<Uint8Array>({
    pull: (controller) => {
      sent += chunk.length
      controller.enqueue(chunk)
    },
  })
  expect((await upload('large.bin', endless)).code).toBe('too-large')
  expect(sent).toBeLessThan(120 * 1024 * 1024)
  expect((await upload('large.bin', 'x', { 'content-length': String(100 * 1024 * 1024 + 1) })).code).toBe('too-large')
  expect(await files()).toEqual(before)
})

test('where the store takes less, that is said too', async () => {
  const { evidence } = sheet.services
  const store = async () => {
    throw Object.assign(new Error('Attach a smaller file.'), { name: 'EvidenceTooLarge' })
  }
  publish({ ...sheet.services, evidence: { ...evidence, store } })
  try {
    expect((await upload('a.bin')).json).toMatchObject({ code: 'too-large', detail: 'Attach a smaller file.' })
  } finally {
    publish(sheet.services)
  }
})

test.each([
  ['plain.s4p', `attachment; filename="plain.s4p"; filename*=UTF-8''plain.s4p`],
  ['a "b"; c.pdf', `attachment; filename="a _b__ c.pdf"; filename*=UTF-8''a%20%22b%22%3B%20c.pdf`],
  ["é'(1)*.csv", `attachment; filename="__(1)_.csv"; filename*=UTF-8''%C3%A9%27%281%29%2A.csv`.replace('(1)_', '_1__')],
])('%s is named so that no header is broken (RFC 6266, RFC 8187)', (name, header) => {
  expect(attachment(name)).toBe(header)
})

async function files(): Promise<string[]> {
  return (await readdir(join(sheet.directory, 'evidence'), { recursive: true })).sort()
}
