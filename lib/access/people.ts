import type { Person, Records } from '../records/types'
import type { Accounts } from './accounts'
import { readableSecret } from './passwords'
import { register } from './register'
import type { AccessService, PersonSummary } from './service'

export type People = Pick<AccessService, 'addPerson' | 'people'>

/** @param serially lets one call at a time run, so that one address is not given twice. */
export function createPeople(
  records: Records,
  accounts: Accounts,
  serially: <T>(work: () => Promise<T>) => Promise<T>,
): People {
  return {
    addPerson: (person) =>
      serially(async () => {
        const password = readableSecret(4)
        const made = await register(accounts, { ...person, password })
        return made && { person: made, password }
      }),
    people: async () => (await records.people.all()).map(summaryOf),
  }
}

function summaryOf({ id, name, email }: Person): PersonSummary {
  return { id, name, email }
}
