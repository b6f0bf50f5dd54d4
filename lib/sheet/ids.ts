const DIGITS = 'abcdefghijklmnopqrstuvwxyz234567'
const LENGTH = 20

/** A new random id for a record or an edit: 20 characters of 5 bits, so that two people never make the same one. */
export function newId(): string {
  // Not randomUUID: browsers offer that only on https pages.
  const bytes = crypto.getRandomValues(new Uint8Array(LENGTH))
  return Array.from(bytes, (byte) => DIGITS[byte & 31]).join('')
}
