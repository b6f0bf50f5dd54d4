import { change, read } from '../../wrapper'
import { createToken, listTokens } from './declaration'

export const dynamic = 'force-dynamic'

export const GET = read(listTokens, async ({ services, identity }) => ({
  json: { tokens: await services.access.tokens(identity.person) },
}))

export const POST = change(createToken, async ({ services, identity, body }) => {
  const { token, summary } = await services.access.createToken(identity, body.name, body.expiresAt)
  return { json: { secret: token, token: summary } }
})
