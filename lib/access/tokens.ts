import { createHash, randomBytes, randomUUID, timingSafeEqual } from 'node:crypto'
import type { Records, TokenRecord } from '../records/types'
import type { AccessService, TokenSummary } from './service'
import type { SessionMemory } from './sessionMemory'

const TOKEN = /^hb_[A-Za-z0-9_-]{43}$/

export type Tokens = Pick<AccessService, 'tokens' | 'createToken' | 'revokeToken'>

/** Personal tokens: 'hb_' and 32 random bytes. Only the SHA-256 is kept, which needs no salt: the secret is random. */
export function createTokens(records: Records, clock: () => number, memory: SessionMemory): Tokens {
  return {
    tokens: async (person) => (await records.tokens.forPerson(person)).map(summary),

    async createToken(identity, name, expiresAt) {
      const token = `hb_${randomBytes(32).toString('base64url')}`
      const record: TokenRecord = {
        id: randomUUID(),
        person: identity.person,
        name,
        sha256: hashToken(token),
        createdAt: clock(),
        expiresAt,
        lastUsedAt: null,
      }
      await records.tokens.create(record)
      return { token, summary: summary(record) }
    },

    async revokeToken(person, id) {
      const removed = await records.tokens.remove(person, id)
      if (removed) memory.drop(id)
      return removed
    },
  }
}

/** @returns the token's record if it is one, is known and has not expired. */
export async function findToken(records: Records, token: string, now: number): Promise<TokenRecord | null> {
  if (!TOKEN.test(token)) return null
  const sha256 = hashToken(token)
  const record = await records.tokens.bySha256(sha256)
  if (!record || !timingSafeEqual(Buffer.from(record.sha256, 'hex'), Buffer.from(sha256, 'hex'))) return null
  return record.expiresAt !== null && record.expiresAt <= now ? null : record
}

function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex')
}

function summary(record: TokenRecord): TokenSummary {
  const { id, name, createdAt, expiresAt, lastUsedAt } = record
  return { id, name, createdAt, expiresAt, lastUsedAt }
}
