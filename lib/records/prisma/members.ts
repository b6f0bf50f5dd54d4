import { ROLE_ORDER } from '../../sheet/roles'
import type { Role } from '../../sheet/wire'
import type { PrismaClient } from '../generated/client'
import type { MemberRecords } from '../types'
import { refusedKey } from './errors'

export function memberRecords(client: PrismaClient): MemberRecords {
  return {
    async role(person, budgetId) {
      const member = await client.member.findUnique({ where: { budgetId_person: { budgetId, person } } })
      return member && roleOf(member.role)
    },

    async list(budgetId) {
      const members = await client.member.findMany({ where: { budgetId }, orderBy: { person: 'asc' } })
      return members.map(({ person, role }) => ({ person, role: roleOf(role) }))
    },

    set: (budgetId, person, role) =>
      client
        .$transaction(async (transaction) => {
          const others = await transaction.member.count({ where: { budgetId, role: 'owner', NOT: { person } } })
          if (role !== 'owner' && others === 0) return 'last-owner' as const
          const where = { budgetId_person: { budgetId, person } }
          if (role === null) await transaction.member.deleteMany({ where: { budgetId, person } })
          else await transaction.member.upsert({ where, create: { budgetId, person, role }, update: { role } })
          return 'done' as const
        })
        .catch(refusedKey('budget', budgetId)),
  }
}

/** The role as the file keeps it. @throws where it is none of ours */
export function roleOf(text: string): Role {
  const role = ROLE_ORDER.find((known) => known === text)
  if (!role) throw new Error(`The records file holds the role '${text}', which is not one; restore a backup.`)
  return role
}
