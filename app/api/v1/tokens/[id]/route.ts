import { Problem } from '../../../problem'
import { change } from '../../../wrapper'
import { revokeToken } from './declaration'

export const dynamic = 'force-dynamic'

export const DELETE = change(revokeToken, async ({ services, identity, params }) => {
  if (!(await services.access.revokeToken(identity.person, params.id))) throw new Problem('not-found')
  return {}
})
