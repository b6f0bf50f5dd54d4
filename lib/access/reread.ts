import type { Records } from '../records/types'
import type { Accounts } from './accounts'
import { identityOf } from './identify'
import type { Held, SessionMemory } from './sessionMemory'

/**
 * Reads every session and token in memory again, so that what another process has revoked, or time has ended, is dropped
 * here as well. Read errors leave the memory as it was.
 */
export function createReread(
  records: Records,
  accounts: Accounts,
  memory: SessionMemory,
  clock: () => number,
): () => Promise<void> {
  async function expiries(held: readonly Held[]): Promise<Map<string, number | null>> {
    const { internalAdapter } = await accounts.$context
    const cookies = held.filter(({ identity }) => identity.via === 'cookie').map(({ key }) => key)
    const sessions = cookies.length === 0 ? [] : await internalAdapter.findSessions(cookies)
    const found = new Map<string, number | null>(
      sessions.map(({ session }) => [session.token, new Date(session.expiresAt).getTime()]),
    )
    for (const { identity, key } of held) {
      const token = identity.via === 'token' ? await records.tokens.bySha256(key) : null
      if (token) found.set(key, token.expiresAt)
    }
    return found
  }

  return async () => {
    const mark = memory.mark()
    const held = memory.all()
    const found = await expiries(held)
    const people = await records.people.byIds([...new Set(held.map(({ identity }) => identity.person))])
    const ended: string[] = []
    for (const { identity, key } of held) {
      const person = people.get(identity.person)
      const expiresAt = found.get(key)
      if (!person || expiresAt === undefined || (expiresAt !== null && expiresAt <= clock()))
        ended.push(identity.session)
      else memory.hold({ identity: identityOf(person, identity.session, identity.via, expiresAt), key }, mark)
    }
    for (const session of ended) memory.drop(session)
  }
}
