import { cp, mkdir, readdir, readFile, stat, writeFile } from 'node:fs/promises'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { describe, expect, test } from 'vitest'
import { migrateRecords } from '../../lib/records/migrate'
import { RecordsUnusable, recordsAdapter } from '../../lib/records/prisma/adapter'
import { keepCopy } from '../../lib/records/prisma/beforeMigration'
import { projectMigrations } from '../../lib/records/prisma/migrationFolder'
import { nextMigration } from '../../prisma/nextMigration'
import { temporaryDirectory } from './temporary'

/** A directory with the project's migrations and a records file that has them; more migrations may be added. */
async function migrated() {
  const directory = await temporaryDirectory()
  const file = join(directory, 'records.sqlite')
  const folder = join(directory, 'migrations')
  await cp(projectMigrations(), folder, { recursive: true })
  await migrateRecords(file, folder)
  const add = async (name: string, sql: string) => {
    await mkdir(join(folder, name))
    await writeFile(join(folder, name, 'migration.sql'), sql)
  }
  return { directory, file, folder, add }
}

async function rowsOf(file: string, sql: string): Promise<unknown[][]> {
  const connection = await recordsAdapter(file).connect()
  try {
    return (await connection.queryRaw({ sql, args: [], argTypes: [] })).rows
  } finally {
    await connection.dispose()
  }
}

const addsKey = `INSERT INTO "Setting" VALUES ('colour', 'blue');`
const breaks = `CREATE TABLE "Half" (a INTEGER);\nDELETE FROM "Setting";\nINSERT INTO "Nowhere" VALUES (1);`

test('a new file gets every migration, once, and only its owner may read it', async () => {
  const file = join(await temporaryDirectory(), 'records.sqlite')
  const names = (await readdir(projectMigrations())).sort()
  expect(await migrateRecords(file)).toEqual(names)
  expect((await stat(file)).mode & 0o777).toBe(0o600)
  expect(await migrateRecords(file)).toEqual([])
})

test('where nothing is pending, nothing is copied or written', async () => {
  const { directory, file, folder } = await migrated()
  const before = await readFile(file)
  await migrateRecords(file, folder)
  expect(before.equals(await readFile(file))).toBe(true)
  expect((await readdir(directory)).sort()).toEqual(['migrations', 'records.sqlite'])
})

test('only what is pending is applied', async () => {
  const { file, folder, add } = await migrated()
  await add('29990101000000_a', addsKey)
  await add('29990102000000_b', `UPDATE "Setting" SET value = 'green';`)
  expect(await migrateRecords(file, folder)).toEqual(['29990101000000_a', '29990102000000_b'])
  expect(await rowsOf(file, 'SELECT * FROM "Setting"')).toEqual([['colour', 'green']])
})

describe('a migration that fails', () => {
  test('leaves the file byte for byte as it was, and says so', async () => {
    const { directory, file, folder, add } = await migrated()
    await add('29990101000000_a', addsKey)
    await migrateRecords(file, folder)
    const before = await readFile(file)
    await add('29990102000000_b', 'CREATE TABLE "Fine" (a INTEGER);')
    await add('29990103000000_c', breaks)
    await expect(migrateRecords(file, folder)).rejects.toThrow(RecordsUnusable)
    await expect(migrateRecords(file, folder)).rejects.toThrow('`Nowhere` does not exist')
    expect(before.equals(await readFile(file))).toBe(true)
    expect((await readdir(directory)).sort()).toEqual(['migrations', 'records.sqlite'])
  })

  test('can be mended and run again', async () => {
    const { file, folder, add } = await migrated()
    await add('29990101000000_a', breaks)
    await expect(migrateRecords(file, folder)).rejects.toThrow(RecordsUnusable)
    await writeFile(join(folder, '29990101000000_a', 'migration.sql'), addsKey)
    expect(await migrateRecords(file, folder)).toEqual(['29990101000000_a'])
  })

  test('a migration that leaves a row referring to nothing is a failure too', async () => {
    const { file, folder, add } = await migrated()
    await add('29990101000000_a', `PRAGMA foreign_keys = OFF;\nINSERT INTO "Member" VALUES ('nowhere', 'p1', 'owner');`)
    await expect(migrateRecords(file, folder)).rejects.toThrow('A row of Member would refer to a row that is not there')
    expect(await rowsOf(file, 'SELECT * FROM "Member"')).toEqual([])
  })
})

test('a process that died in a migration: the next start begins from the copy', async () => {
  const { directory, file, folder, add } = await migrated()
  await keepCopy(file)
  await rowsOf(file, 'DROP TABLE "Setting"')
  await add('29990101000000_a', addsKey)
  expect(await migrateRecords(file, folder)).toEqual(['29990101000000_a'])
  expect(await rowsOf(file, 'SELECT * FROM "Setting"')).toEqual([['colour', 'blue']])
  expect((await readdir(directory)).sort()).toEqual(['migrations', 'records.sqlite'])
})

test('what still lies in the write-ahead log is part of the copy', async () => {
  const { directory, file, folder, add } = await migrated()
  const open = await recordsAdapter(file).connect()
  await open.executeScript(addsKey)
  // A copy of both files is what a killed process leaves.
  const killed = join(directory, 'killed.sqlite')
  await cp(file, killed)
  await cp(`${file}-wal`, `${killed}-wal`)
  await open.dispose()
  await add('29990101000000_a', breaks)
  await expect(migrateRecords(killed, folder)).rejects.toThrow(RecordsUnusable)
  expect(await rowsOf(killed, 'SELECT * FROM "Setting"')).toEqual([['colour', 'blue']])
})

describe('a file that this version must not touch', () => {
  test('one from a newer version', async () => {
    const { file, folder, add } = await migrated()
    await add('29990101000000_later', addsKey)
    await migrateRecords(file, folder)
    const before = await readFile(file)
    await expect(migrateRecords(file)).rejects.toThrow(
      'The records file was written by a newer version (it holds 29990101000000_later, which this version does not know); start that version, or restore a backup.',
    )
    expect(before.equals(await readFile(file))).toBe(true)
  })

  test('one whose migrations were other ones', async () => {
    const { file, folder } = await migrated()
    const [first = ''] = await readdir(folder)
    await writeFile(join(folder, first, 'migration.sql'), addsKey)
    await expect(migrateRecords(file, folder)).rejects.toThrow('are not the ones that made this records file')
  })
})

test('the migrations lead to schema.prisma, with nothing left over', async () => {
  const directory = await temporaryDirectory()
  const folder = dirname(projectMigrations())
  expect(folder).toBe(fileURLToPath(new URL('../../prisma', import.meta.url)))
  const schema = await readFile(join(folder, 'schema.prisma'), 'utf8')
  expect(await nextMigration(join(directory, 'a.sqlite'), projectMigrations(), schema)).toBeNull()
  const wider = schema.replace('model Setting {', 'model Setting {\n  note String?')
  expect(await nextMigration(join(directory, 'b.sqlite'), projectMigrations(), wider)).toContain(
    'ALTER TABLE "Setting" ADD COLUMN "note" TEXT',
  )
})
