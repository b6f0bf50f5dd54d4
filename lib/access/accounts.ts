import { type BetterAuthOptions, betterAuth } from 'better-auth/minimal'

export type AccountOptions = {
  /** records.accountStorage, as better-auth wants it. */
  readonly storage: unknown
  readonly publicUrl: string
  /** Signs the cookies; at least 32 random characters. */
  readonly secret: string
  readonly log: (message: string, error: unknown) => void
  /** Called after a session's row is gone, whoever removed it. */
  readonly onSessionEnded: (session: string) => void
}

export type Accounts = ReturnType<typeof createAccounts>

const DAY_S = 86_400

/**
 * The account library, called through its server API only: its HTTP handler is not mounted, so its own origin check and rate
 * limit have no say. E-mail and password (scrypt), no sign-up; a session lasts seven days and is renewed by an explicit call.
 */
export function createAccounts(options: AccountOptions) {
  if (typeof options.storage !== 'function')
    throw new Error('The records have no account storage; open the store first.')
  return betterAuth({
    appName: 'Halfbaud',
    baseURL: options.publicUrl,
    // Given as a list, because a list in the environment would win over `secret`.
    secrets: [{ version: 1, value: options.secret }],
    database: options.storage as BetterAuthOptions['database'],
    telemetry: { enabled: false },
    rateLimit: { enabled: false },
    logger: { level: 'error', log: (_level, message, ...details) => options.log(message, details[0]) },
    // lib/access/passwords judges new passwords; the library counts UTF-16 units, of which a character may have two.
    emailAndPassword: { enabled: true, disableSignUp: true, minPasswordLength: 12, maxPasswordLength: 256 },
    session: {
      expiresIn: 7 * DAY_S,
      updateAge: DAY_S,
      deferSessionRefresh: true,
      cookieCache: { enabled: false },
    },
    advanced: {
      cookiePrefix: 'halfbaud',
      useSecureCookies: options.publicUrl.startsWith('https://'),
      ipAddress: { disableIpTracking: true },
      defaultCookieAttributes: { httpOnly: true, sameSite: 'lax', path: '/' },
    },
    databaseHooks: { session: { delete: { after: async (session) => options.onSessionEnded(session.id) } } },
  })
}
