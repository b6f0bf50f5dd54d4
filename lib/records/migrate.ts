import type { SqlDriverAdapter } from '@prisma/driver-adapter-utils'
import type { HistoryDiagnostic, MigrationList, SchemaEngine } from '@prisma/schema-engine-wasm/schema_engine_bg'
import { RecordsUnusable, recordsAdapter } from './prisma/adapter'
import { dropCopy, keepCopy, putCopyBack } from './prisma/beforeMigration'
import { projectMigrations, readMigrations } from './prisma/migrationFolder'
import { startSchemaEngine } from './prisma/schemaEngine'
import { makePrivateFile } from './privateFile'

const FILTERS = { externalTables: [], externalEnums: [] }

/** What the engine expects in a fresh file, and would report as missing; the statement is the engine's own. */
const HISTORY_TABLE = `CREATE TABLE IF NOT EXISTS "_prisma_migrations" (
  "id" TEXT PRIMARY KEY NOT NULL, "checksum" TEXT NOT NULL, "finished_at" DATETIME, "migration_name" TEXT NOT NULL,
  "logs" TEXT, "rolled_back_at" DATETIME, "started_at" DATETIME NOT NULL DEFAULT current_timestamp,
  "applied_steps_count" INTEGER UNSIGNED NOT NULL DEFAULT 0
)`

/**
 * Brings the records file to this version: applies what is pending and nothing else. A failing migration is not atomic, so
 * the file is copied before and put back on failure, also when the process died in between. Nobody may have it open.
 * @returns the names of the migrations that were applied
 * @throws RecordsUnusable where the file is newer than this version, or a migration fails (the file is then as before)
 */
export async function migrateRecords(file: string, folder = projectMigrations()): Promise<string[]> {
  await putCopyBack(file)
  await makePrivateFile(file)
  const migrationsList = await readMigrations(folder)
  await query(file, HISTORY_TABLE)
  if (!(await withEngine(file, (engine) => isBehind(engine, migrationsList)))) return []
  await keepCopy(file)
  try {
    const applied = await withEngine(file, (engine) => engine.applyMigrations({ migrationsList, filters: FILTERS }))
    const [dangling] = await query(file, 'PRAGMA foreign_key_check')
    if (dangling) throw new Error(`A row of ${dangling[0]} would refer to a row that is not there.`)
    await dropCopy(file)
    return applied.appliedMigrationNames
  } catch (cause) {
    await putCopyBack(file)
    throw new RecordsUnusable(
      `The records file could not be brought to this version and is as it was before; start the version that wrote it. ${cause instanceof Error ? cause.message : cause}`,
      cause,
    )
  }
}

async function isBehind(engine: SchemaEngine, list: MigrationList): Promise<boolean> {
  const { history, editedMigrationNames, failedMigrationNames } = await engine.diagnoseMigrationHistory({
    migrationsList: list,
    optInToShadowDatabase: false,
    filters: FILTERS,
  })
  if (editedMigrationNames.length > 0)
    throw new RecordsUnusable(
      `The migrations ${editedMigrationNames.join(', ')} are not the ones that made this records file; install the version that wrote it.`,
    )
  if (failedMigrationNames.length > 0)
    throw new RecordsUnusable(
      `The records file was left in the middle of ${failedMigrationNames.join(', ')}; restore a backup.`,
    )
  if (history && history.diagnostic !== 'databaseIsBehind') throw newerFile(history)
  return history !== null
}

function newerFile(history: Exclude<HistoryDiagnostic, { diagnostic: 'databaseIsBehind' }>): RecordsUnusable {
  return new RecordsUnusable(
    `The records file was written by a newer version (it holds ${history.unpersistedMigrationNames.join(', ')}, which this version does not know); start that version, or restore a backup.`,
  )
}

async function query(file: string, sql: string): Promise<unknown[][]> {
  const connection = await recordsAdapter(file).connect()
  try {
    return (await connection.queryRaw({ sql, args: [], argTypes: [] })).rows
  } finally {
    await connection.dispose()
  }
}

/**
 * Runs the engine on the file and closes its connections after it, so that the file may be copied or replaced. It takes
 * the file for itself: nobody else may be connected meanwhile.
 */
async function withEngine<T>(file: string, work: (engine: SchemaEngine) => Promise<T>): Promise<T> {
  const adapter = recordsAdapter(file)
  const connections: SqlDriverAdapter[] = []
  const connect = async () => {
    const connection = await adapter.connect()
    connections.push(connection)
    return connection
  }
  try {
    const engine = await startSchemaEngine({ ...adapter, connect })
    try {
      return await work(engine)
    } finally {
      engine.free()
    }
  } finally {
    for (const connection of connections) await connection.dispose()
  }
}
