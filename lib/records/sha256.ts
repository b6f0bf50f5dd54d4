import { createHash } from 'node:crypto'

/** SHA-256 (FIPS 180-4) of the bytes, or of a text's UTF-8, as 64 lower-case hexadecimal digits. */
export function sha256Hex(data: Uint8Array | string): string {
  return createHash('sha256').update(data).digest('hex')
}
