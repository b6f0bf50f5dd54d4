import { afterAll, beforeAll, expect, test } from 'vitest'
import { z } from 'zod'
import { problemsOf } from '../../../app/api/declaration'
import { openapiDocument } from '../../../app/api/openapi'
import { OPERATIONS } from '../../../app/api/operations'
import { PROBLEMS } from '../../../app/api/problems'
import { GET } from '../../../app/api/v1/openapi.json/route'
import { call, PUBLIC_URL, publish } from './caller'

const reference = z.strictObject({ $ref: z.string().startsWith('#/components/schemas/') })
const media = z.record(z.string().regex(/^[\w.+-]+\/[\w.+-]+$/), z.strictObject({ schema: reference.optional() }))
/** The parts of an OpenAPI 3.1 document that this one uses (OpenAPI Specification 3.1.1, chapter 4; from memory). */
const structure = z.strictObject({
  openapi: z.string().regex(/^3\.1\.\d+$/),
  info: z.strictObject({ title: z.string(), version: z.string(), description: z.string() }),
  servers: z.array(z.strictObject({ url: z.url() })).min(1),
  paths: z.record(
    z.string().startsWith('/'),
    z.partialRecord(
      z.enum(['get', 'put', 'post', 'delete']),
      z.strictObject({
        operationId: z.string().regex(/^[a-z][A-Za-z]+$/),
        summary: z.string().min(5),
        description: z.string().optional(),
        security: z.array(z.partialRecord(z.enum(['cookie', 'token']), z.tuple([]))),
        parameters: z
          .array(
            z.strictObject({
              name: z.string(),
              in: z.enum(['path', 'query', 'header']),
              required: z.boolean(),
              description: z.string().optional(),
              schema: z.looseObject({ type: z.string() }),
            }),
          )
          .optional(),
        requestBody: z.strictObject({ required: z.literal(true), content: media }).optional(),
        responses: z.record(
          z.string().regex(/^[2-5]\d\d$/),
          z.strictObject({ description: z.string().min(3), content: media.optional() }),
        ),
      }),
    ),
  ),
  components: z.strictObject({
    schemas: z.record(z.string().regex(/^[A-Za-z0-9._-]+$/), z.looseObject({})),
    securitySchemes: z.strictObject({
      cookie: z.strictObject({ type: z.literal('apiKey'), in: z.literal('cookie'), name: z.string() }),
      token: z.strictObject({ type: z.literal('http'), scheme: z.literal('bearer') }),
    }),
  }),
})

const document = openapiDocument(PUBLIC_URL, 'x')
const parsed = structure.parse(document)
const operations = Object.entries(parsed.paths).flatMap(([path, methods]) =>
  Object.entries(methods).map(([method, operation]) => ({ path, method, operation })),
)

beforeAll(() => publish({ publicUrl: PUBLIC_URL, engine: 'x' } as never))
afterAll(() => publish(undefined))

test('the document is served to anybody, and is JSON all through', async () => {
  const { status, json } = await call(GET)
  expect(status).toBe(200)
  expect(json).toEqual(JSON.parse(JSON.stringify(document)))
})

test('it has the operations of the routes, each with an id of its own', () => {
  const inDocument = operations.map(({ path, method }) => `${method.toUpperCase()} ${path}`).sort()
  expect(inDocument).toEqual(OPERATIONS.map(({ path, method }) => `${method} ${path}`).sort())
  expect(new Set(operations.map(({ operation }) => operation.operationId)).size).toBe(OPERATIONS.length)
})

test('what an operation takes and answers is what the wrapper enforces', () => {
  for (const declaration of OPERATIONS) {
    const found = operations.find(({ operation }) => operation.operationId === declaration.operation)
    if (!found) throw new Error(`${declaration.operation} is missing`)
    const { responses, requestBody, parameters = [], security } = found.operation
    const problems = problemsOf(declaration).map((code) => String(PROBLEMS[code].status))
    const also = (declaration.also ?? []).map(({ status }) => String(status))
    expect(new Set(Object.keys(responses))).toEqual(new Set([String(declaration.answer.status), ...also, ...problems]))
    expect(requestBody !== undefined).toBe(Boolean(declaration.body))
    expect(security.length > 0).toBe(declaration.admission !== 'open')
    expect(security.some((scheme) => 'token' in scheme)).toBe(
      !['open', 'session'].includes(String(declaration.admission)),
    )
    const inPath = parameters.filter((parameter) => parameter.in === 'path').map(({ name }) => `{${name}}`)
    expect(inPath).toEqual(declaration.path.match(/\{\w+\}/g) ?? [])
  }
})

test('every reference leads somewhere, and every schema is used', () => {
  const references = [...JSON.stringify(document).matchAll(/"\$ref":"([^"]+)"/g)].map(([, target]) => target ?? '')
  const used = new Set(references.map((target) => target.replace('#/components/schemas/', '')))
  expect(used).toEqual(new Set(Object.keys(parsed.components.schemas)))
})

test('no schema has an identifier or dialect of its own that would turn its references elsewhere', () => {
  for (const schema of Object.values(parsed.components.schemas)) {
    expect(Object.keys(schema)).not.toContain('$id')
    expect(Object.keys(schema)).not.toContain('$schema')
  }
})

test('over https the cookie has its secure name', () => {
  const secure = structure.parse(openapiDocument('https://budgets.example.com', 'x'))
  expect(secure.components.securitySchemes.cookie.name).toBe('__Secure-halfbaud.session_token')
  expect(parsed.components.securitySchemes.cookie.name).toBe('halfbaud.session_token')
})

test('[W3.54] the list of problems is closed: every code is declared by an operation, and has words', () => {
  const declared = new Set(OPERATIONS.flatMap(problemsOf))
  expect([...declared].sort()).toEqual(Object.keys(PROBLEMS).sort())
  for (const { status, title, todo } of Object.values(PROBLEMS)) {
    expect(status).toBeGreaterThanOrEqual(400)
    expect(title).toMatch(/^[A-Z].*[^.]$/)
    expect(todo).toMatch(/^[A-Z].*\.$/)
  }
})
