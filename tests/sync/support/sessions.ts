import type { Identity } from '../../../lib/access/identity'
import type { Revoked, Sessions } from '../../../lib/access/service'
import type { Records } from '../../../lib/records/types'
import type { Role } from '../../../lib/sheet/wire'

const identity = (person: string, name: string): Identity => ({
  person,
  name,
  email: `${person}@example.com`,
  administrator: false,
  session: `session-${person}`,
  via: 'cookie',
  expiresAt: null,
})

export const PEOPLE = {
  ann: identity('ann', 'Ann Testa'),
  ben: identity('ben', 'Ben Proba'),
  vera: identity('vera', 'Vera Legge'),
  zoe: identity('zoe', 'Zoe Fuori'),
} as const
export type Name = keyof typeof PEOPLE

export type FakeSessions = Sessions & {
  /** Ends somebody's session, as a sign-out does. */
  end(session: string): void
  /** It ends by itself, and nobody is told. */
  expire(session: string): void
  setRole(person: string, budget: string, role: Role | null): Promise<void>
}

/** Sessions as lib/access gives them: 'cookie: session=ann' and 'authorization: Bearer ann' are Ann. */
export function fakeSessions(records: Pick<Records, 'members'>): FakeSessions {
  const ended = new Set<string>()
  const callbacks = new Set<(revoked: Revoked) => void>()
  const tell = (revoked: Revoked) => {
    for (const callback of callbacks) callback(revoked)
  }
  const valid = ({ session, expiresAt }: Identity) =>
    !ended.has(session) && (expiresAt === null || expiresAt > Date.now())
  return {
    async identify(headers) {
      const bearer = /^Bearer (\w+)$/.exec(headers.get('authorization') ?? '')?.[1]
      const cookie = /session=(\w+)/.exec(headers.get('cookie') ?? '')?.[1]
      const byToken = PEOPLE[bearer as Name] as Identity | undefined
      // Careless on purpose: with both, a cookie would do where the token does not. The server must not hand over both.
      const byCookie = PEOPLE[cookie as Name] as Identity | undefined
      const identity: Identity | undefined = byToken
        ? { ...byToken, session: `token-${bearer}`, via: 'token' }
        : byCookie
      if (!identity) return null
      return valid(identity) ? identity : null
    },
    valid,
    role: (person, budget) => records.members.role(person, budget),
    onRevoked(callback) {
      callbacks.add(callback)
      return () => callbacks.delete(callback)
    },
    expire: (session) => void ended.add(session),
    end(session) {
      ended.add(session)
      tell({ session })
    },
    async setRole(person, budget, role) {
      await records.members.set(budget, person, role)
      tell({ person, budget })
    },
  }
}
