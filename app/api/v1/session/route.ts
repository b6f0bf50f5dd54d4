import type { Identity } from '../../../../lib/access/identity'
import { Problem } from '../../problem'
import { change, read } from '../../wrapper'
import { renewSession, signIn, signOut, whoAmI } from './declaration'

export const dynamic = 'force-dynamic'

export const POST = change(signIn, async ({ services, body, request }) => {
  const result = await services.access.signIn(body.email, body.password, request.headers)
  if (!result) throw new Problem('wrong-sign-in')
  if ('slow' in result) throw new Problem('slow-down', { retryAfterS: result.slow })
  return { json: shown(result.identity), cookies: result.cookies }
})

export const GET = read(whoAmI, ({ identity }) => ({ json: shown(identity) }))

export const PUT = change(renewSession, async ({ services, identity, request }) => {
  const result = await services.access.renew(identity, request.headers)
  if (!result) throw new Problem('not-signed-in')
  return { json: shown(result.identity), cookies: result.cookies }
})

export const DELETE = change(signOut, async ({ services, identity, request }) => ({
  cookies: (await services.access.signOut(identity, request.headers)).cookies,
}))

function shown({ person, name, email, administrator, via, expiresAt }: Identity) {
  return { person: { id: person, name, email }, administrator, via, expiresAt }
}
