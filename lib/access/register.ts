import type { Accounts } from './accounts'
import type { PersonSummary } from './service'

export type NewPerson = { readonly name: string; readonly email: string; readonly password: string }

/**
 * Makes a person with a password. A person left without one by a crash between the two rows is completed.
 * Calls for one address must not overlap.
 * @returns null where the e-mail address is taken.
 */
export async function register(accounts: Accounts, person: NewPerson): Promise<PersonSummary | null> {
  const { internalAdapter, password } = await accounts.$context
  const email = normalEmail(person.email)
  const found = await internalAdapter.findUserByEmail(email)
  if (found && (await internalAdapter.findCredentialAccount(found.user.id))) return null
  const hash = await password.hash(person.password)
  const user =
    found?.user ??
    (await internalAdapter.createUser({ name: person.name, email, emailVerified: false }, { method: 'email-password' }))
  await internalAdapter.linkAccount({
    userId: user.id,
    providerId: 'credential',
    accountId: user.id,
    password: hash,
  })
  return { id: user.id, name: user.name, email: user.email }
}

/** Addresses are compared without regard to case, as mail servers do in practice. */
export function normalEmail(email: string): string {
  return email.trim().toLowerCase()
}
