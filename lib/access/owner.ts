import { createHash, timingSafeEqual } from 'node:crypto'
import type { Records } from '../records/types'
import type { Accounts } from './accounts'
import { readableSecret, refusePassword } from './passwords'
import { type NewPerson, register } from './register'
import type { PasswordRefused, PersonSummary } from './service'

const SETTING = 'owner-code-sha256'

export type FirstOwner = {
  needsOwner(): Promise<boolean>
  /** Makes a new code and forgets the one before; null where the server has an owner. Only its hash is kept. */
  ownerCode(): Promise<string | null>
  createOwner(code: string, person: NewPerson): Promise<PersonSummary | PasswordRefused | null>
}

/**
 * How the first person comes in: with a code that only whoever started the server has seen. The server has an owner from
 * the moment that one person is its administrator, which is written last, so a crash half-way leaves the code good.
 * @param serially lets one call at a time run: of two with the same code the second finds an owner.
 */
export function createFirstOwner(
  records: Records,
  accounts: Accounts,
  serially: <T>(work: () => Promise<T>) => Promise<T>,
): FirstOwner {
  let owned = false

  async function needsOwner(): Promise<boolean> {
    if (!owned) owned = (await records.people.all()).some((person) => person.administrator)
    return !owned
  }

  async function ownerCode(): Promise<string | null> {
    if (!(await needsOwner())) return null
    const code = readableSecret(4)
    await records.settings.set(SETTING, sha256(code))
    return code
  }

  async function codeIsGood(code: string): Promise<boolean> {
    const kept = await records.settings.get(SETTING)
    if (kept === null || !(await needsOwner())) return false
    return timingSafeEqual(Buffer.from(kept, 'hex'), Buffer.from(sha256(code.trim().toLowerCase()), 'hex'))
  }

  return {
    needsOwner,
    ownerCode,
    createOwner: (code, person) =>
      serially(async () => {
        if (!(await codeIsGood(code))) return null
        const refused = refusePassword(person.password, person)
        if (refused) return { refused }
        const owner = (await register(accounts, person)) ?? (await takeOver(accounts, records, person))
        await records.people.setAdministrator(owner.id, true)
        owned = true
        await records.settings.remove(SETTING)
        return owner
      }),
  }
}

/** A crash came between making the person and making him or her the administrator: whoever holds the code goes on. */
async function takeOver(accounts: Accounts, records: Records, person: NewPerson): Promise<PersonSummary> {
  const found = await records.people.byEmail(person.email.trim().toLowerCase())
  if (!found) throw new Error('A person was neither made nor found; try again.')
  const { internalAdapter, password } = await accounts.$context
  await internalAdapter.updatePassword(found.id, await password.hash(person.password))
  return { id: found.id, name: found.name, email: found.email }
}

function sha256(text: string): string {
  return createHash('sha256').update(text).digest('hex')
}
