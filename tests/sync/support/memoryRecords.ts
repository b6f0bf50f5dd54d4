import type { Identity } from '../../../lib/access/identity'
import type { BudgetRecord, EvidenceRecord, Person, Records } from '../../../lib/records/types'
import type { Role } from '../../../lib/sheet/wire'

/** The records that lib/sync reads and writes, in memory; the real ones are tested in tests/records. */
export function memoryRecords(people: Readonly<Record<string, Identity>>): Records & { erase(person: string): void } {
  const persons = new Map(
    Object.values(people).map(({ person, name, email }): [string, Person] => [
      person,
      { id: person, name, email, administrator: false },
    ]),
  )
  const budgets = new Map<string, BudgetRecord>()
  const roles = new Map<string, Role>()
  const evidence: EvidenceRecord[] = []
  const key = (person: string, budget: string) => `${person} in ${budget}`
  const missing = (): never => {
    throw new Error('lib/sync does not use this.')
  }
  return {
    people: {
      count: async () => persons.size,
      byId: async (id) => persons.get(id) ?? null,
      byEmail: missing,
      byIds: async (ids) => new Map(ids.flatMap((id) => (persons.has(id) ? [[id, persons.get(id) as Person]] : []))),
      all: async () => [...persons.values()],
      setAdministrator: missing,
    },
    budgets: {
      async create(record, owner) {
        if (budgets.has(record.id)) throw new Error(`The record of ${record.id} exists.`)
        budgets.set(record.id, record)
        roles.set(key(owner, record.id), 'owner')
      },
      byId: async (id) => budgets.get(id) ?? null,
      all: async () => [...budgets.values()],
      forPerson: async (person) =>
        [...budgets.values()].flatMap((record) => {
          const role = roles.get(key(person, record.id))
          return role && record.state === 'made' ? [{ record, role }] : []
        }),
      async rename(id, name) {
        const record = budgets.get(id)
        if (record) budgets.set(id, { ...record, name })
      },
    },
    members: {
      role: async (person, budget) => roles.get(key(person, budget)) ?? null,
      list: missing,
      async set(budget, person, role) {
        if (role) roles.set(key(person, budget), role)
        else roles.delete(key(person, budget))
        return 'done'
      },
    },
    tokens: { create: missing, bySha256: missing, forPerson: missing, touch: missing, remove: missing },
    evidence: {
      async describe(record) {
        const found = evidence.find(({ budget, sha256 }) => budget === record.budget && sha256 === record.sha256)
        if (!found) evidence.push(record)
        return found ?? record
      },
      list: async (id) => evidence.filter(({ budget }) => budget === id),
      find: async (id, sha256) => evidence.find((one) => one.budget === id && one.sha256 === sha256) ?? null,
    },
    catalogues: { add: missing, byId: missing, all: missing, remove: missing },
    settings: { get: missing, set: missing, remove: missing },
    accountStorage: null,
    erase: (person) => persons.delete(person),
  }
}
