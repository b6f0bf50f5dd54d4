import { afterAll, afterEach, beforeEach, expect, test, vi } from 'vitest'
import { z } from 'zod'
import { declare } from '../../../app/api/declaration'
import { Problem } from '../../../app/api/problem'
import { change, type Reply, read } from '../../../app/api/wrapper'
import { publishedServices, services } from '../../../app/services'
import { PUBLIC_URL, publish, requestOf, type Sent } from './caller'

const logged = vi.spyOn(console, 'error')
beforeEach(() => {
  logged.mockReset()
  logged.mockImplementation(() => {})
  publish({ publicUrl: PUBLIC_URL } as never)
})
afterEach(() => publish(undefined))
afterAll(() => logged.mockRestore())

const body = z.strictObject({
  name: z.string().min(1, 'Type something.'),
  list: z
    .array(z.union([z.strictObject({ a: z.number() }), z.strictObject({ b: z.string(), c: z.string() })]))
    .default([]),
})
const saved = declare({
  method: 'POST',
  path: '/api/v1/test',
  operation: 'test',
  summary: 'For this test.',
  admission: 'open',
  query: z.strictObject({ n: z.coerce.number().optional() }),
  body: { json: body, limit: 1000 },
  answer: { status: 201, description: 'Saved.' },
})
const uploaded = declare({
  method: 'POST',
  path: '/api/v1/test',
  operation: 'upload',
  summary: 'For this test.',
  admission: 'open',
  body: { upload: ['application/pdf'], limit: 10 },
  answer: { status: 200, description: 'Stored.' },
})

async function post(sent: Sent, handler: (call: object) => Reply | Response = () => ({})) {
  const route = change(saved, handler)
  const response = await route(requestOf(saved, sent), { params: Promise.resolve({}) })
  const text = await response.text()
  return { response, json: text === '' ? null : JSON.parse(text) }
}

test('what a handler gets has been read by its schema', async () => {
  const seen: unknown[] = []
  const { response } = await post({ json: { name: 'x' }, query: { n: '3' } }, (call) => {
    seen.push(call)
    return { headers: { location: '/there' }, cookies: ['a=1', 'b=2'] }
  })
  expect(seen[0]).toMatchObject({ body: { name: 'x', list: [] }, query: { n: 3 }, identity: null })
  expect(response.status).toBe(201)
  expect(response.headers.get('location')).toBe('/there')
  expect(response.headers.getSetCookie()).toEqual(['a=1', 'b=2'])
})

test('every field that cannot be taken is named, with what to do', async () => {
  const { response, json } = await post({
    json: { name: '', list: [{ a: 1 }, { b: 'x', c: 2 }, { a: 'x' }], more: 1 },
    query: { m: '1' },
  })
  expect(response.status).toBe(422)
  expect(json.errors).toEqual([{ field: 'm', todo: 'Leave it out; there is no such field.' }])
  const second = await post({ json: { name: '', list: [{ a: 1 }, { b: 'x', c: 2 }, { a: 'x' }], more: 1 } })
  expect(second.json.errors.map(({ field }: { field: string }) => field)).toEqual([
    'name',
    'list[1].c',
    'list[2].a',
    'more',
  ])
  expect(second.json.errors[0].todo).toBe('Type something.')
})

test.each([
  ['{"name": "x",}', 'Line 1, column 14'],
  ['{"name": "x"\n "a": 1}', 'Line 2'],
  ['{"name": "x", "name": "y"}', "'name'"],
  ['', 'Line 1'],
])('%j is refused as JSON, with the place', async (raw, place) => {
  const { response, json } = await post({ raw, headers: { 'content-type': 'application/json' } })
  expect(response.status).toBe(400)
  expect(json).toMatchObject({ code: 'bad-json' })
  expect(json.detail).toContain(place)
})

test('a body that is not UTF-8 is refused', async () => {
  const { json } = await post({
    raw: new Uint8Array([0x22, 0xff, 0x22]),
    headers: { 'content-type': 'application/json; charset=utf-8' },
  })
  expect(json).toMatchObject({ code: 'bad-json', detail: 'The body is not UTF-8.' })
})

test('a body without a length is cut off where it grows past its limit', async () => {
  let sent = 0
  let stopped = false
  const raw = new ReadableStream<Uint8Array>({
    pull(controller) {
      sent++
      controller.enqueue(new Uint8Array(400).fill(0x20))
    },
    cancel() {
      stopped = true
    },
  })
  const { json } = await post({ raw, headers: { 'content-type': 'application/json' } })
  expect(json).toMatchObject({ code: 'too-large', status: 413 })
  expect(stopped).toBe(true)
  expect(sent).toBeLessThan(6)
})

test('an upload is handed on as it arrives and cut off past its limit', async () => {
  const read: number[] = []
  const route = change(uploaded, async ({ body: file }) => {
    for await (const chunk of file.bytes) read.push(chunk.length)
    return { headers: { 'x-type': file.mediaType } }
  })
  const send = (raw: string) =>
    route(requestOf(uploaded, { raw, headers: { 'content-type': 'Application/PDF' } }), { params: Promise.resolve({}) })
  const fits = await send('0123456789')
  expect([fits.status, fits.headers.get('x-type'), read]).toEqual([200, 'application/pdf', [10]])
  expect((await send('0123456789a')).status).toBe(413)
})

test('an error that nobody foresaw is told as a number, and logged under it', async () => {
  const { response, json } = await post({ json: { name: 'x' } }, () => {
    throw new Error('secret: the password is tulip')
  })
  expect(response.status).toBe(500)
  expect(response.headers.get('content-type')).toBe('application/problem+json')
  expect(JSON.stringify(json)).not.toContain('tulip')
  expect(json).toMatchObject({ code: 'internal', type: 'urn:halfbaud:problem:internal' })
  expect(json.instance).toMatch(/^urn:uuid:[0-9a-f-]{36}$/)
  const [line, error] = logged.mock.calls[0] ?? []
  expect(line).toBe(`${json.instance.slice('urn:uuid:'.length)} POST /api/v1/test`)
  expect(String(error)).toContain('tulip')
})

test('a problem that a handler throws is answered as it is, and not logged', async () => {
  const { response, json } = await post({ json: { name: 'x' } }, () => {
    throw new Problem('slow-down', { retryAfterS: 7, detail: 'Really.' })
  })
  expect(response.status).toBe(429)
  expect(response.headers.get('retry-after')).toBe('7')
  expect(json).toEqual({
    type: 'urn:halfbaud:problem:slow-down',
    title: 'Too many wrong passwords',
    status: 429,
    code: 'slow-down',
    todo: 'Wait as many seconds as Retry-After says, then try again.',
    detail: 'Really.',
  })
  expect(logged).not.toHaveBeenCalled()
})

test('a reading wrapper takes no changing operation, and the other way round', () => {
  const reading = declare({ ...saved, method: 'GET', body: null })
  expect(() => change(reading, () => ({}))).toThrow('GET changes nothing')
  const bodiless = declare({ ...saved, body: null })
  expect(() => read(bodiless, () => ({}))).toThrow('is no GET')
})

test('pages are told to start the server where it has not published its services', () => {
  expect(services()).toBe(publishedServices())
  publish(undefined)
  expect(publishedServices()).toBeNull()
  expect(() => services()).toThrow('npm start')
})
