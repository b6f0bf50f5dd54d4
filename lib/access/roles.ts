import type { Records } from '../records/types'
import type { Role } from '../sheet/wire'
import { AgingMap } from './agingMap'
import type { Revocations } from './revocations'
import type { AccessService } from './service'

export type Roles = Pick<AccessService, 'role' | 'members' | 'setMember'>

/** Roles by person and budget, remembered for ten seconds; a change made here is seen at once. */
export function createRoles(records: Records, clock: () => number, revocations: Revocations): Roles {
  const remembered = new AgingMap<{ role: Role | null }>({ maxAge: 10_000, maxSize: 20_000 }, clock)
  let changes = 0

  return {
    async role(person, budget) {
      const key = JSON.stringify([person, budget])
      const known = remembered.get(key)
      if (known) return known.role
      const mark = changes
      const role = await records.members.role(person, budget)
      // A role that was read while another was being set may be the old one.
      if (mark === changes) remembered.set(key, { role })
      return role
    },

    async members(budget) {
      const rows = await records.members.list(budget)
      const people = await records.people.byIds(rows.map((row) => row.person))
      return rows.flatMap(({ person, role }) => {
        const found = people.get(person)
        return found ? [{ person: { id: found.id, name: found.name, email: found.email }, role }] : []
      })
    },

    async setMember(budget, person, role) {
      if (!(await records.people.byId(person))) return 'no-such-person'
      try {
        return await records.members.set(budget, person, role)
      } finally {
        changes++
        remembered.delete(JSON.stringify([person, budget]))
        revocations.announce({ person, budget })
      }
    },
  }
}
