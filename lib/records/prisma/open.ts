import { prismaAdapter } from 'better-auth/adapters/prisma'
import { PrismaClient } from '../generated/client'
import type { Records } from '../types'
import { recordsAdapter, requireSettings } from './adapter'
import { budgetRecords } from './budgets'
import { catalogueRecords } from './catalogues'
import { evidenceRecords } from './evidence'
import { memberRecords } from './members'
import { peopleRecords } from './people'
import { settingRecords } from './settings'
import { tokenRecords } from './tokens'

/**
 * Opens the records file, which must have been migrated (write path, rule 6).
 * @throws RecordsUnusable where the connection does not sync every commit
 */
export async function openRecords(file: string): Promise<{ records: Records; close(): Promise<void> }> {
  const client = new PrismaClient({ adapter: recordsAdapter(file) })
  try {
    await requireSettings(async (name) => {
      const [row] = await client.$queryRawUnsafe<Record<string, unknown>[]>(`PRAGMA ${name}`)
      return row?.[name]
    })
  } catch (cause) {
    await client.$disconnect()
    throw cause
  }
  const records: Records = {
    people: peopleRecords(client),
    budgets: budgetRecords(client),
    members: memberRecords(client),
    tokens: tokenRecords(client),
    evidence: evidenceRecords(client),
    catalogues: catalogueRecords(client),
    settings: settingRecords(client),
    accountStorage: prismaAdapter(client, { provider: 'sqlite' }),
  }
  return { records, close: () => client.$disconnect() }
}
