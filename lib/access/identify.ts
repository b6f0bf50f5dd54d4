import type { Person, Records } from '../records/types'
import type { Accounts } from './accounts'
import type { Identity } from './identity'
import type { SessionMemory } from './sessionMemory'
import { findToken } from './tokens'

const MINUTE = 60_000

export type Identifier = {
  identify(headers: Headers): Promise<Identity | null>
  /** @param secret the session's token, as its row holds it */
  holdSession(secret: string): Promise<Identity | null>
}

/** Finds out who sends a request, and keeps the session or token in memory for the checks that follow. */
export function createIdentifier(
  records: Records,
  accounts: Accounts,
  memory: SessionMemory,
  clock: () => number,
  log: (message: string, error: unknown) => void,
): Identifier {
  async function hold(read: () => Promise<{ identity: Identity; key: string } | null>): Promise<Identity | null> {
    for (;;) {
      const mark = memory.mark()
      const held = await read()
      if (!held) return null
      if (memory.hold(held, mark)) return held.identity
    }
  }

  async function fromSession(found: FoundSession | null) {
    const person = found && (await records.people.byId(found.user.id))
    if (!person) return null
    const expiresAt = found.session.expiresAt.getTime()
    if (expiresAt <= clock()) return null
    return { identity: identityOf(person, found.session.id, 'cookie', expiresAt), key: found.session.token }
  }

  const holdToken = (token: string) =>
    hold(async () => {
      const record = await findToken(records, token, clock())
      const person = record && (await records.people.byId(record.person))
      if (!person) return null
      // Once a minute is enough to see which tokens are still in use.
      if (record.lastUsedAt === null || record.lastUsedAt + MINUTE <= clock()) {
        records.tokens.touch(record.id, clock()).catch((error) => log('The last use of a token was not noted', error))
      }
      return { identity: identityOf(person, record.id, 'token', record.expiresAt), key: record.sha256 }
    })

  return {
    holdSession: (secret) =>
      hold(async () => fromSession(await (await accounts.$context).internalAdapter.findSession(secret))),
    async identify(headers) {
      const bearer = /^Bearer(?: +(.*))?$/i.exec(headers.get('authorization') ?? '')
      if (bearer) return holdToken((bearer[1] ?? '').trim())
      if (!headers.has('cookie')) return null
      return hold(async () => fromSession(await accounts.api.getSession({ headers: cookieOnly(headers) })))
    },
  }
}

type FoundSession = { session: { id: string; token: string; expiresAt: Date }; user: { id: string } }

export function identityOf(person: Person, session: string, via: Identity['via'], expiresAt: number | null): Identity {
  const { id, name, email, administrator } = person
  return { person: id, name, email, administrator, session, via, expiresAt }
}

/** The account library sees the cookie and nothing else of a request. */
export function cookieOnly(headers: Headers): Headers {
  const cookie = headers.get('cookie')
  return new Headers(cookie === null ? {} : { cookie })
}
