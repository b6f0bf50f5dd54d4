import { z } from 'zod'
import { budgetJsonSchema } from '../../lib/budget/jsonSchema'
import { type Answer, type Declaration, type JsonBody, problemsOf, type UploadBody } from './declaration'
import { OPERATIONS } from './operations'
import { PROBLEMS, type ProblemCode } from './problems'
import { budget } from './schemas/budgets'
import { component, components } from './schemas/components'

type Json = Record<string, unknown>

const REF = '#/components/schemas/'
const problem = component(
  'Problem',
  z.strictObject({
    type: z.string().meta({ description: 'urn:halfbaud:problem: and the code.' }),
    title: z.string(),
    status: z.number().int(),
    code: z.enum(Object.keys(PROBLEMS) as [ProblemCode, ...ProblemCode[]]),
    todo: z.string().meta({ description: 'What to do.' }),
    detail: z.string().optional(),
    errors: z.array(z.strictObject({ field: z.string(), todo: z.string() })).optional(),
    instance: z.string().optional().meta({ description: 'The number under which the log has it.' }),
    refusal: z.string().optional().meta({ description: "The gate's own code of a refused edit." }),
  }),
)

/** OpenAPI 3.1 (spec.openapis.org/oas/v3.1.1), written from the declarations that the wrapper enforces. */
export function openapiDocument(publicUrl: string, engine: string): Json {
  const secure = publicUrl.startsWith('https://')
  return {
    openapi: '3.1.1',
    info: {
      title: 'Halfbaud',
      version: '1',
      description: `Loss budgets of high-speed serial links. Losses are positive decibels. Engine ${engine}. Problems are RFC 9457 details with a code of a closed list.`,
    },
    servers: [{ url: publicUrl }],
    paths: pathsOf(OPERATIONS),
    components: {
      schemas: schemas(),
      securitySchemes: {
        cookie: { type: 'apiKey', in: 'cookie', name: `${secure ? '__Secure-' : ''}halfbaud.session_token` },
        token: { type: 'http', scheme: 'bearer' },
      },
    },
  }
}

function pathsOf(operations: readonly Declaration[]): Json {
  const paths: Record<string, Json> = {}
  for (const operation of operations) {
    paths[operation.path] = { ...paths[operation.path], [operation.method.toLowerCase()]: operationOf(operation) }
  }
  return paths
}

function operationOf(declaration: Declaration): Json {
  const { operation, summary, admission, body } = declaration
  const parameters = parametersOf(declaration)
  return {
    operationId: operation,
    summary,
    ...(typeof admission === 'object' && { description: `Needs the role ${admission.role} in the budget.` }),
    security: admission === 'open' ? [] : admission === 'session' ? [{ cookie: [] }] : [{ cookie: [] }, { token: [] }],
    ...(parameters.length > 0 && { parameters }),
    ...(body && { requestBody: { required: true, content: contentOf(body, operation) } }),
    responses: responsesOf(declaration),
  }
}

function parametersOf({ path, query, headers }: Declaration): Json[] {
  const inPath = [...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => ({
    name,
    in: 'path',
    required: true,
    schema: { type: 'string' },
  }))
  return [...inPath, ...fieldsAs('query', query), ...fieldsAs('header', headers)]
}

function fieldsAs(place: 'query' | 'header', schema: z.ZodObject | undefined): Json[] {
  return Object.entries(schema?.shape ?? {}).map(([name, field]) => {
    const { $schema: _, description, ...rest } = z.toJSONSchema(field as z.ZodType, { io: 'output' })
    const required = !(field as z.ZodType).safeParse(undefined).success
    return { name, in: place, required, ...(description !== undefined && { description }), schema: rest }
  })
}

function contentOf(body: JsonBody | UploadBody, operation: string): Json {
  if ('upload' in body) return Object.fromEntries(body.upload.map((type) => [type, {}]))
  return { 'application/json': { schema: { $ref: `${REF}${bodyName(body, operation)}` } } }
}

function responsesOf(declaration: Declaration): Json {
  const { operation, answer, also = [] } = declaration
  const answers = [answer, ...also].map((each) => [each.status, responseOf(each, operation)])
  return { ...Object.fromEntries(answers), ...failures(declaration) }
}

function responseOf({ description, json, mediaType }: Answer, operation: string): Json {
  if (json) {
    return {
      description,
      content: { 'application/json': { schema: { $ref: `${REF}${answerName(json, operation)}` } } },
    }
  }
  return { description, ...(mediaType && { content: { [mediaType]: {} } }) }
}

function failures(declaration: Declaration): Json {
  const byStatus = new Map<number, ProblemCode[]>()
  for (const code of problemsOf(declaration)) {
    const { status } = PROBLEMS[code]
    byStatus.set(status, [...(byStatus.get(status) ?? []), code])
  }
  return Object.fromEntries(
    [...byStatus].map(([status, codes]) => [
      status,
      {
        description: codes.map((code) => `${code}: ${PROBLEMS[code].title}.`).join(' '),
        content: { 'application/problem+json': { schema: { $ref: `${REF}${components.get(problem)}` } } },
      },
    ]),
  )
}

function answerName(schema: z.ZodType, operation: string): string {
  return components.get(schema) ?? `${operation}Answer`
}

/** A budget is read with defaults for what is left out, and written with every field: two shapes, two names. */
function bodyName({ json }: JsonBody, operation: string): string {
  return json === budget ? 'BudgetFile' : (components.get(json) ?? `${operation}Body`)
}

function schemas(): Json {
  const answers = new Map(components)
  const bodies = new Map(components).set(budget, 'BudgetFile')
  for (const { operation, answer, body } of OPERATIONS) {
    if (answer.json) answers.set(answer.json, answerName(answer.json, operation))
    if (body && 'json' in body) bodies.set(body.json, bodyName(body, operation))
  }
  return { ...generated(bodies, 'input'), ...generated(answers, 'output'), BudgetFile: plain(budgetJsonSchema()) }
}

/** The schemas as JSON Schema (draft 2020-12) under their names; where one contains another, by reference. */
function generated(names: ReadonlyMap<z.ZodType, string>, io: 'input' | 'output'): Json {
  const registry = z.registry<{ id: string }>()
  for (const [schema, id] of names) registry.add(schema, { id })
  const { schemas } = z.toJSONSchema(registry, { io, uri: (id) => `${REF}${id}` })
  return Object.fromEntries(Object.entries(schemas).map(([id, schema]) => [id, plain(schema as Json)]))
}

/** Identifiers of their own would change what a $ref inside the document is relative to. */
function plain({ $schema: _schema, $id: _id, ...schema }: Json): Json {
  return schema
}
