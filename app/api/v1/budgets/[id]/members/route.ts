import { read } from '../../../../wrapper'
import { listMembers } from './declaration'

export const dynamic = 'force-dynamic'

export const GET = read(listMembers, async ({ services, params }) => ({
  json: { members: await services.access.members(params.id) },
}))
