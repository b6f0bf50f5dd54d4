import { type BetterAuthOptions, betterAuth } from 'better-auth'
import type { Records } from '../../lib/records/types'

/** Not what is tested here, and the library's own takes a tenth of a second. */
const CHEAP = {
  hash: async (password: string) => `not hashed: ${password}`,
  verify: async ({ hash, password }: { hash: string; password: string }) => hash === `not hashed: ${password}`,
}

/** The account library over the records' storage, as lib/access sets it up, but for the cheapest of everything. */
export function accountsOver(records: Records) {
  return betterAuth({
    secret: 'a secret for tests, of 32 characters at least',
    baseURL: 'http://localhost:3000',
    telemetry: { enabled: false },
    logger: { disabled: true },
    // Contract: accountStorage is what this option takes.
    database: records.accountStorage as BetterAuthOptions['database'],
    emailAndPassword: { enabled: true, password: CHEAP },
    user: {
      additionalFields: { administrator: { type: 'boolean', required: true, defaultValue: false, input: false } },
    },
  })
}

/** Makes a person through the account library. @returns the person's id */
export async function addPerson(records: Records, name: string): Promise<string> {
  const email = `${name.toLowerCase().replaceAll(' ', '.')}@example.test`
  const { user } = await accountsOver(records).api.signUpEmail({ body: { name, email, password: 'twelve letters' } })
  return user.id
}
