import type { PrismaClient, User } from '../generated/client'
import type { PeopleRecords, Person } from '../types'
import { NotRecorded } from './errors'

export function peopleRecords(client: PrismaClient): PeopleRecords {
  return {
    count: () => client.user.count(),

    async byId(id) {
      const user = await client.user.findUnique({ where: { id } })
      return user && toPerson(user)
    },

    async byEmail(email) {
      // The account library keeps addresses in lower case.
      const user = await client.user.findUnique({ where: { email: email.toLowerCase() } })
      return user && toPerson(user)
    },

    async byIds(ids) {
      const users = await client.user.findMany({ where: { id: { in: [...new Set(ids)] } } })
      return new Map(users.map((user) => [user.id, toPerson(user)]))
    },

    async all() {
      const users = await client.user.findMany({ orderBy: [{ name: 'asc' }, { id: 'asc' }] })
      return users.map(toPerson)
    },

    async setAdministrator(id, administrator) {
      const { count } = await client.user.updateMany({ where: { id }, data: { administrator } })
      if (count === 0) throw new NotRecorded('person', id)
    },
  }
}

function toPerson({ id, name, email, administrator }: User): Person {
  return { id, name, email, administrator }
}
