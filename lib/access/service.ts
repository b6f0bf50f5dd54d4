import type { Role } from '../sheet/wire'
import type { Identity } from './identity'

/** Accounts, roles and tokens as the route handlers and pages use them. */
export type AccessService = {
  /** Cookie or `Authorization: Bearer`, never both: a request with a bearer takes no cookie. */
  identify(headers: Headers): Promise<Identity | null>
  /** Cookies are the Set-Cookie lines to send. Null for a wrong e-mail or password; slow: seconds to wait when throttled. */
  signIn(
    email: string,
    password: string,
    headers: Headers,
  ): Promise<{ identity: Identity; cookies: string[] } | Slow | null>
  signOut(identity: Identity, headers: Headers): Promise<{ cookies: string[] }>
  /** Gives the session another week where a day of it is used up; asked for by the page every hour. Null where it has ended. */
  renew(identity: Identity, headers: Headers): Promise<{ identity: Identity; cookies: string[] } | null>
  /** Ends every session of the person and opens a new one for this browser. Null where the current password is wrong. */
  changePassword(
    identity: Identity,
    current: string,
    next: string,
    headers: Headers,
  ): Promise<{ cookies: string[] } | PasswordRefused | Slow | null>
  /** True until somebody has become the owner of this server. */
  needsOwner(): Promise<boolean>
  /** Null where the code is wrong or used up. */
  createOwner(
    code: string,
    person: { name: string; email: string; password: string },
  ): Promise<PersonSummary | PasswordRefused | null>
  /** Returns the first password, to be handed over and changed; null where the e-mail is taken. */
  addPerson(person: { name: string; email: string }): Promise<{ person: PersonSummary; password: string } | null>
  people(): Promise<PersonSummary[]>
  role(person: string, budget: string): Promise<Role | null>
  members(budget: string): Promise<{ person: PersonSummary; role: Role }[]>
  /** Role null removes; 'last-owner' where that would leave the budget without an owner. */
  setMember(budget: string, person: string, role: Role | null): Promise<'done' | 'no-such-person' | 'last-owner'>
  tokens(person: string): Promise<TokenSummary[]>
  /** The token is shown this once; only its SHA-256 is kept. */
  createToken(
    identity: Identity,
    name: string,
    expiresAt: number | null,
  ): Promise<{ token: string; summary: TokenSummary }>
  revokeToken(person: string, id: string): Promise<boolean>
}

/** Too many wrong passwords: seconds until the next try is looked at. */
export type Slow = { readonly slow: number }
/** Why a password may not be used, in a sentence that says what to do. */
export type PasswordRefused = { readonly refused: string }

export type PersonSummary = { readonly id: string; readonly name: string; readonly email: string }
export type TokenSummary = {
  readonly id: string
  readonly name: string
  readonly createdAt: number
  readonly expiresAt: number | null
  readonly lastUsedAt: number | null
}

/** What the worksheet's sockets need to know of people (write path, rule 3). */
export type Sessions = {
  identify(headers: Headers): Promise<Identity | null>
  /** From memory, at once: false as soon as the session or token is revoked or has expired. */
  valid(identity: Identity): boolean
  /** From memory where it was read in the last 10 s; a change of membership is seen at once. */
  role(person: string, budget: string): Promise<Role | null>
  /** Called after every revocation, before the request that revokes is answered. @returns takes the callback off again. */
  onRevoked(callback: (revoked: Revoked) => void): () => void
}

/** What has ended or changed: a session or token, or somebody's role in a budget. */
export type Revoked = { readonly session: string } | { readonly person: string; readonly budget: string }
