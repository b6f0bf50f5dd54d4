import { readdir, readFile } from 'node:fs/promises'
import { basename, join } from 'node:path'
import { z } from 'zod'
import { readJson } from '../budget/jsonText'
import { type Budget, budgetSchema, DISCIPLINES, ID } from '../budget/schema'
import { sha256Hex } from '../records/sha256'
import type { Role } from '../sheet/wire'
import type { AttachedFile } from '../sync/services'

/** The invented people and links of seed-scenarios. */
export type Scenarios = {
  readonly people: readonly ScenarioPerson[]
  readonly links: readonly ScenarioLink[]
}
export type ScenarioPerson = z.output<typeof person>
export type ScenarioLink = {
  /** Name of the file, without its ending. */
  readonly id: string
  readonly budget: Budget
  /** The files that its evidence names, also that of lines which were taken out. */
  readonly files: readonly ScenarioFile[]
  /** Person id of people.json → role; exactly one owner. */
  readonly members: Readonly<Record<string, Role>>
}

export type ScenarioFile = {
  readonly name: string
  readonly mediaType: string
  readonly sha256: string
  readonly bytes: Uint8Array
}

const PEOPLE = 'people.json'

const person = z.strictObject({
  id: z.string().regex(ID),
  name: z.string().min(1),
  email: z.email(),
  disciplines: z.array(z.enum(DISCIPLINES)).min(1),
})

const peopleFile = z.strictObject({
  people: z.array(person).min(1),
  members: z.record(z.string(), z.record(z.string(), z.enum(['viewer', 'editor', 'approver', 'owner']))),
})

/**
 * Reads every budget file of the folder, by name, the files that its evidence names, and people.json beside them.
 * @throws Error that names the file, and what in it is wrong
 */
export async function readScenarios(folder: string): Promise<Scenarios> {
  const names = (await readdir(folder)).filter((name) => name.endsWith('.json') && name !== PEOPLE).sort()
  const { people, members } = await readChecked(folder, PEOPLE, peopleFile)
  const links = await Promise.all(
    names.map(async (name) => {
      const id = name.replace(/\.json$/, '')
      const budget = await readChecked(folder, name, budgetSchema)
      return { id, budget, files: await filesOf(folder, name, budget), members: members[id] ?? {} }
    }),
  )
  const wrong = contradiction(people, links, Object.keys(members))
  if (wrong !== null) throw new Error(`${join(folder, PEOPLE)}: ${wrong}`)
  return { people, links }
}

/** The link's files, to be attached to a budget made of it. */
export function attachedFiles({ files }: ScenarioLink): AttachedFile[] {
  return files.map(({ name, mediaType, bytes }) => ({ name, mediaType, bytes: inOnePiece(bytes) }))
}

async function* inOnePiece(bytes: Uint8Array) {
  yield bytes
}

/** A record that says another SHA-256 or size than its file has would be found by nobody, or lie. */
async function filesOf(folder: string, budgetName: string, { evidence }: Budget): Promise<ScenarioFile[]> {
  return Promise.all(
    Object.entries(evidence).map(async ([id, { name, mediaType, sha256, size }]) => {
      const wrong = (what: string) => new Error(`${join(folder, budgetName)}: evidence '${id}': ${what}`)
      if (name === null || basename(name) !== name || mediaType === null)
        throw wrong('give it a file name and a media type.')
      const bytes = await readFile(join(folder, name)).catch(() => null)
      if (bytes === null) throw wrong(`there is no file ${name} beside it.`)
      const own = { sha256: sha256Hex(bytes), size: bytes.byteLength }
      if (own.sha256 !== sha256 || own.size !== size)
        throw wrong(`${name} has the SHA-256 ${own.sha256} and ${own.size} bytes.`)
      return { name, mediaType, sha256, bytes }
    }),
  )
}

async function readChecked<T extends z.ZodType>(folder: string, name: string, schema: T): Promise<z.output<T>> {
  const path = join(folder, name)
  const read = readJson(await readFile(path, 'utf8'))
  if ('problem' in read) throw new Error(`${path}:${read.problem.line}:${read.problem.column}: ${read.problem.message}`)
  const result = schema.safeParse(read.value)
  if (!result.success) throw new Error(`${path}: ${z.prettifyError(result.error)}`)
  return result.data
}

function contradiction(
  people: readonly ScenarioPerson[],
  links: readonly ScenarioLink[],
  named: readonly string[],
): string | null {
  const ids = new Set(people.map(({ id }) => id))
  if (ids.size < people.length) return 'Two people have the same id.'
  if (new Set(people.map(({ email }) => email)).size < people.length) return 'Two people have the same e-mail.'
  for (const id of named) if (!links.some((link) => link.id === id)) return `There is no file ${id}.json.`
  for (const { id, members } of links) {
    const stranger = Object.keys(members).find((member) => !ids.has(member))
    if (stranger !== undefined) return `'${stranger}' of '${id}' is not among the people.`
    if (Object.values(members).filter((role) => role === 'owner').length !== 1) return `Give '${id}' exactly one owner.`
  }
  return null
}
