import { join } from 'node:path'
import { PrismaBetterSqlite3 } from '@prisma/adapter-better-sqlite3'
import type { SqlDriverAdapterFactory } from '@prisma/driver-adapter-utils'
import { expect, test } from 'vitest'
import { PrismaClient } from '../../lib/records/generated/client'
import { migrateRecords } from '../../lib/records/migrate'
import { recordsAdapter } from '../../lib/records/prisma/adapter'
import { temporaryDirectory } from './temporary'

/**
 * Somebody writes a setting while somebody else's transaction is open, which is then rolled back.
 * @returns whether the setting, which was answered as written, is there afterwards
 */
async function writtenBesideARollback(adapterOf: (file: string) => SqlDriverAdapterFactory): Promise<boolean> {
  const file = join(await temporaryDirectory(), 'records.sqlite')
  await migrateRecords(file)
  const client = new PrismaClient({ adapter: adapterOf(file) })
  let written: Promise<unknown> = Promise.resolve()
  const failed = client.$transaction(async (transaction) => {
    await transaction.setting.create({ data: { key: 'inside', value: '1' } })
    written = client.setting.create({ data: { key: 'beside', value: '2' } }).then((row) => row)
    await transaction.setting.count()
    await transaction.setting.count()
    throw new Error('roll back')
  })
  await expect(failed).rejects.toThrow('roll back')
  await written
  const settings = await client.setting.findMany()
  await client.$disconnect()
  expect(settings.some(({ key }) => key === 'inside')).toBe(false)
  return settings.some(({ key }) => key === 'beside')
}

test('[W6.9] an answered write is not rolled back with somebody else’s transaction', async () => {
  expect(await writtenBesideARollback(recordsAdapter)).toBe(true)
})

test('the driver alone would roll it back (if this fails, lib/records/prisma/turns.ts may go)', async () => {
  expect(await writtenBesideARollback((file) => new PrismaBetterSqlite3({ url: `file:${file}` }))).toBe(false)
})

test('[W6.10] every connection to the records file syncs: WAL, FULL (2), foreign keys on', async () => {
  const file = join(await temporaryDirectory(), 'records.sqlite')
  await migrateRecords(file)
  const client = new PrismaClient({ adapter: recordsAdapter(file) })
  const read = async (name: string) => (await client.$queryRawUnsafe<unknown[]>(`PRAGMA ${name}`))[0]
  const wanted = [{ journal_mode: 'wal' }, { synchronous: 2n }, { foreign_keys: 1n }, { timeout: 5000n }]
  const settings = ['journal_mode', 'synchronous', 'foreign_keys', 'busy_timeout']
  expect(await Promise.all(settings.map(read))).toEqual(wanted)
  await client.$transaction([client.setting.count(), client.setting.count()])
  expect(await Promise.all(settings.map(read))).toEqual(wanted)
  await client.$disconnect()
})

test('[W6.11] a file that cannot keep WAL is refused in a sentence', async () => {
  await expect(recordsAdapter(':memory:').connect()).rejects.toThrow(
    'The records file keeps journal_mode=memory where wal is needed; put the data directory on a local disk.',
  )
})
