import { recordsAdapter } from '../lib/records/prisma/adapter'
import { readMigrations } from '../lib/records/prisma/migrationFolder'
import { startSchemaEngine } from '../lib/records/prisma/schemaEngine'

/**
 * The SQL that leads from where the folder's migrations end to the schema, or null where they end there already.
 * @param scratch path of a database that may be made and thrown away
 */
export async function nextMigration(scratch: string, folder: string, schema: string): Promise<string | null> {
  const engine = await startSchemaEngine(recordsAdapter(scratch))
  try {
    const { exitCode, stdout } = await engine.diff({
      from: { tag: 'migrations', ...(await readMigrations(folder)) },
      to: { tag: 'schemaDatamodel', files: [{ path: 'schema.prisma', content: schema }] },
      script: true,
      exitCode: true,
      filters: { externalTables: [], externalEnums: [] },
    })
    return exitCode === 0 ? null : stdout
  } finally {
    engine.free()
  }
}
