import type { Records } from '../records/types'
import { createAccounts } from './accounts'
import { createIdentifier } from './identify'
import { createFirstOwner } from './owner'
import { createPeople } from './people'
import { createReread } from './reread'
import { createRevocations } from './revocations'
import { createRoles } from './roles'
import type { AccessService, Sessions } from './service'
import { createSessionMemory } from './sessionMemory'
import { createSignIn } from './signIn'
import { createThrottle } from './throttle'
import { createTokens } from './tokens'
import { createTurns } from './turns'

export type AccessOptions = {
  readonly records: Records
  /** Scheme, host and port; https makes the cookie Secure. */
  readonly publicUrl: string
  /** Signs the cookies; at least 32 random characters, kept outside the databases. */
  readonly secret: string
  /** Milliseconds since 1970. */
  readonly clock: () => number
  readonly log: (message: string, error: unknown) => void
}

export type Access = AccessService &
  Sessions & {
    /** The one-time code of the first owner, new at each call; null where the server has an owner. To be printed at start. */
    ownerCode(): Promise<string | null>
    /** Drops what has been revoked elsewhere or has expired; runs by itself every ten seconds. */
    reread(): Promise<void>
    close(): void
  }

const REREAD_MS = 10_000

/** Accounts, sessions, roles and tokens over the records. @throws Error where the secret is too short. */
export async function openAccess(options: AccessOptions): Promise<Access> {
  const { records, clock, log } = options
  if (options.secret.length < 32) throw new Error('The secret that signs cookies needs at least 32 characters.')
  const revocations = createRevocations(log)
  const memory = createSessionMemory(clock, revocations)
  const accounts = createAccounts({
    storage: records.accountStorage,
    publicUrl: options.publicUrl,
    secret: options.secret,
    log,
    onSessionEnded: memory.drop,
  })
  await accounts.$context
  const identifier = createIdentifier(records, accounts, memory, clock, log)
  const reread = createReread(records, accounts, memory, clock)
  const serially = createTurns(1)
  const timer = setInterval(() => {
    reread().catch((error) => log('The sessions could not be read again', error))
  }, REREAD_MS)
  timer.unref()
  return {
    identify: identifier.identify,
    valid: memory.valid,
    onRevoked: revocations.onRevoked,
    ...createSignIn(accounts, identifier, memory, createThrottle(clock)),
    ...createFirstOwner(records, accounts, serially),
    ...createPeople(records, accounts, serially),
    ...createRoles(records, clock, revocations),
    ...createTokens(records, clock, memory),
    reread,
    close: () => clearInterval(timer),
  }
}
