import { Problem } from '../../problem'
import { change } from '../../wrapper'
import { createOwner } from './declaration'

export const dynamic = 'force-dynamic'

export const POST = change(createOwner, async ({ services, body }) => {
  const { code, ...person } = body
  const owner = await services.access.createOwner(code, person)
  if (!owner) throw new Problem('wrong-code')
  if ('refused' in owner) throw new Problem('password-refused', { detail: owner.refused })
  return { json: owner }
})
