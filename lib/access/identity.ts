export { ROLE_ORDER, roleAllows } from '../sheet/roles'

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
