import { readdir, readFile } from 'node:fs/promises'
import { join } from 'node:path'
import { z } from 'zod'
import { readJson } from '../budget/jsonText'
import { type Budget, budgetSchema, DISCIPLINES, ID } from '../budget/schema'
import type { Role } from '../sheet/wire'

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
  /** Person id of people.json → role; exactly one owner. */
  readonly members: Readonly<Record<string, Role>>
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
 * Reads every budget file of the folder, by name, and people.json beside them.
 * @throws Error that names the file, and what in it is wrong
 */
export async function readScenarios(folder: string): Promise<Scenarios> {
  const names = (await readdir(folder)).filter((name) => name.endsWith('.json') && name !== PEOPLE).sort()
  const { people, members } = await readChecked(folder, PEOPLE, peopleFile)
  const links = await Promise.all(
    names.map(async (name) => {
      const id = name.replace(/\.json$/, '')
      return { id, budget: await readChecked(folder, name, budgetSchema), members: members[id] ?? {} }
    }),
  )
  const wrong = contradiction(people, links, Object.keys(members))
  if (wrong !== null) throw new Error(`${join(folder, PEOPLE)}: ${wrong}`)
  return { people, links }
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
