import { writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import type { Identity } from '../access/identity'
import { readableSecret } from '../access/passwords'
import type { AccessService, PersonSummary } from '../access/service'
import type { BudgetService } from '../sync/services'
import { attachedFiles, readScenarios } from './scenarios'

type DemoParts = { access: AccessService; budgets: BudgetService; ownerCode: string; directory: string; folder: string }

/**
 * Fills an empty data directory with the invented people and links of seed-scenarios.
 * @returns what to print once: who may sign in, and with which password
 */
export async function seedDemo({ access, budgets, ownerCode, directory, folder }: DemoParts): Promise<string> {
  const { people, links } = await readScenarios(folder)
  const made = new Map<string, PersonSummary>()
  const lines: string[] = []
  for (const { id, name, email, disciplines } of people) {
    const { person, password } = made.size === 0 ? await first(name, email) : await further(name, email)
    made.set(id, person)
    lines.push(`${email}  ${password}  ${name} (${disciplines.join(', ')})`)
  }
  const text = `${lines.join('\n')}\n`
  await writeFile(join(directory, 'demo-passwords.txt'), text, { mode: 0o600, flag: 'wx' })
  for (const link of links) {
    const { budget, members } = link
    const owner = Object.keys(members).find((id) => members[id] === 'owner')
    const { id } = await budgets.create(identityOf(personNamed(owner)), 'import', budget, attachedFiles(link))
    for (const [member, role] of Object.entries(members)) {
      if (role !== 'owner') await access.setMember(id, personNamed(member).id, role)
    }
  }
  return text

  async function first(name: string, email: string) {
    const password = readableSecret(4)
    const person = await access.createOwner(ownerCode, { name, email, password })
    if (!person || 'refused' in person)
      throw new Error(`The demo's data in ${directory} is unfinished; remove the folder and start again.`)
    return { person, password }
  }

  async function further(name: string, email: string) {
    const added = await access.addPerson({ name, email })
    if (!added) throw new Error(`Two people of the demo have the e-mail ${email}.`)
    return added
  }

  function personNamed(id: string | undefined): PersonSummary {
    const person = id === undefined ? undefined : made.get(id)
    if (!person) throw new Error(`A scenario names '${id}', who is not among the people.`)
    return person
  }
}

/** The seed is written in the name of each link's owner, who has not signed in yet. */
function identityOf(person: PersonSummary): Identity {
  return {
    person: person.id,
    name: person.name,
    email: person.email,
    administrator: false,
    session: 'demo-seed',
    via: 'token',
    expiresAt: null,
  }
}
