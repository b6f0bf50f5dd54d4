import { randomInt } from 'node:crypto'

export const PASSWORD = { least: 12, most: 128 } as const

/** Without letters and digits that are taken for one another when read aloud or copied by hand. */
const ALPHABET = 'abcdefghjkmnpqrstuvwxyz23456789'

/** @returns null where the password may be used, else a sentence that says what to do. Length counts characters. */
export function refusePassword(password: string, person: { email: string }): string | null {
  const characters = [...password]
  if (characters.length < PASSWORD.least) return `Use at least ${PASSWORD.least} characters; a few unrelated words do.`
  if (characters.length > PASSWORD.most) return `Use at most ${PASSWORD.most} characters.`
  if (new Set(characters).size < 5) return 'Use at least five different characters.'
  const plain = password.toLowerCase()
  if (plain === person.email.toLowerCase()) return 'Use something else than the e-mail address.'
  return null
}

/** A secret to be read and typed by a person: groups of five, just under five bits a character. */
export function readableSecret(groups: number): string {
  const group = () => Array.from({ length: 5 }, () => ALPHABET[randomInt(ALPHABET.length)]).join('')
  return Array.from({ length: groups }, group).join('-')
}
