import type { Role } from '../sheet/wire'

/** Who is at the other end of a request or a socket. */
export type Identity = {
  /** Person id: what the journal holds. */
  readonly person: string
  readonly name: string
  readonly email: string
  /** The server's administrator: may add people. */
  readonly administrator: boolean
  /** Session or token id: what a revocation names. */
  readonly session: string
  readonly via: 'cookie' | 'token'
  /** Milliseconds since 1970, or null for a token without end. */
  readonly expiresAt: number | null
}

export const ROLE_ORDER: readonly Role[] = ['viewer', 'editor', 'approver', 'owner']

export function roleAllows(role: Role | null, needed: Role): boolean {
  return role !== null && ROLE_ORDER.indexOf(role) >= ROLE_ORDER.indexOf(needed)
}
