import { Problem } from '../../problem'
import { change } from '../../wrapper'
import { changePassword } from './declaration'

export const dynamic = 'force-dynamic'

export const POST = change(changePassword, async ({ services, identity, body, request }) => {
  const result = await services.access.changePassword(identity, body.current, body.next, request.headers)
  if (!result) throw new Problem('wrong-password')
  if ('slow' in result) throw new Problem('slow-down', { retryAfterS: result.slow })
  if ('refused' in result) throw new Problem('password-refused', { detail: result.refused })
  return { cookies: result.cookies }
})
