import type { Role } from '../../../../../../../lib/sheet/wire'
import type { Services } from '../../../../../../../lib/sync/services'
import { Problem } from '../../../../../problem'
import { change } from '../../../../../wrapper'
import { removeMember, setMember } from './declaration'

export const dynamic = 'force-dynamic'

export const PUT = change(setMember, ({ services, params, body }) => set(services, params.id, params.person, body.role))

export const DELETE = change(removeMember, ({ services, params }) => set(services, params.id, params.person, null))

async function set(services: Services, budget: string, person: string, role: Role | null) {
  const result = await services.access.setMember(budget, person, role)
  if (result !== 'done') throw new Problem(result)
  return {}
}
