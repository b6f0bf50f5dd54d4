import type { PrismaClient, Token } from '../generated/client'
import type { TokenRecord, TokenRecords } from '../types'
import { refusedKey } from './errors'

export function tokenRecords(client: PrismaClient): TokenRecords {
  return {
    async create({ id, person, name, sha256, createdAt, expiresAt, lastUsedAt }) {
      const times = { createdAt: new Date(createdAt), expiresAt: toDate(expiresAt), lastUsedAt: toDate(lastUsedAt) }
      await client.token.create({ data: { id, userId: person, name, sha256, ...times } }).catch(refusedKey('token', id))
    },

    async bySha256(sha256) {
      const token = await client.token.findUnique({ where: { sha256 } })
      return token && toRecord(token)
    },

    async forPerson(person) {
      const tokens = await client.token.findMany({
        where: { userId: person },
        orderBy: [{ createdAt: 'asc' }, { id: 'asc' }],
      })
      return tokens.map(toRecord)
    },

    // A token may have been revoked while its last request was answered: then there is nothing to note.
    async touch(id, time) {
      await client.token.updateMany({ where: { id }, data: { lastUsedAt: new Date(time) } })
    },

    async remove(person, id) {
      const { count } = await client.token.deleteMany({ where: { id, userId: person } })
      return count > 0
    },
  }
}

function toDate(time: number | null): Date | null {
  return time === null ? null : new Date(time)
}

function toRecord({ id, userId, name, sha256, createdAt, expiresAt, lastUsedAt }: Token): TokenRecord {
  return {
    id,
    person: userId,
    name,
    sha256,
    createdAt: createdAt.getTime(),
    expiresAt: expiresAt?.getTime() ?? null,
    lastUsedAt: lastUsedAt?.getTime() ?? null,
  }
}
