import { APIError } from 'better-auth/api'
import type { Accounts } from './accounts'
import { cookieOnly, type Identifier } from './identify'
import { refusePassword } from './passwords'
import { peerOf } from './peer'
import { normalEmail } from './register'
import type { AccessService, Slow } from './service'
import type { SessionMemory } from './sessionMemory'
import type { Throttle } from './throttle'
import { createTurns } from './turns'

export type SignIn = Pick<AccessService, 'signIn' | 'signOut' | 'renew' | 'changePassword'>

/** Opening, renewing and ending sessions. Whatever takes a password is throttled by account and address. */
export function createSignIn(
  accounts: Accounts,
  identifier: Identifier,
  memory: SessionMemory,
  throttle: Throttle,
): SignIn {
  const inTurn = createTurns(2)

  /** @returns null where the account library says that the password is wrong. */
  async function withPassword<T>(email: string, headers: Headers, check: () => Promise<T>): Promise<T | Slow | null> {
    const attempt = throttle.begin(normalEmail(email), peerOf(headers))
    if ('slow' in attempt) return attempt
    try {
      const result = await inTurn(check)
      attempt.succeeded()
      return result
    } catch (error) {
      if (error instanceof APIError && (error.statusCode === 400 || error.statusCode === 401)) return null
      attempt.cancelled()
      throw error
    }
  }

  async function endSession(session: string): Promise<void> {
    const held = memory.find(session)
    if (held) await (await accounts.$context).internalAdapter.deleteSession(held.key)
    memory.drop(session)
  }

  return {
    async signIn(email, password, headers) {
      const checked = await withPassword(email, headers, () =>
        accounts.api.signInEmail({
          body: { email: normalEmail(email), password },
          headers: new Headers(),
          returnHeaders: true,
        }),
      )
      if (!checked || 'slow' in checked) return checked
      // Whoever was signed in here before has left: pages still open must not go on under that name.
      const before = await identifier.identify(cookieOnly(headers))
      if (before) await endSession(before.session)
      const identity = await identifier.holdSession(checked.response.token)
      return identity && { identity, cookies: checked.headers.getSetCookie() }
    },

    async signOut(identity, headers) {
      await endSession(identity.session)
      const { headers: answer } = await accounts.api.signOut({ headers: cookieOnly(headers), returnHeaders: true })
      return { cookies: answer.getSetCookie() }
    },

    async renew(_identity, headers) {
      const renewed = await accounts.api.getSession({
        method: 'POST',
        headers: cookieOnly(headers),
        returnHeaders: true,
      })
      const identity = renewed.response && (await identifier.holdSession(renewed.response.session.token))
      return identity && { identity, cookies: renewed.headers.getSetCookie() }
    },

    async changePassword(identity, current, next, headers) {
      const refused = refusePassword(next, identity)
      if (refused) return { refused }
      // Ends every session, this one too: a copy of its cookie, if there is one, ends with it.
      const changed = await withPassword(identity.email, headers, () =>
        accounts.api.changePassword({
          body: { currentPassword: current, newPassword: next, revokeOtherSessions: true },
          headers: cookieOnly(headers),
          returnHeaders: true,
        }),
      )
      if (!changed || 'slow' in changed) return changed
      if (changed.response.token) await identifier.holdSession(changed.response.token)
      return { cookies: changed.headers.getSetCookie() }
    },
  }
}
