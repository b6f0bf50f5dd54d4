import type { Identity } from './identity'
import type { Revocations } from './revocations'

/** A session or token in memory. key: the session's secret, or the token's SHA-256, to read it again by. */
export type Held = { readonly identity: Identity; readonly key: string }

export type SessionMemory = {
  /** Taken before reading from the database and given to hold(): a revocation in between makes the reading worthless. */
  mark(): number
  /** @returns false where something was revoked since the mark; read again. */
  hold(held: Held, mark: number): boolean
  /** Forgets the session and tells of it. */
  drop(session: string): void
  valid(identity: Identity): boolean
  find(session: string): Held | undefined
  all(): Held[]
}

/** Every session and token that has been used since the start, until it is revoked or expires (write path, rule 3). */
export function createSessionMemory(clock: () => number, revocations: Revocations): SessionMemory {
  const sessions = new Map<string, Held>()
  let revoked = 0
  return {
    mark: () => revoked,
    hold(held, mark) {
      if (mark !== revoked) return false
      sessions.set(held.identity.session, held)
      return true
    },
    drop(session) {
      revoked++
      sessions.delete(session)
      revocations.announce({ session })
    },
    valid(identity) {
      const held = sessions.get(identity.session)?.identity
      if (!held || held.person !== identity.person) return false
      return held.expiresAt === null || held.expiresAt > clock()
    },
    find: (session) => sessions.get(session),
    all: () => [...sessions.values()],
  }
}
