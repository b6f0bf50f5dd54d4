/** A token as the API lists it; times in milliseconds since 1970. */
export type Token = {
  readonly id: string
  readonly name: string
  readonly createdAt: number
  readonly expiresAt: number | null
  readonly lastUsedAt: number | null
}

export function isToken(value: unknown): value is Token {
  const token = value as Partial<Token> | null
  return typeof token === 'object' && typeof token?.id === 'string' && typeof token.createdAt === 'number'
}

const DAY_MS = 24 * 3600 * 1000

/** How long a token may last, in words and in milliseconds; null never ends. */
export const LIFETIMES = [
  { words: '90 days', ms: 90 * DAY_MS },
  { words: '30 days', ms: 30 * DAY_MS },
  { words: 'one year', ms: 365 * DAY_MS },
  { words: 'no end', ms: null },
] as const
