import type { Budget, PrismaClient } from '../generated/client'
import type { BudgetRecord, BudgetRecords } from '../types'
import { NotRecorded, refusedKey } from './errors'
import { roleOf } from './members'

export function budgetRecords(client: PrismaClient): BudgetRecords {
  return {
    async create({ createdAt, ...record }, owner) {
      await client.budget
        .create({
          data: { ...record, createdAt: new Date(createdAt), members: { create: { person: owner, role: 'owner' } } },
        })
        .catch(refusedKey('budget', record.id))
    },

    async byId(id) {
      const found = await client.budget.findUnique({ where: { id } })
      return found && toRecord(found)
    },

    async all() {
      const found = await client.budget.findMany({ orderBy: [{ createdAt: 'asc' }, { id: 'asc' }] })
      return found.map(toRecord)
    },

    async forPerson(person) {
      const found = await client.member.findMany({
        where: { person, budget: { state: 'made' } },
        include: { budget: true },
        orderBy: [{ budget: { createdAt: 'asc' } }, { budgetId: 'asc' }],
      })
      return found.map(({ budget, role }) => ({ record: toRecord(budget), role: roleOf(role) }))
    },

    async rename(id, name) {
      const { count } = await client.budget.updateMany({ where: { id }, data: { name } })
      if (count === 0) throw new NotRecorded('budget', id)
    },
  }
}

function toRecord({ state, createdAt, ...rest }: Budget): BudgetRecord {
  if (state !== 'made' && state !== 'abandoned')
    throw new Error(
      `The records file keeps the budget ${rest.id} in the state '${state}', which is not one; restore a backup.`,
    )
  return { ...rest, createdAt: createdAt.getTime(), state }
}
